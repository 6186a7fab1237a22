import { formatNumber, unitLabel } from '#shared/torque/quantity'
import { fromNm, type TorqueUnit } from '#shared/torque/units'
import type { CalibrationStatus, WrenchKind, WrenchState } from '#shared/types/words'
import type { ToolClass } from '#shared/wrench/classes'
import { formatEven } from './format'

export const calibrationStatusWords: Record<CalibrationStatus, string> = {
  valid: 'In calibration',
  due_soon: 'Due soon',
  overdue: 'Overdue',
  none: 'Never calibrated',
  quarantined: 'Quarantined',
  at_laboratory: 'At the laboratory',
  lost: 'Lost',
  retired: 'Retired',
}

export const wrenchKindWords: Record<WrenchKind, string> = { setting: 'Setting (click)', indicating: 'Indicating' }

export const wrenchStateWords: Record<WrenchState, string> = {
  in_use: 'In use',
  quarantined: 'Quarantined',
  at_laboratory: 'At the laboratory',
  lost: 'Lost',
  retired: 'Retired',
}

/** Types and classes in words. Source: ISO 6789-1:2017 [memory]. */
export const toolClassWords: Record<ToolClass, string> = {
  'I-A': 'I-A, torsion or flexion bar',
  'I-B': 'I-B, rigid housing with scale, dial or display',
  'I-C': 'I-C, rigid housing, electronic',
  'I-D': 'I-D, screwdriver with scale, dial or display',
  'I-E': 'I-E, electronic screwdriver',
  'II-A': 'II-A, adjustable, graduated or with display',
  'II-B': 'II-B, fixed setting',
  'II-C': 'II-C, adjustable, not graduated',
  'II-D': 'II-D, screwdriver, adjustable, graduated',
  'II-E': 'II-E, screwdriver, fixed setting',
  'II-F': 'II-F, screwdriver, adjustable, not graduated',
  'II-G': 'II-G, flexion bar, adjustable, graduated',
}

export const directionWords = { clockwise: 'clockwise', anticlockwise: 'anticlockwise' } as const
export const phaseWords = { as_found: 'As found', as_left: 'As left' } as const

/** The range of a wrench in a unit: "40–200 N·m". */
export function rangeIn(unit: TorqueUnit, range: { min: number, max: number, unit: TorqueUnit, minNm: number, maxNm: number }): string {
  if (unit === range.unit) return `${formatNumber(range.min)}–${formatNumber(range.max)} ${unitLabel(unit)}`
  return `${formatEven(fromNm(range.minNm, unit))}–${formatEven(fromNm(range.maxNm, unit))} ${unitLabel(unit)}`
}

/** A deviation with its sign: "+4.2 %", "−1.0 %", "0.0 %". */
export function deviationText(percent: number, digits = 1): string {
  const figure = Math.abs(percent).toFixed(digits)
  const sign = Number(figure) === 0 ? '' : percent > 0 ? '+' : '−'
  return `${sign}${figure} %`
}

/** What the sign of a deviation means at the bolt. Positive: the wrench shows more than it gives. */
export function deviationWords(percent: number, digits = 1): string {
  if (Number(Math.abs(percent).toFixed(digits)) === 0) return 'reads true'
  return percent > 0 ? 'reads high: the bolt gets less' : 'reads low: the bolt gets more'
}

/** Days to the due date say something only of a wrench that is in use. */
export function showsDaysLeft({ status, daysLeft }: { status: CalibrationStatus, daysLeft: number | null }): boolean {
  return daysLeft !== null && (status === 'valid' || status === 'due_soon' || status === 'overdue')
}

/** The sign of a deviation in two words, where there is no room for more. */
export const readsWord = (percent: number): string => deviationWords(percent, 2).split(':')[0] ?? ''
