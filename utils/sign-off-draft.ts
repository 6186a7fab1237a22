import { uuidv7 } from '#shared/ids/uuid'
import type { Adapter } from '#shared/torque/adapter'
import type { Quantity, TorqueUnit } from '#shared/torque/units'

export type EntryUnit = TorqueUnit | 'deg'

/** One thing the hand did, in the order it was done: what undo takes back. */
export type Act
  = | { kind: 'entered', positions: number[], stage: number, value: number | null, unit: EntryUnit | null, kept?: boolean }
    /** The bolt was taken out, inspected or replaced, and begins again at the first stage. */
    | { kind: 'restarted', position: number }
    /** The last attempt stays although it is out of band; the reason stands in `deviationReason`. */
    | { kind: 'kept', position: number, stage: number }

export interface PartEntry { name: string, partNumber: string, lot: string }

/** A sign-off before it is signed, as it is kept on the device. There is no PIN in it. */
export interface SignOffDraft {
  /** Of the sign-off: made once, so that a repeated try is the same record. */
  id: string
  /** The sign-off that this one stands in for, and why. */
  corrects: { id: string, reason: string } | null
  wrenchId: string | null
  adapter: Adapter | null
  multiplierRatio: number | null
  /** What a setting wrench was set to, by stage. */
  settings: Record<number, Quantity>
  prep: Record<string, boolean>
  prepReason: string
  deviationReason: string
  acts: Act[]
  note: string
  parts: PartEntry[]
  /** Wall time in the shop, YYYY-MM-DDTHH:MM; empty when it was tightened just now. */
  tightenedAt: string
  /** What was sent without an answer: the same content is sent again with the same time. */
  sent: { signedAt: string, content: string } | null
}

export const newDraft = (wrenchId: string | null = null): SignOffDraft => ({
  id: uuidv7(),
  corrects: null,
  wrenchId,
  adapter: null,
  multiplierRatio: null,
  settings: {},
  prep: {},
  prepReason: '',
  deviationReason: '',
  acts: [],
  note: '',
  parts: [],
  tightenedAt: '',
  sent: null,
})

const withAct = (draft: SignOffDraft, act: Act): SignOffDraft => ({ ...draft, acts: [...draft.acts, act] })

/** An attempt at one stage of one bolt, or of several in the order given; `kept` where it is known to be out of band. */
export type Entry = Omit<Extract<Act, { kind: 'entered' }>, 'kind'>
export const enter = (draft: SignOffDraft, entry: Entry): SignOffDraft => withAct(draft, { kind: 'entered', ...entry })

/** The bolt comes out and begins again. A new bolt past an angle stage says so in the reason. */
export const restart = (draft: SignOffDraft, position: number, reason = ''): SignOffDraft =>
  withAct(withReason(draft, reason), { kind: 'restarted', position })

/** The last attempt stays as it is, with a reason. */
export const keepAsIs = (draft: SignOffDraft, position: number, stage: number, reason: string): SignOffDraft =>
  withAct(withReason(draft, reason), { kind: 'kept', position, stage })

/** Adds a sentence to the reason why the joint deviates, once. */
export function withReason(draft: SignOffDraft, reason: string): SignOffDraft {
  const said = draft.deviationReason
  if (!reason.trim() || said.includes(reason.trim())) return draft
  return { ...draft, deviationReason: [said, reason.trim()].filter(Boolean).join(' ') }
}

/** Takes back the last thing the hand did. */
export const undo = (draft: SignOffDraft): SignOffDraft => ({ ...draft, acts: draft.acts.slice(0, -1) })

/** Takes back the last attempt of one bolt at a stage, with what was decided about it; the others stay. */
export function takeBack(draft: SignOffDraft, position: number, stage: number): SignOffDraft {
  const at = draft.acts.findLastIndex(act => act.kind === 'entered' && act.stage === stage && act.positions.includes(position))
  const acts = draft.acts.flatMap((act, index): Act[] => {
    if (index < at) return [act]
    if (act.kind !== 'entered') return act.position === position && at >= 0 ? [] : [act]
    if (index > at) return [act]
    const positions = act.positions.filter(other => other !== position)
    return positions.length > 0 ? [{ ...act, positions }] : []
  })
  return { ...draft, acts }
}

/** Reads a draft as it was kept; null when there is none, or it is of another make. */
export function readDraft(text: string | null): SignOffDraft | null {
  try {
    const kept: unknown = JSON.parse(text ?? 'null')
    return isDraft(kept) ? kept : null
  } catch {
    return null
  }
}

/** Only what this program wrote itself is there: the shape is looked at, not every value. */
function isDraft(kept: unknown): kept is SignOffDraft {
  return typeof kept === 'object' && kept !== null && Object.keys(newDraft()).every(name => name in kept)
    && 'acts' in kept && Array.isArray(kept.acts)
}

export interface Attempt {
  position: number
  stage: number
  /** Numbered from 1 for each bolt and stage. */
  attempt: number
  value: number | null
  unit: EntryUnit | null
  /** It stays although it is out of band. */
  kept: boolean
  /** The bolt was taken out after it. */
  past: boolean
}

/** Every attempt in the order it was made. */
export function attemptsOf(acts: readonly Act[]): Attempt[] {
  const attempts: Attempt[] = []
  for (const act of acts) {
    if (act.kind === 'entered') {
      for (const position of act.positions) {
        const before = attempts.filter(made => made.position === position && made.stage === act.stage).length
        attempts.push({ position, stage: act.stage, attempt: before + 1, value: act.value, unit: act.unit, kept: act.kept ?? false, past: false })
      }
    } else {
      const mine = attempts.filter(made => made.position === act.position)
      if (act.kind === 'restarted') {
        for (const made of mine) made.past = true
      } else {
        const last = mine.findLast(made => made.stage === act.stage)
        if (last) last.kept = true
      }
    }
  }
  return attempts
}

/** Whether the hand has done anything that would be lost. */
export const isBegun = (draft: SignOffDraft): boolean => draft.acts.length > 0

/** Bolts in a few words: "1–3, 5". */
export function boltRanges(positions: readonly number[]): string {
  const runs: [number, number][] = []
  for (const position of [...positions].sort((a, b) => a - b)) {
    const run = runs.at(-1)
    if (run && run[1] === position - 1) run[1] = position
    else runs.push([position, position])
  }
  return runs.map(([from, to]) => from === to ? String(from) : `${from}–${to}`).join(', ')
}

/** "bolt 4" or "bolts 1–3, 5". */
export const boltsWords = (positions: readonly number[]): string =>
  `${positions.length === 1 ? 'bolt' : 'bolts'} ${boltRanges(positions)}`
