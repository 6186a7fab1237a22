const minuteMs = 60_000

/** How far a clock in `timeZone` is ahead of UTC at an instant, in minutes. */
function offsetMinutes(at: number, timeZone: string): number {
  const parts = new Intl.DateTimeFormat('en-GB', {
    timeZone, year: 'numeric', month: 'numeric', day: 'numeric', hour: 'numeric', minute: 'numeric', hourCycle: 'h23',
  }).formatToParts(at)
  const part = (type: string) => Number(parts.find(given => given.type === type)?.value)
  const wall = Date.UTC(part('year'), part('month') - 1, part('day'), part('hour'), part('minute'))
  return Math.round((wall - Math.floor(at / minuteMs) * minuteMs) / minuteMs)
}

/**
 * The instant (ISO 8601, UTC) at which clocks in the shop's time zone show a wall time, YYYY-MM-DDTHH:MM; null when it
 * is not one. Of an hour that comes twice the first counts.
 */
export function instantIn(wallTime: string, timeZone: string): string | null {
  const wall = /^\d{4}-\d{2}-\d{2}T\d{2}:\d{2}$/.test(wallTime) ? Date.parse(`${wallTime}Z`) : Number.NaN
  if (Number.isNaN(wall)) return null
  const guess = wall - offsetMinutes(wall, timeZone) * minuteMs
  return new Date(wall - offsetMinutes(guess, timeZone) * minuteMs).toISOString()
}

/** Wall time in the shop's time zone, YYYY-MM-DDTHH:MM, as a date-and-time field takes it. */
export function wallTimeIn(at: Date, timeZone: string): string {
  return new Date(at.getTime() + offsetMinutes(at.getTime(), timeZone) * minuteMs).toISOString().slice(0, 16)
}
