import { formatNumber, formatQuantity, unitLabel } from '#shared/torque/quantity'
import { checkDualUnits } from '#shared/torque/dual-unit'
import type { Pattern } from '#shared/torque/order'
import type { StageKind } from '#shared/torque/stages'
import type { Tolerance } from '#shared/torque/tolerance'
import { convertTorque, type Quantity } from '#shared/torque/units'
import type { JointClass, RevisionStatus, SpecKind } from '#shared/types/words'
import { formatCount } from './format'

export const jointClassWords: Record<JointClass, string> = { safety: 'Safety', sealing: 'Sealing', general: 'General' }
export const revisionStatusWords: Record<RevisionStatus, string> = { draft: 'Draft', approved: 'Approved', withdrawn: 'Withdrawn' }
export const specKindWords: Record<SpecKind, string> = { joint: 'Joint spec', general_table: 'General table' }
export const patternWords: Record<Pattern, string> = { circle: 'Circle', row: 'Row', two_rows: 'Two rows', free: 'As drawn' }
export const stageWords: Record<StageKind, string> = { snug: 'Snug', torque: 'Torque', percent: 'Share of the target', angle: 'Angle' }

/** How the running torque of a self-locking nut counts towards the target. */
export const runningRuleWords = {
  not_added: 'not added to the target',
  always_added: 'always added to the target',
  added_from_a_third: 'added when it is a third of the target or more',
} as const
export type RunningRule = keyof typeof runningRuleWords

/** Two torques of one range, the unit said once where both share it: "12 to 15 ft·lb". */
export function rangeWords(lower: Quantity, upper: Quantity): string {
  const from = lower.unit === upper.unit ? formatNumber(lower.value) : formatQuantity(lower)
  return `${from} to ${formatQuantity(upper)}`
}

/** A tolerance as printed; without one, the shop's own percent. */
export function toleranceWords(tolerance: Tolerance | null, shopPercent: number): string {
  if (!tolerance) return `none printed: the shop’s own ± ${formatNumber(shopPercent)} %`
  if (tolerance.kind === 'percent') return `± ${formatNumber(tolerance.value)} %`
  if (tolerance.kind === 'absolute') return `± ${formatQuantity(tolerance)}`
  return rangeWords(tolerance.lower, tolerance.upper)
}

export interface Mismatch {
  /** What the two figures say and how far apart they are. */
  text: string
  /** They would agree if they changed places. */
  swapped: boolean
}

/**
 * Why two printed figures cannot be one torque: "20 ft·lb is 27.1 N·m; 25 N·m printed beside it is 2.1 N·m off, more
 * than rounding explains." Null when rounding explains the difference.
 */
export function explainMismatch(first: Quantity, second: Quantity): Mismatch | null {
  const { explained, diffNm, swapped } = checkDualUnits({ first, second })
  if (explained) return null
  const converted = formatNumber(convertTorque(first.value, first.unit, second.unit), second.value < 10 ? 2 : 1)
  const off = formatNumber(Math.abs(diffNm), Math.abs(diffNm) < 0.95 ? 2 : 1)
  return {
    text: `${formatQuantity(first)} is ${converted} ${unitLabel(second.unit)}; ${formatQuantity(second)} printed beside it is ${off} N·m off, more than rounding explains.`,
    swapped,
  }
}

export const swappedHint = 'The other way round the two would agree: the columns may be swapped in the source.'

/** Every pair of a spec that disagrees: the value, or the lower and the upper limit. */
export function mismatchesOf(spec: {
  target: Quantity | null
  printed: Quantity | null
  tolerance: Tolerance | null
  printedLimits: { lower: Quantity, upper: Quantity } | null
}): Mismatch[] {
  const { target, printed, tolerance, printedLimits } = spec
  const pairs: (readonly [Quantity, Quantity])[] = []
  if (target && printed) pairs.push([target, printed])
  if (tolerance?.kind === 'limits' && printedLimits) {
    pairs.push([tolerance.lower, printedLimits.lower], [tolerance.upper, printedLimits.upper])
  }
  return pairs.flatMap(([first, second]) => explainMismatch(first, second) ?? [])
}

/** Where a value is printed, in one line: "TM 1-2-3, paragraph 4-46A, page 4-95, 1998". */
export function specSourceWords(source: { title: string, section?: string | null, page?: string | null, date?: string | null }): string {
  const page = source.page && (/^p/i.test(source.page) ? source.page : `page ${source.page}`)
  return [source.title, source.section, page, source.date].filter(Boolean).join(', ')
}

/** Vehicles a spec is for: "Ardent Mule 4x4, 2018–2022, 3.2 D"; null when it is for all. */
export function appliesToWords(appliesTo: {
  make?: string
  model?: string
  engine?: string
  yearFrom?: number
  yearTo?: number
} | null): string | null {
  if (!appliesTo) return null
  const { make, model, engine, yearFrom, yearTo } = appliesTo
  const years = yearFrom && yearTo
    ? (yearFrom === yearTo ? String(yearFrom) : `${yearFrom}–${yearTo}`)
    : yearFrom ? `from ${yearFrom}` : yearTo ? `up to ${yearTo}` : ''
  return [[make, model].filter(Boolean).join(' '), years, engine].filter(Boolean).join(', ') || null
}

/** When the joint is to be tightened again: "after 80 km or 14 days"; null where nothing is said. */
export function retorqueWords(retorque: { afterKm?: number, afterDays?: number, note?: string } | null): string | null {
  if (!retorque) return null
  const after = [retorque.afterKm && `${retorque.afterKm} km`, retorque.afterDays && formatCount(retorque.afterDays, 'day')].filter(Boolean)
  return [after.length > 0 && `after ${after.join(' or ')}`, retorque.note].filter(Boolean).join('; ') || null
}

/** What stands as printed for the target: the value that governs, or none where only limits are printed. */
export function governingTarget({ target, printed, governs }: {
  target: Quantity | null
  printed: Quantity | null
  governs: 'target' | 'printed' | null
}): Quantity | null {
  const value = governs === 'printed' ? printed : target
  return value && { value: value.value, unit: value.unit }
}

/** How far apart two printed values are, and how far rounding reaches: "2.1 N·m apart; rounding explains 1.2 N·m." */
export function flagWords({ diffNm, limitNm }: { diffNm: number, limitNm: number }): string {
  const figure = (nm: number) => formatNumber(Math.abs(nm), Math.abs(nm) < 0.95 ? 2 : 1)
  return `${figure(diffNm)} N·m apart; rounding explains ${figure(limitNm)} N·m.`
}
