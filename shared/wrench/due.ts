import dayjs from 'dayjs'
import type { CalibrationStatus, WrenchState } from '../types/words'

const dayMs = 86_400_000

/** Milliseconds of a date at UTC midnight. @throws RangeError when it is not a real date written YYYY-MM-DD. */
function dayOf(date: string): number {
  const time = /^\d{4}-\d{2}-\d{2}$/.test(date) ? Date.parse(date) : Number.NaN
  if (Number.isNaN(time) || new Date(time).toISOString().slice(0, 10) !== date) {
    throw new RangeError('A date must be a real day, written YYYY-MM-DD.')
  }
  return time
}

/**
 * The date `months` after a calibration, clamped to the month's end: twelve months after 29 February is 28 February.
 * Source: own rule; 12 months where the user has no procedure of his own, ISO 6789-1:2017 cl. 5.3 [memory].
 * @throws RangeError when the date is not YYYY-MM-DD or months is not a whole number from 0.
 */
export function dueOn(performedOn: string, months: number): string {
  dayOf(performedOn)
  if (!Number.isInteger(months) || months < 0) throw new RangeError('Months must be a whole number.')
  return dayjs(performedOn).add(months, 'month').format('YYYY-MM-DD')
}

/** Whole days from `a` to `b`, negative when b is earlier. @throws RangeError when a date is not YYYY-MM-DD. */
export function daysBetween(a: string, b: string): number {
  return Math.round((dayOf(b) - dayOf(a)) / dayMs)
}

export interface CalibrationStatusInput {
  state: WrenchState
  /** Null when the wrench has no calibration that counts. */
  dueOn: string | null
  today: string
  dueSoonDays: number
  cyclesSince: number
  intervalCycles: number | null | undefined
}

export interface CalibrationStanding {
  status: CalibrationStatus
  /** Days to dueOn, negative past it; null when nothing is due. */
  daysLeft: number | null
}

/** From this share of the cycles on the wrench is due soon. Own rule. */
const dueSoonShare = 0.9

/**
 * Where a wrench stands: not in use comes first, then none, overdue (the day after dueOn, or when the cycles are
 * reached), due soon (within dueSoonDays, or from 90 % of the cycles), valid. `daysLeft` counts to dueOn.
 * Source: ISO 6789-1:2017 cl. 5.3, months or cycles, whichever comes first [memory].
 * @throws RangeError when a date is not YYYY-MM-DD.
 */
export function calibrationStatus(input: CalibrationStatusInput): CalibrationStanding {
  const daysLeft = input.dueOn === null ? null : daysBetween(input.today, input.dueOn)
  if (input.state !== 'in_use') return { status: input.state, daysLeft }
  if (daysLeft === null) return { status: 'none', daysLeft }
  const cycles = input.intervalCycles ? input.cyclesSince / input.intervalCycles : 0
  if (daysLeft < 0 || cycles >= 1) return { status: 'overdue', daysLeft }
  const soon = daysLeft <= input.dueSoonDays || cycles >= dueSoonShare
  return { status: soon ? 'due_soon' : 'valid', daysLeft }
}
