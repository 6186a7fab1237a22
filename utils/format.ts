import type { Verdict } from '#shared/torque/verdict'

const months = ['Jan', 'Feb', 'Mar', 'Apr', 'May', 'Jun', 'Jul', 'Aug', 'Sep', 'Oct', 'Nov', 'Dec'] as const

/** Stands where there is nothing to show. */
export const nothing = '–'

// Making a formatter costs far more than using it.
const formatters = new Map<string, Intl.DateTimeFormat>()

function formatterFor(timeZone: string): Intl.DateTimeFormat {
  const known = formatters.get(timeZone)
  if (known) return known
  const made = new Intl.DateTimeFormat('en-GB', {
    timeZone, year: 'numeric', month: '2-digit', day: '2-digit', hour: '2-digit', minute: '2-digit', hourCycle: 'h23',
  })
  formatters.set(timeZone, made)
  return made
}

/** Day and time of an instant as a clock in `timeZone` shows them; null when `at` is not a time. */
function clockIn(at: string | Date, timeZone: string): { day: string, time: string } | null {
  const instant = new Date(at)
  if (Number.isNaN(instant.getTime())) return null
  const part: Partial<Record<Intl.DateTimeFormatPartTypes, string>> = {}
  for (const { type, value } of formatterFor(timeZone).formatToParts(instant)) part[type] = value
  return { day: `${part.year}-${part.month}-${part.day}`, time: `${part.hour}:${part.minute}` }
}

/** A date without time, YYYY-MM-DD, as "14 Mar 2027". */
export function formatDay(day: string | null | undefined): string {
  const [, year, month, date] = /^(\d{4})-(\d{2})-(\d{2})$/.exec(day ?? '') ?? []
  const name = months[Number(month) - 1]
  return year && date && name ? `${Number(date)} ${name} ${year}` : nothing
}

/** The date an instant (ISO 8601) falls on in the shop's time zone, as "2 Dec 2026". */
export function formatDate(at: string | Date | null | undefined, timeZone: string): string {
  const clock = at ? clockIn(at, timeZone) : null
  return clock ? formatDay(clock.day) : nothing
}

/** The time of an instant (ISO 8601) in the shop's time zone, as "08:41". */
export function formatTime(at: string | Date | null | undefined, timeZone: string): string {
  const clock = at ? clockIn(at, timeZone) : null
  return clock ? clock.time : nothing
}

/** Date and time of an instant (ISO 8601) in the shop's time zone, as "2 Dec 2026 08:41". */
export function formatDateTime(at: string | Date | null | undefined, timeZone: string): string {
  const clock = at ? clockIn(at, timeZone) : null
  return clock ? `${formatDay(clock.day)} ${clock.time}` : nothing
}

/** The date, YYYY-MM-DD, an instant falls on in the shop's time zone. */
export function dayIn(at: string | Date, timeZone: string): string {
  return clockIn(at, timeZone)?.day ?? ''
}

/** How far off a due date is, in words: "due today", "3 days left", "overdue by 1 day". */
export function formatDaysLeft(daysLeft: number): string {
  const days = Math.abs(daysLeft) === 1 ? '1 day' : `${Math.abs(daysLeft)} days`
  if (daysLeft === 0) return 'due today'
  return daysLeft > 0 ? `${days} left` : `overdue by ${days}`
}

/** Calendar months from one date to a later one (both YYYY-MM-DD), a begun month counting as one; 0 when it is past. */
export function monthsUntil(from: string, to: string): number {
  if (to < from) return 0
  const [fromYear = 0, fromMonth = 0, fromDate = 0] = from.split('-').map(Number)
  const [toYear = 0, toMonth = 0, toDate = 0] = to.split('-').map(Number)
  const whole = (toYear - fromYear) * 12 + toMonth - fromMonth
  return Math.max(1, toDate > fromDate ? whole + 1 : whole)
}

/** A count with its noun: "1 bolt", "6 bolts". `many` is needed where it is not the noun with an s. */
export function formatCount(count: number, one: string, many = `${one}s`): string {
  return `${count} ${count === 1 ? one : many}`
}

/** Share as a percentage, such as "97.4 %"; never rounded up to 100. */
export function formatPercent(share: number, digits = 1): string {
  const step = 10 ** digits
  const percent = share >= 1 ? 100 : Math.floor(share * 100 * step + 1e-9) / step
  return `${percent.toFixed(digits)} %`
}

/** The verdict in words, as badges and text alternatives say it. */
export const verdictWords: Record<Verdict, string> = { in_band: 'In band', edge: 'Edge', low: 'Low', high: 'High' }

/** A place in an order: "1st", "2nd", "3rd", "11th". */
export function ordinal(place: number): string {
  const lastTwo = place % 100
  if (lastTwo >= 11 && lastTwo <= 13) return `${place}th`
  return `${place}${{ 1: 'st', 2: 'nd', 3: 'rd' }[place % 10] ?? 'th'}`
}

/** A computed figure for columns and scales, so that the points stand in line: one decimal, more only below 1. */
export function formatEven(value: number): string {
  return value !== 0 && Math.abs(value) < 0.95 ? String(Number(value.toPrecision(3))) : value.toFixed(1)
}
