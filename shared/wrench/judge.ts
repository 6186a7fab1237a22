import { adapterFactor, type Adapter } from '../torque/adapter'
import { probabilityInBand } from '../torque/probability'
import type { Stage } from '../torque/stages'
import { toNm, type Quantity, type TorqueUnit } from '../torque/units'
import { decisionRuleText, verdictOf, type Verdict } from '../torque/verdict'
import type { WrenchKind } from '../types/words'
import type { Figures } from './figures'

export interface ReadingInput {
  /** What is set or shown on the wrench; at an angle stage the angle turned, in degrees. */
  value: number
  unit: TorqueUnit | 'deg'
  /** Said for the record: setting and indicating wrenches are judged alike. */
  kind?: WrenchKind
  stage: Stage
  adapter?: Adapter | null
  multiplierRatio?: number | null
  /** What the calibration says at the torque shown; null without a certificate. */
  figures: Figures | null
  /** Permissible deviation by class, percent: stands in where there are no figures. */
  permissiblePercent: number
  graduation?: Quantity | null
}

export interface JudgedValue {
  /** Torque at the fastener, N·m; null at an angle stage. */
  nm: number | null
  /** Null where the stage is not judged. */
  verdict: Verdict | null
  probabilityInBand: number | null
  /** What the torque at the fastener may be off by, N·m. */
  uNm: number | null
  biasPercent: number | null
  wPercent: number | null
  wPrimePercent: number | null
  decisionRule: string
}

const notJudged = 'not judged'
const noFigures: Figures = { biasPercent: null, wPercent: null, wPrimePercent: null }

function judgeAngle(angleDeg: number, stage: Stage): JudgedValue {
  const unknown = { nm: null, probabilityInBand: null, uNm: null, ...noFigures }
  if (stage.toleranceDeg === null || stage.angleDeg === null) {
    return { ...unknown, verdict: null, decisionRule: notJudged }
  }
  const verdict = verdictOf({
    nm: angleDeg,
    lowerNm: stage.angleDeg - stage.toleranceDeg,
    upperNm: stage.angleDeg + stage.toleranceDeg,
    uNm: 0,
  })
  return { ...unknown, verdict, decisionRule: decisionRuleText }
}

/** W′ as the certificate gives it, else |ā| + W, else the permissible deviation; percent. */
function deviationPercentOf({ biasPercent, wPercent, wPrimePercent }: Figures, permissiblePercent: number): number {
  if (wPrimePercent !== null) return wPrimePercent
  return biasPercent === null || wPercent === null ? permissiblePercent : Math.abs(biasPercent) + wPercent
}

/**
 * Torque at the fastener, verdict and probability of one reading, the same in the browser and on the server. Verdict
 * and `edge` look at the uncorrected torque with U = W′; the probability at the corrected one. A snug stage is never
 * judged; an angle has no torque, and a verdict only where its tolerance is printed.
 * @throws RangeError when the unit is not that of the stage (degrees for an angle, a torque for all others), a number
 * is missing, or the adapter makes no sense.
 */
export function judgeReading(input: ReadingInput): JudgedValue {
  const { value, unit, stage, permissiblePercent } = input
  if ((unit === 'deg') !== (stage.kind === 'angle')) {
    throw new RangeError(unit === 'deg' ? 'This stage takes a torque.' : 'This stage takes an angle in degrees.')
  }
  if (unit === 'deg') return judgeAngle(value, stage)

  const shownNm = toNm({ value, unit })
  const factor = adapterFactor(input.adapter, input.multiplierRatio)
  const nm = shownNm * factor
  const figures = input.figures ?? noFigures
  const uNm = nm * deviationPercentOf(figures, permissiblePercent) / 100
  const { lowerNm, upperNm } = stage
  if (stage.kind === 'snug' || lowerNm === null || upperNm === null) {
    return { nm, verdict: null, probabilityInBand: null, uNm, ...figures, decisionRule: notJudged }
  }
  const probability = probabilityInBand({
    shownNm,
    factor,
    lowerNm,
    upperNm,
    biasPercent: figures.biasPercent,
    wPercent: figures.wPercent,
    wPrimeOnly: figures.wPrimePercent !== null && (figures.wPercent === null || figures.biasPercent === null),
    permissiblePercent,
    graduationNm: input.graduation ? toNm(input.graduation) : null,
    adapter: input.adapter ?? null,
  })
  const verdict = verdictOf({ nm, lowerNm, upperNm, uNm })
  return { nm, verdict, probabilityInBand: probability, uNm, ...figures, decisionRule: decisionRuleText }
}
