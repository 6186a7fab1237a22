import { mean } from '../statistics/normal'

/** One reading of a test point: what the tool said and what the reference measured, in the same unit. */
export interface CalibrationReading {
  indicated: number
  reference: number
}

/**
 * Relative deviation a_s = (x_a − x_r)/x_r · 100, percent. The denominator is the reference, not the setting: 96
 * delivered at 100 set is +4.17 %. Positive means the fastener got less than the scale said.
 * Source: ISO 6789-1:2017 cl. 7 [memory]. @throws RangeError when the reference is not greater than zero.
 */
export function deviationPercent(indicated: number, reference: number): number {
  if (!(reference > 0)) throw new RangeError('The reference reading must be greater than zero.')
  return (indicated - reference) / reference * 100
}

export interface PointInput {
  targetNm: number
  readings: readonly CalibrationReading[]
  limitPercent: number
}

export interface PointAssessment {
  targetNm: number
  deviationsPercent: number[]
  meanDeviationPercent: number
  /** In the unit of the readings. */
  meanReference: number
  limitPercent: number
  verdict: 'pass' | 'fail'
}

/**
 * Assesses one test point: every reading must lie within the permissible deviation, not only their mean.
 * Source: ISO 6789-1:2017 cl. 7 [memory]. @throws RangeError without readings or with a reference not above zero.
 */
export function assessPoint({ targetNm, readings, limitPercent }: PointInput): PointAssessment {
  const deviationsPercent = readings.map(reading => deviationPercent(reading.indicated, reading.reference))
  // A reading exactly on the limit passes; the last bits of the division must not decide it.
  const inside = deviationsPercent.every(deviation => Math.abs(deviation) <= limitPercent + 1e-9)
  return {
    targetNm,
    deviationsPercent,
    meanDeviationPercent: mean(deviationsPercent),
    meanReference: mean(readings.map(reading => reading.reference)),
    limitPercent,
    verdict: inside ? 'pass' : 'fail',
  }
}

/**
 * What a tool within `limitPercent` may deliver at a setting, in the unit of the setting: not symmetrical, because the
 * deviation is relative to what is delivered. Algebra of deviationPercent.
 */
export function deliveredLimits(setting: number, limitPercent: number): { low: number, high: number } {
  return { low: setting / (1 + limitPercent / 100), high: setting / (1 - limitPercent / 100) }
}
