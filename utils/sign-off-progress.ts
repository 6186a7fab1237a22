import type { GroupAnswer } from '#shared/schemas/repair-orders'
import type { Stage } from '#shared/torque/stages'
import type { JudgedValue } from '#shared/wrench/judge'
import { attemptsOf, type Act, type Attempt, type EntryUnit } from './sign-off-draft'
import { markOf } from './sign-off-words'
import type { BoltState } from './bolt-layout'

/** Judges a value as it was set, shown or turned; null where nothing can be judged yet. */
export type Judge = (stage: Stage, value: number, unit: EntryUnit) => JudgedValue | null

export interface JudgedAttempt extends Attempt {
  judged: JudgedValue | null
  /** Another person signed this bolt and stage meanwhile: kept here, never sent. */
  covered: boolean
}

/**
 * Where a bolt stands at a stage: signed by an earlier sign-off; waits for the stage before; to do; low, to be
 * tightened again; to be taken out; past an angle and so to be replaced; done.
 */
export type PlaceState = 'signed' | 'waiting' | 'open' | 'again' | 'restart' | 'replace' | 'done'

type Joint = Pick<GroupAnswer, 'positions' | 'order' | 'stages' | 'signOffs'>

export interface Progress {
  attempts: JudgedAttempt[]
  /** The stage in hand; null when nothing is left to do. */
  stage: number | null
  /** Bolts of the stage in hand that still want the hand, in tightening order. */
  todo: number[]
  stateOf: (position: number, stage: number) => PlaceState
  /** Bolts that the draft would sign. */
  entered: number[]
  /** Bolts with every stage entered or signed. */
  finished: number[]
  total: number
  /** Something entered is neither in band nor explained. */
  unsettled: boolean
  /** Everything is entered or signed. */
  complete: boolean
}

const key = (position: number, stage: number) => `${position}/${stage}`

/** Bolts and stages that standing sign-offs cover, except by the one that is being corrected. */
export function coveredPlaces({ positions }: Pick<GroupAnswer, 'positions'>, correctsId: string | null): Map<string, string> {
  return new Map(positions.flatMap(({ position, covered }) =>
    covered.filter(({ signOffId }) => signOffId !== correctsId).map(({ stage, signOffId }) => [key(position, stage), signOffId] as const)))
}

function stateAfter(last: JudgedAttempt, stages: readonly Stage[]): PlaceState {
  const verdict = last.judged?.verdict
  if (last.kept || (verdict !== 'low' && verdict !== 'high')) return 'done'
  if (stages.some(stage => stage.kind === 'angle' && stage.number <= last.stage)) return 'replace'
  return verdict === 'low' ? 'again' : 'restart'
}

/**
 * Where a joint stands with what was entered: derived from the acts, never kept.
 * @param picked a stage the person chose to work at, as long as something is left there
 */
export function progressOf(joint: Joint, acts: readonly Act[], judge: Judge, { correctsId = null, picked = null }: {
  correctsId?: string | null
  picked?: number | null
} = {}): Progress {
  const covered = coveredPlaces(joint, correctsId)
  const stages = new Map(joint.stages.map(stage => [stage.number, stage]))
  const attempts = attemptsOf(acts).map((made): JudgedAttempt => {
    const stage = stages.get(made.stage)
    const judged = stage && made.value !== null && made.unit !== null ? judge(stage, made.value, made.unit) : null
    return { ...made, judged, covered: covered.has(key(made.position, made.stage)) }
  })
  const last = new Map(attempts.filter(made => !made.past).map(made => [key(made.position, made.stage), made]))

  const states = new Map<string, PlaceState>()
  for (const position of joint.order) {
    let ready = true
    for (const { number } of joint.stages) {
      const place = key(position, number)
      const made = last.get(place)
      const state: PlaceState = covered.has(place) ? 'signed' : made ? stateAfter(made, joint.stages) : ready ? 'open' : 'waiting'
      states.set(place, state)
      ready = ready && (state === 'signed' || state === 'done')
    }
  }
  const stateOf = (position: number, stage: number) => states.get(key(position, stage)) ?? 'waiting'
  const wants = (stage: number) => joint.order.filter(position => ['open', 'again', 'restart', 'replace'].includes(stateOf(position, stage)))
  const stage = picked !== null && wants(picked).length > 0
    ? picked
    : joint.stages.find(({ number }) => wants(number).length > 0)?.number ?? null

  const sent = attempts.filter(made => !made.covered)
  return {
    attempts,
    stage,
    todo: stage === null ? [] : wants(stage),
    stateOf,
    entered: joint.order.filter(position => sent.some(made => made.position === position)),
    finished: joint.order.filter(position => joint.stages.every(({ number }) => ['done', 'signed'].includes(stateOf(position, number)))),
    total: joint.order.length,
    unsettled: [...states.values()].some(state => state === 'again' || state === 'restart' || state === 'replace')
      || sent.some(made => made.past && !last.has(key(made.position, made.stage))),
    complete: stage === null,
  }
}

/** Of each bolt and stage the last attempt that would be sent. */
export function countingAttempts(attempts: readonly JudgedAttempt[]): JudgedAttempt[] {
  return attempts.filter(made => !made.covered
    && !attempts.some(other => other.position === made.position && other.stage === made.stage && other.attempt > made.attempt))
}

/** The paint on each bolt at a stage. */
export function paintOf(joint: Joint, progress: Progress, stage: number, correctsId: string | null): Record<number, BoltState> {
  const covered = coveredPlaces(joint, correctsId)
  return Object.fromEntries(joint.positions.map(({ position }): [number, BoltState] => {
    const signOff = joint.signOffs.find(({ id }) => id === covered.get(key(position, stage)))
    if (signOff) return [position, markOf(signOff.wrench.kind === 'setting' ? signOff : { ...signOff, verdict: null })]
    const made = progress.attempts.findLast(attempt => attempt.position === position && attempt.stage === stage && !attempt.past)
    if (!made) return [position, 'none']
    return [position, made.judged?.verdict === 'low' || made.judged?.verdict === 'high' ? 'out' : 'tightened']
  }))
}
