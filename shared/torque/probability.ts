import { normalCdf } from '../statistics/normal'
import { reachMm, type Adapter } from './adapter'

export interface ProbabilityInput {
  /** What the wrench was set to or showed, N·m. */
  shownNm: number
  /** Torque at the fastener over torque shown, as adapterFactor gives it. */
  factor: number
  lowerNm: number
  upperNm: number
  /** Mean deviation ā of the calibration, percent of the reference; positive means the fastener got less. */
  biasPercent: number | null
  /** Expanded uncertainty W of the calibration (k = 2), percent. */
  wPercent: number | null
  /** The certificate gives W′ alone: bias and uncertainty cannot be told apart. */
  wPrimeOnly: boolean
  /** Permissible deviation of the tool, percent; stands in where there is no certificate. */
  permissiblePercent: number
  graduationNm: number | null
  adapter: Adapter | null
}

/** The hand is taken to be within 2 % of the effective length. Own assumption. */
const handPlacement = 0.02

function between(lowerNm: number, upperNm: number, nm: number, uNm: number): number {
  // Certain: inside or not, the last bits of a unit conversion aside.
  if (!(uNm > 0)) return nm >= lowerNm * (1 - 1e-12) && nm <= upperNm * (1 + 1e-12) ? 1 : 0
  const p = normalCdf((upperNm - nm) / uNm) - normalCdf((lowerNm - nm) / uNm)
  return Math.min(1, Math.max(0, p))
}

/** Relative standard uncertainty that the hand's place on the grip adds: 0.02·E·cos θ/(L + E·cos θ). */
function handUncertainty(adapter: Adapter | null): number {
  if (!adapter) return 0
  const reach = reachMm(adapter)
  return handPlacement * reach / (adapter.effectiveLengthMm + reach)
}

/**
 * Probability that the torque the fastener got lies inside the limits. It speaks of the wrench's error only, never of
 * clamp load. With certificate figures the applied torque is x/(1 + ā/100), normal, with
 * u = x·√((W/200)² + (r/(x√12))² + (0.02·E·cos θ/(L + E·cos θ))²), then carried to the fastener by the factor.
 * Without, nothing is corrected and u = a/√3 from the permissible deviation a. Null where only W′ is known.
 * Source: JCGM 106 cl. 7 [memory]; the hand's place is our own assumption.
 */
export function probabilityInBand(input: ProbabilityInput): number | null {
  const { shownNm, factor, lowerNm, upperNm, biasPercent, wPercent } = input
  if (input.wPrimeOnly) return null
  if (biasPercent === null || wPercent === null) {
    const u = shownNm * input.permissiblePercent / 100 / Math.sqrt(3)
    return between(lowerNm, upperNm, shownNm * factor, u * factor)
  }
  const appliedNm = shownNm / (1 + biasPercent / 100)
  const resolution = (input.graduationNm ?? 0) / (shownNm * Math.sqrt(12))
  const u = shownNm * Math.hypot(wPercent / 200, resolution, handUncertainty(input.adapter))
  return between(lowerNm, upperNm, appliedNm * factor, u * factor)
}

export interface SimpleProbabilityInput {
  nm: number
  lowerNm: number
  upperNm: number
  /** Expanded uncertainty (k = 2), percent of the torque; the standard uncertainty is half of it. */
  uncertaintyPercent: number | null | undefined
}

/** Probability in band of a torque whose expanded uncertainty is known, uncorrected; null when it is not given. */
export function simpleProbability({ nm, lowerNm, upperNm, uncertaintyPercent }: SimpleProbabilityInput): number | null {
  if (uncertaintyPercent === null || uncertaintyPercent === undefined) return null
  return between(lowerNm, upperNm, nm, nm * uncertaintyPercent / 200)
}

export type CertaintyWord = 'sure' | 'nearly sure' | 'not sure'

/** The word a technician sees for a probability. Source: own rule. */
export function certaintyWord(probability: number | null): CertaintyWord | null {
  if (probability === null) return null
  if (probability >= 0.99) return 'sure'
  return probability >= 0.9 ? 'nearly sure' : 'not sure'
}
