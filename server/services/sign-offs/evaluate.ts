import type { SignOffBody } from '#shared/schemas/sign-offs'
import { contradicts } from '#shared/torque/preparation'
import type { Stage } from '#shared/torque/stages'
import { toNm, type TorqueUnit } from '#shared/torque/units'
import { decisionRuleText, verdictRank, worstVerdict, type Verdict } from '#shared/torque/verdict'
import { type CalibrationPoint, figuresAt } from '#shared/wrench/figures'
import { judgeReading, type JudgedValue } from '#shared/wrench/judge'
import type { SuitedReading } from './form'

/** The wrench as it judges: what is set or shown, how finely, and how well. */
export interface JudgingWrench {
  kind: 'setting' | 'indicating'
  graduation: { value: number, unit: TorqueUnit } | null
  figures: CalibrationPoint[]
  permissiblePercent: number
}

export type EvaluatedReading = SuitedReading & JudgedValue & { lowerNm: number | null, upperNm: number | null }

/** What a sign-off comes to. */
export interface Evaluation {
  readings: EvaluatedReading[]
  verdict: Verdict | null
  /** The counting reading that speaks worst of the joint: its figures are the sign-off's. */
  worst: EvaluatedReading | null
  decisionRule: string
  probabilityInBand: number | null
}

const unvalued: JudgedValue = {
  nm: null, verdict: null, probabilityInBand: null, uNm: null, biasPercent: null, wPercent: null, wPrimePercent: null, decisionRule: 'not judged',
}

/** Judges every reading by the wrench's calibration, with the same rules as the screen. Pure. */
export function evaluate(
  readings: readonly SuitedReading[],
  stages: readonly Stage[],
  wrench: JudgingWrench,
  how: Pick<SignOffBody, 'adapter' | 'multiplierRatio'> & { leftHand: boolean },
): Evaluation {
  const judged = readings.map((reading): EvaluatedReading => {
    const stage = stages[reading.stage - 1]
    if (!stage) throw new Error('A reading has no stage.')
    const limits = { lowerNm: stage.lowerNm, upperNm: stage.upperNm }
    if (reading.value === undefined || reading.unit === undefined) return { ...reading, ...unvalued, ...limits }
    const figures = reading.unit === 'deg'
      ? null
      : figuresAt(wrench.figures, toNm({ value: reading.value, unit: reading.unit }), how.leftHand ? 'anticlockwise' : 'clockwise')
    const value = judgeReading({
      value: reading.value,
      unit: reading.unit,
      stage,
      adapter: how.adapter ?? null,
      multiplierRatio: how.multiplierRatio ?? null,
      figures,
      permissiblePercent: wrench.permissiblePercent,
      graduation: wrench.graduation,
    })
    return { ...reading, ...value, ...limits }
  })
  const counting = judged.filter(reading => reading.counts)
  const verdict = worstVerdict(counting)
  const worst = counting.filter(reading => reading.verdict !== null).toSorted(byWorst)[0] ?? null
  const probabilities = counting.flatMap(reading => reading.probabilityInBand ?? [])
  return {
    readings: judged,
    verdict,
    worst,
    decisionRule: worst?.decisionRule ?? decisionRuleText,
    probabilityInBand: probabilities.length > 0 ? Math.min(...probabilities) : null,
  }
}

function byWorst(a: EvaluatedReading, b: EvaluatedReading): number {
  const rank = (reading: EvaluatedReading) => (reading.verdict ? verdictRank(reading.verdict) : -1)
  return rank(b) - rank(a) || (a.probabilityInBand ?? 1) - (b.probabilityInBand ?? 1)
}

export const isOut = (verdict: Verdict | null) => verdict === 'low' || verdict === 'high'

/** Confirmed steps that contradict what the spec says of the threads. */
export function contradictingSteps(threadCondition: string | null, prep: Record<string, boolean>): string[] {
  return contradicts(threadCondition, Object.keys(prep).filter(code => prep[code]))
}
