import { normalCdf, normalPdf, normalQuantile } from '../statistics/normal'

/** A measured value and the tolerance it is held against; null where there is no limit on that side. Any one unit. */
export interface Measured {
  value: number
  lower: number | null
  upper: number | null
}

/** How far inside the tolerance the value lies; negative outside. */
function margin({ value, lower, upper }: Measured): number {
  return Math.min(value - (lower ?? -Infinity), (upper ?? Infinity) - value)
}

/** The limits stand as they are; at a limit the risk is 50 %. Source: ILAC-G8:09/2019 cl. 4.2. */
export function simpleAcceptance(measured: Measured): 'pass' | 'fail' {
  return margin(measured) >= 0 ? 'pass' : 'fail'
}

/** Limits drawn in by the guard band; with U (k = 2) the risk is at most 2.3 %. Source: ILAC-G8:09/2019 cl. 4.2. */
export function guardedAcceptance(measured: Measured, guardBand: number): 'pass' | 'fail' {
  return margin(measured) >= guardBand ? 'pass' : 'fail'
}

/** Four answers, with a band of the guard's width each side of the limit. Source: ILAC-G8:09/2019 cl. 4.2. */
export function nonBinaryAcceptance(measured: Measured, guardBand: number) {
  const inside = margin(measured)
  if (inside >= guardBand) return 'pass'
  if (inside >= 0) return 'conditional pass'
  return inside >= -guardBand ? 'conditional fail' : 'fail'
}

/** One-sided factor on u for 95 % conformance probability, as ISO 14253-1:2017 rounds it [memory]. */
const provenFactor = 1.65

/**
 * Proof of conformity with 95 %: uncertainty works against whoever has to prove. `expandedUncertainty` is U (k = 2).
 * Source: ISO 14253-1:2017 [memory].
 */
export function provenConformity(measured: Measured, expandedUncertainty: number) {
  const guard = provenFactor * expandedUncertainty / 2
  const { lower, upper } = measured
  const inside = margin(measured)
  return {
    acceptance: [lower === null ? null : lower + guard, upper === null ? null : upper - guard],
    verdict: inside >= guard
      ? 'proven conforming'
      : inside < -guard ? 'proven non-conforming' : 'not proven conforming',
  }
}

/** Test uncertainty ratio: tolerance span over 2·U95. Source: ANSI/NCSL Z540.3 [memory]. */
export function testUncertaintyRatio(lower: number, upper: number, expandedUncertainty: number): number {
  return (upper - lower) / (2 * expandedUncertainty)
}

/**
 * Guard band multiplier M of acceptance limits T − U·M that keeps false acceptance at 2 %; zero from a ratio of 4.59.
 * Source: Z540.3 Handbook method 6, M = 1.04 − exp(0.38·ln TUR − 0.54) [memory].
 */
export function guardBandMultiplier(ratio: number): number {
  return Math.max(0, 1.04 - Math.exp(0.38 * Math.log(ratio) - 0.54))
}

/** Probability that the true value conforms, `u` standard uncertainty. Source: JCGM 106:2012 cl. 7.2–7.4 [memory]. */
export function conformanceProbability({ value, lower, upper }: Measured, u: number): number {
  const below = upper === null ? 1 : normalCdf((upper - value) / u)
  return below - (lower === null ? 0 : normalCdf((lower - value) / u))
}

/** Probability that a value accepted as measured does not conform. Source: JCGM 106:2012 cl. 7 [memory]. */
export function specificRisk(measured: Measured, u: number): number {
  return 1 - conformanceProbability(measured, u)
}

/** Measurement capability index, tolerance span over 4u. Source: JCGM 106:2012 [memory]. */
export function capabilityIndex(lower: number, upper: number, u: number): number {
  return (upper - lower) / (4 * u)
}

export interface FalseAcceptInput {
  /** Half the tolerance span, about zero. */
  tolerance: number
  /** Half the acceptance span. */
  acceptance: number
  /** U of the measurement (k = 2). */
  expandedUncertainty: number
  /** Share of the population that is in tolerance, 0…1. */
  inTolerance: number
}

/**
 * Global risk of false acceptance: the share of all items that are out of tolerance and accepted all the same, for a
 * centred normal population. Bivariate-normal integral by Simpson's rule, good to 1e-9.
 */
export function globalFalseAccept(input: FalseAcceptInput): number {
  const { tolerance, acceptance } = input
  const u = input.expandedUncertainty / 2
  const spread = tolerance / normalQuantile((1 + input.inTolerance) / 2)
  const density = (x: number) => normalPdf(x / spread) / spread
    * (normalCdf((acceptance - x) / u) - normalCdf((-acceptance - x) / u))
  const end = Math.max(tolerance, acceptance) + 9 * u
  const steps = 2000
  const width = (end - tolerance) / steps
  let sum = density(tolerance) + density(end)
  for (let i = 1; i < steps; i++) sum += density(tolerance + i * width) * (i % 2 === 1 ? 4 : 2)
  return 2 * sum * width / 3
}
