import { mean, standardDeviation } from '../statistics/normal'
import { deviationPercent, type CalibrationReading } from './calibration'

/** All torques in one unit; everything that is not given counts as zero. */
export interface BudgetInput {
  /** The test torque T that the components are referred to. */
  target: number
  readings: readonly CalibrationReading[]
  /** Expanded uncertainty W_md of the reference device (k = 2), percent. */
  uncertaintyPercent: number
  /** Resolution r: scale, dial or display; none for tools that are fixed or not graduated. */
  graduation?: number | null
  /** Spread of the means of the series taken after remounting the tool. */
  reproducibility?: number
  /** Spread of the means over the positions of the output drive. */
  outputDrive?: number
  /** Spread of the means over the positions of the adapter between tool and reference. */
  interfaceSpread?: number
  /** Difference of the means with the hand 10 mm to each side of the grip centre. */
  loadingPoint?: number
  /** Stated error b_e of the reference device, percent. */
  referenceErrorPercent?: number
}

/** Relative standard uncertainties, percent of the test torque, and what they add up to. */
export interface Budget {
  /** Mean of the reference readings and their standard deviation, in the unit of the readings. */
  meanReference: number
  standardDeviation: number
  meanDeviationPercent: number
  wMd: number
  wR: number
  wRep: number
  wOd: number
  wInt: number
  wL: number
  wRe: number
  /** Combined standard uncertainty, percent. */
  w: number
  /** Expanded uncertainty W = 2·w, percent. */
  wPercent: number
  /** W′ = |ā| + |b_e| + W, percent. */
  wPrimePercent: number
}

const coverage = 2

/**
 * Uncertainty of one calibration point, every component visible: w_md = W_md/2, w_r = (r/2)/√3·100/T once,
 * b/(2√3)·100/T for each spread, w_re = s/√n·100/x̄ (a single reading shows no scatter and counts as zero).
 * Source: structure after ISO 6789-2:2017 cl. 6–7 [memory].
 * @throws RangeError without readings, or with a target or reference not above zero.
 */
export function budget(input: BudgetInput): Budget {
  const { target, readings } = input
  if (!(target > 0)) throw new RangeError('The test torque must be greater than zero.')
  const references = readings.map(reading => reading.reference)
  const meanReference = mean(references)
  const scatter = references.length > 1 ? standardDeviation(references) : 0
  const meanDeviationPercent = mean(readings.map(reading => deviationPercent(reading.indicated, reading.reference)))
  const halfWidth = (spread: number | null | undefined) => (spread ?? 0) / (2 * Math.sqrt(3)) * 100 / target
  const parts = {
    wMd: input.uncertaintyPercent / coverage,
    wR: halfWidth(input.graduation),
    wRep: halfWidth(input.reproducibility),
    wOd: halfWidth(input.outputDrive),
    wInt: halfWidth(input.interfaceSpread),
    wL: halfWidth(input.loadingPoint),
    wRe: scatter / Math.sqrt(references.length) * 100 / meanReference,
  }
  const w = Math.hypot(...Object.values(parts))
  const wPercent = coverage * w
  const wPrimePercent = Math.abs(meanDeviationPercent) + Math.abs(input.referenceErrorPercent ?? 0) + wPercent
  return { meanReference, standardDeviation: scatter, meanDeviationPercent, ...parts, w, wPercent, wPrimePercent }
}
