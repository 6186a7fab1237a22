import type { RepairOrderListItem } from '#shared/schemas/repair-orders'
import type { GroupState } from '#shared/types/words'
import { formatCount } from './format'

const waits: Partial<Record<GroupState, (count: number) => string>> = {
  open: count => `${formatCount(count, 'joint')} to tighten`,
  in_progress: count => `${formatCount(count, 'joint')} to finish`,
  disturbed: count => `${formatCount(count, 'joint')} to tighten again`,
  exception: count => formatCount(count, 'decision'),
  pending_approval: count => formatCount(count, 'spec approval'),
  second_check_waiting: count => formatCount(count, 'second check'),
}

/** What holds an open repair order back, each kind once with its count; what comes next where nothing does. */
export function waitsFor({ groupStates }: Pick<RepairOrderListItem, 'groupStates'>): string[] {
  if (groupStates.length === 0) return ['its first joint']
  const words = Object.entries(waits).flatMap(([state, say]) => {
    const count = groupStates.filter(given => given === state).length
    return count > 0 ? [say(count)] : []
  })
  return words.length > 0 ? words : ['release']
}
