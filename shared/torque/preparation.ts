import type { JointClass } from '../types/words'

/** What the threads are to have on them, or not, while they are tightened. */
export type ThreadCondition = 'dry' | 'oiled' | 'thread_locker' | 'anti_seize' | 'sealant'

/** The usual steps before bolt 1, by code. A spec may have others of its own. */
export const preparationTexts = {
  threads_clean_dry: 'Threads clean and dry',
  threads_oiled: 'Threads oiled',
  thread_locker: 'Thread locker on the threads',
  anti_seize: 'Anti-seize on the threads',
  sealant: 'Sealant on the threads',
  new_gasket: 'New gasket',
  new_bolts: 'New bolts',
  blind_holes_blown_out: 'Blind holes blown out, no liquid left in them',
  faces_cleaned: 'Joint faces cleaned',
} as const

export type PreparationCode = keyof typeof preparationTexts

const codeOf: Record<ThreadCondition, PreparationCode> = {
  dry: 'threads_clean_dry',
  oiled: 'threads_oiled',
  thread_locker: 'thread_locker',
  anti_seize: 'anti_seize',
  sealant: 'sealant',
}

// "Without oil" says dry, and "dry, no thread locker" does not say thread locker.
const denial = '\\b(?:no|not|non|without|never|free (?:of|from))\\b[\\s-]+(?:any\\s+)?'
const denied = new RegExp(`${denial}[a-z-]+(?:\\s+(?:locker|seize|compound))?|\\boil[\\s-]free\\b`, 'g')
const spellings: readonly (readonly [RegExp, ThreadCondition])[] = [
  [/thread[\s-]*lock|locking (?:compound|fluid|adhesive)/, 'thread_locker'],
  [/anti[\s-]*seiz/, 'anti_seize'],
  [/seal(?:ant|er|ing)|\bpipe dope\b|\bptfe\b/, 'sealant'],
  [/\bdry[\s-]film\b|\bmoly\b/, 'oiled'],
  [/\bdry\b|\bunlubricated\b/, 'dry'],
  [/\boil(?:ed|y)?\b|\bwet\b|lubricat|\blubed?\b|\bgreased?\b/, 'oiled'],
]

const firstIn = (text: string) => spellings.find(([pattern]) => pattern.test(text))?.[1] ?? null

/**
 * The thread condition that a printed text speaks of, such as "clean and dry", "wet" or "engine oil"; null where it
 * speaks of none. In torque tables "wet" means lubricated. Source: own rule.
 */
export function conditionOf(text: string | null | undefined): ThreadCondition | null {
  const typed = (text ?? '').toLowerCase().replaceAll('_', ' ')
  const withoutLubricant = typed.match(denied)?.some(part => firstIn(part) === 'oiled')
  return firstIn(typed.replace(denied, ' ')) ?? (withoutLubricant ? 'dry' : null)
}

export interface PreparedJoint {
  threadCondition?: string | null
  jointClass: JointClass
  oneTimeUse?: boolean
}

/** The steps that a spec without steps of its own gets: reminders, none of them required. */
export function defaultPreparation(joint: PreparedJoint): { code: PreparationCode, text: string, required: boolean }[] {
  const condition = conditionOf(joint.threadCondition)
  const codes: PreparationCode[] = [
    ...(joint.jointClass === 'sealing' ? ['faces_cleaned', 'new_gasket'] as const : []),
    ...(joint.oneTimeUse ? ['new_bolts'] as const : []),
    ...(condition ? [codeOf[condition]] : []),
  ]
  return codes.map(code => ({ code, text: preparationTexts[code], required: false }))
}

/** What may be on the threads besides what is specified: thread locker and sealant need them clean and dry first. */
const goesWith: Record<ThreadCondition, readonly ThreadCondition[]> = {
  dry: ['dry'],
  oiled: ['oiled'],
  thread_locker: ['thread_locker', 'dry'],
  anti_seize: ['anti_seize'],
  sealant: ['sealant', 'dry'],
}

/** A code that speaks of holes, faces or gaskets says nothing about the threads. */
const notOfThreads = /hole|face|gasket/

/**
 * The confirmed steps that contradict the thread condition of the spec, such as thread locker on a joint specified dry:
 * another friction gives another clamp load for the same torque. None where the spec has no condition. Source: own rule.
 */
export function contradicts(threadCondition: string | null, confirmedCodes: readonly string[]): string[] {
  const specified = conditionOf(threadCondition)
  if (!specified) return []
  return confirmedCodes.filter((code) => {
    const done = notOfThreads.test(code) ? null : conditionOf(code)
    return done !== null && !goesWith[specified].includes(done)
  })
}
