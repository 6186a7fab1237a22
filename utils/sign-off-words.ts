import type { SignOffDetail, SignOffListItem } from '#shared/schemas/sign-offs'
import { formatNumber, formatQuantity } from '#shared/torque/quantity'
import type { Verdict } from '#shared/torque/verdict'
import type { ExceptionCode, SecondCheckMethod } from '#shared/types/words'
import type { BoltState } from './bolt-layout'
import { formatCount, formatPercent } from './format'

/** What was not as it should have been, in words. */
export const exceptionWords: Record<ExceptionCode, string> = {
  out_of_band: 'out of band',
  setting_out_of_band: 'set outside the band',
  preparation_contradicts: 'preparation contradicts the spec',
  wrench_unfit: 'wrench was unfit',
  clock_off: 'device clock was off',
  late_entry: 'late entry',
  spec_withdrawn: 'spec was withdrawn',
  angle_retightened: 'retightened after an angle stage',
  not_competent: 'signer not qualified for it',
}

export const methodWords: Record<SecondCheckMethod, string> = {
  witness: 'Watched while it was tightened',
  setting: 'Wrench at the setting',
  residual: 'Residual torque',
}

type Stroke = SignOffListItem['readings'][number] & { clicks?: number }

/** Readings as strokes on the band: equal ones of a setting wrench are one stroke with its clicks. */
export function strokesOf({ readings, wrench }: Pick<SignOffListItem, 'readings'> & { wrench: { kind: 'setting' | 'indicating' } }): Stroke[] {
  if (wrench.kind === 'indicating') return [...readings]
  const settings = new Map<number, Stroke>()
  for (const reading of readings) {
    const known = settings.get(reading.nm)
    settings.set(reading.nm, { ...reading, clicks: (known?.clicks ?? 0) + 1 })
  }
  return [...settings.values()]
}

/** What the strokes are, such as "6 clicks at one setting" or "3 readings". */
export function strokeWords(item: Parameters<typeof strokesOf>[0]): string {
  const { length } = item.readings
  if (length === 0) return 'turned by angle'
  if (item.wrench.kind === 'indicating') return formatCount(length, 'reading')
  const settings = strokesOf(item).length
  return `${formatCount(length, 'click')} at ${settings === 1 ? 'one setting' : `${settings} settings`}`
}

/** What the paint on the joint says. */
export function markOf({ standing, checked, verdict }: Pick<SignOffListItem, 'standing' | 'checked' | 'verdict'>): BoltState {
  if (!standing) return 'none'
  if (verdict === 'low' || verdict === 'high') return 'out'
  return checked ? 'checked' : 'signed'
}

/** The day after one of the form YYYY-MM-DD: "until" is meant with its day, the API's `to` without. */
export function dayAfter(day: string): string {
  const at = new Date(`${day}T00:00:00Z`)
  if (Number.isNaN(at.getTime())) return ''
  at.setUTCDate(at.getUTCDate() + 1)
  return at.toISOString().slice(0, 10)
}

type AnsweredReading = SignOffDetail['readings'][number]

/** The torque readings that count: of each position and stage the last attempt. */
export function countingReadings(readings: readonly AnsweredReading[]): { nm: number, verdict: Verdict | null }[] {
  const last = new Map<string, AnsweredReading>()
  for (const reading of readings) {
    const place = `${reading.stage}/${reading.position}`
    if ((last.get(place)?.attempt ?? 0) < reading.attempt) last.set(place, reading)
  }
  return [...last.values()].flatMap(({ nm, verdict }) => nm === null ? [] : [{ nm, verdict }])
}

/** Whether another attempt followed on the same position and stage. */
export function wasRepeated(reading: AnsweredReading, readings: readonly AnsweredReading[]): boolean {
  return readings.some(({ position, stage, attempt }) =>
    position === reading.position && stage === reading.stage && attempt > reading.attempt)
}

/** What was set, shown or turned, as it was entered. */
export function enteredWords({ value, unit }: Pick<AnsweredReading, 'value' | 'unit'>): string {
  if (value === null || unit === null) return 'snug'
  return unit === 'deg' ? `${formatNumber(value)}°` : formatQuantity({ value, unit })
}

/** A probability as the record states it; nothing is ever certain, so the ends are said as bounds. Null stays null. */
export function probabilityFigure(probability: number | null): string | null {
  if (probability === null) return null
  if (probability > 0.999) return '> 99.9 %'
  return probability < 0.001 ? '< 0.1 %' : formatPercent(probability)
}
