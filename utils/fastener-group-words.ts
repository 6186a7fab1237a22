import type { GroupAnswer, GroupBrief } from '#shared/schemas/repair-orders'
import { formatNumber, formatQuantity } from '#shared/torque/quantity'
import type { Stage } from '#shared/torque/stages'
import type { GroupState } from '#shared/types/words'
import type { BoltState } from './bolt-layout'
import { formatDate } from './format'

/** The state of a fastener group in words. */
export const groupStateWords: Record<GroupState, string> = {
  not_disturbed: 'Not disturbed',
  disturbed: 'Opened again, to be signed anew',
  open: 'Not tightened',
  in_progress: 'Partly signed',
  exception: 'Signed with an exception: the foreman decides',
  pending_approval: 'Signed, its spec waits for approval',
  second_check_waiting: 'Signed, waits for a second check',
  conceded: 'Accepted by the foreman as it is',
  signed: 'Signed',
}

const marks: Partial<Record<GroupState, BoltState>> = {
  in_progress: 'tightened', exception: 'out', pending_approval: 'signed', second_check_waiting: 'signed', conceded: 'out', signed: 'signed',
}

/** The paint that stands for a whole group. */
export function groupMark({ state, secondCheckRequired = false }: { state: GroupState, secondCheckRequired?: boolean }): BoltState {
  return state === 'signed' && secondCheckRequired ? 'checked' : marks[state] ?? 'none'
}

/** A stage in a word or two: "Snug", "50 %", "36 N·m", "90°". */
export function stageName(stage: Stage, limits: GroupAnswer['limits']): string {
  if (stage.kind === 'angle') return `${formatNumber(stage.angleDeg ?? 0)}°`
  if (stage.kind === 'snug' || stage.targetNm === null) return 'Snug'
  if (stage.kind === 'percent') return `${formatNumber(100 * stage.targetNm / limits.targetNm, 0)} %`
  return formatQuantity({ value: stage.targetNm, unit: 'N.m' }, stage.targetNm < 10 ? 2 : 1)
}

/** Where the value is printed and how far it may be trusted: "Workshop manual, 6-12, page 214". */
export function specLine({ source, number, status, approvedAt, threadCondition, shopValue }: GroupAnswer['specRevision'], timeZone: string): string {
  const page = source.page && (/^p/i.test(source.page) ? source.page : `page ${source.page}`)
  const standing = {
    approved: approvedAt ? `approved ${formatDate(approvedAt, timeZone)}` : 'approved',
    draft: 'draft, waits for approval',
    withdrawn: 'withdrawn',
  }[status]
  return [
    shopValue ? 'Shop value, no published spec found' : [source.title, source.section, page, source.date].filter(Boolean).join(', '),
    `revision ${number}, ${standing}`,
    `thread condition ${threadCondition ? `“${threadCondition}”` : 'not stated'}`,
  ].join(' · ')
}

/** The next group of an order that still wants the hand. */
export const nextGroup = (groups: readonly GroupBrief[], currentId: string): GroupBrief | null =>
  groups.find(({ id, state }) => id !== currentId && ['open', 'disturbed', 'in_progress'].includes(state)) ?? null
