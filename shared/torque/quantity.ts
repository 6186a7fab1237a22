import { fromNm, toNm, type Quantity, type TorqueUnit } from './units'

export type ParsedQuantity
  = | { ok: true, value: number, unit: TorqueUnit, text: string }
    | { ok: false, message: string }

/** Longest text that can still be one torque. */
const longestText = 40

/** Outside these no torque is meant: N·m, both far beyond any hand tool. */
export const smallestNm = 1e-6
export const largestNm = 1e6

const foot = '(?:ft|foot|feet)'
const inch = '(?:in|inch|inches)'
const pound = '(?:lbs?|lbf|pounds?|poundforce)'
const ounce = '(?:oz|ozf|ounces?)'
const kilogram = '(?:kg|kgf|kp)'
const newton = '(?:n|newtons?)'
const either = (a: string, b: string) => new RegExp(`^(?:${a}${b}|${b}${a})$`)

// Matched against the unit as typed, in lower case and without spaces, points, dots and dashes.
const spellings: readonly (readonly [RegExp, TorqueUnit])[] = [
  [new RegExp(`^${newton}(?:m|met(?:er|re)s?)$`), 'N.m'],
  [either(foot, pound), 'lbf.ft'],
  [/^(?:ft|foot)\/lbs?$/, 'lbf.ft'],
  [either(inch, pound), 'lbf.in'],
  [/^(?:in|inch)\/lbs?$/, 'lbf.in'],
  [either(ounce, inch), 'ozf.in'],
  [either(kilogram, 'm'), 'kgf.m'],
  [either(kilogram, 'cm'), 'kgf.cm'],
  [/^(?:cnm|ncm)$/, 'cN.m'],
  [/^dnm$/, 'dN.m'],
  [/^knm$/, 'kN.m'],
]

function parseUnit(typed: string): TorqueUnit | undefined {
  const key = typed.toLowerCase().replace(/[\s.·⋅•∙‧・*_\-‐‑‒–—−]/g, '')
  return spellings.find(([pattern]) => pattern.test(key))?.[1]
}

type ParsedNumber = number | 'unreadable' | 'ambiguous'

/**
 * A point is a decimal point and one comma a decimal comma ("5,1"). Where both stand, or one stands several times, the
 * last kind is the decimal sign and the other must group by threes ("1.234,5", "1,234.5"). "1,234" alone could be
 * either and is not guessed: wrong by a thousand is worse than typing it again.
 */
function parseNumber(typed: string): ParsedNumber {
  const match = /^([\d.,]+?)[.,]?(e[+-]?\d+)?$/.exec(typed)
  const body = match?.[1] ?? ''
  const exponent = match?.[2] ?? ''
  const plain = (text: string) => /^(?:\d+\.?\d*|\.\d+)$/.test(text) ? Number(text + exponent) : 'unreadable'
  if (/^[1-9]\d{0,2},\d{3}$/.test(body)) return 'ambiguous'
  if (/^\d{1,3}(?:,\d{3})+\.\d*$|^\d{1,3}(?:,\d{3}){2,}$/.test(body)) return plain(body.replaceAll(',', ''))
  if (/^\d{1,3}(?:\.\d{3})+,\d+$/.test(body)) return plain(body.replaceAll('.', '').replace(',', '.'))
  return plain(body.replace(',', '.'))
}

const refuse = (message: string): ParsedQuantity => ({ ok: false, message })

/**
 * Reads a torque as people type it: "37 ft-lb", "37 lb·ft", "450 in lbs", "50Nm", "5,1 kgm".
 * A number alone takes `fallbackUnit`. Never throws: what cannot be a torque is refused with a message for the person.
 * `text` is what was typed, without the space around it. Source: own rule.
 */
export function parseQuantity(text: string, fallbackUnit?: TorqueUnit): ParsedQuantity {
  if (text.length > longestText) return refuse('Too long for a torque. Write a number and a unit, such as 37 ft·lb.')
  const typed = text.trim()
  if (typed === '') return refuse('Write a number and a unit, such as 37 ft·lb.')
  const match = /^([+\-−–]?)\s*([\d.,]*\d[\d.,]*(?:e[+-]?\d+)?)(.*)$/is.exec(typed.normalize('NFKC'))
  if (!match) return refuse('Begin with a number, such as 37 ft·lb.')
  const [, sign = '', digits = '', unitText = ''] = match

  const number = parseNumber(digits.toLowerCase())
  if (number === 'ambiguous') {
    return refuse(`${digits} can be read in two ways. Write ${digits.replace(',', '')} or ${digits.replace(',', '.')}.`)
  }
  if (number === 'unreadable') return refuse(`${digits} is not a number we can read. Write it like 37 or 37.5.`)
  if (number === 0 || (sign !== '' && sign !== '+')) return refuse('A torque must be greater than zero.')

  const unit = unitText.trim() === '' ? fallbackUnit : parseUnit(unitText)
  if (!unit) {
    return refuse(unitText.trim() === ''
      ? 'Say the unit as well, such as 37 ft·lb or 50 N·m.'
      : `We do not know the unit “${unitText.trim()}”. Use N·m, ft·lb, in·lb, oz·in, kgf·m or kgf·cm.`)
  }
  const nm = toNm({ value: number, unit })
  if (!(nm <= largestNm)) return refuse('That is more than any torque wrench can give.')
  if (nm < smallestNm) return refuse('That is too small for a torque.')
  return { ok: true, value: number, unit, text: typed }
}

const labels: Record<TorqueUnit, string> = {
  'N.m': 'N·m',
  'lbf.ft': 'ft·lb',
  'lbf.in': 'in·lb',
  'ozf.in': 'oz·in',
  'kgf.m': 'kgf·m',
  'kgf.cm': 'kgf·cm',
  'cN.m': 'cN·m',
  'dN.m': 'dN·m',
  'kN.m': 'kN·m',
}

/** The unit as it is shown to people, such as "ft·lb". */
export function unitLabel(unit: TorqueUnit): string {
  return labels[unit]
}

/**
 * A number for the eye, with a decimal point and no grouping. With `digits`: at most so many decimals. Without: what a
 * person could have written (up to three decimals) stays as it is; anything longer is rounded to three significant
 * figures, never touching the whole part. Only for showing: nothing is compared on it.
 */
export function formatNumber(value: number, digits?: number): string {
  if (!Number.isFinite(value)) return '–'
  if (digits === undefined && Number(value.toFixed(3)) === value) return String(value)
  const magnitude = value === 0 ? 0 : Math.floor(Math.log10(Math.abs(value)))
  const decimals = digits ?? Math.max(0, 2 - magnitude)
  return String(Number(value.toFixed(Math.min(decimals, 20))))
}

/** A torque with its unit, such as "37 ft·lb"; `digits` as in formatNumber. */
export function formatQuantity(quantity: Quantity, digits?: number): string {
  return `${formatNumber(quantity.value, digits)} ${unitLabel(quantity.unit)}`
}

/** Below this an SI torque is shown in in·lb rather than ft·lb: N·m, own rule. */
const inchPoundsBelowNm = 20

/**
 * The unit to show beside `unit`, so that both systems are always seen: N·m beside the inch units, ft·lb beside the
 * others, or in·lb where the torque (`nm`, N·m) is given and small.
 */
export function counterpartUnit(unit: TorqueUnit, nm?: number): TorqueUnit {
  if (unit === 'lbf.ft' || unit === 'lbf.in' || unit === 'ozf.in') return 'N.m'
  return nm !== undefined && nm < inchPoundsBelowNm ? 'lbf.in' : 'lbf.ft'
}

/**
 * The printed value as printed, and the same torque (`nm`, N·m) in the other system. A value printed in kgf stands in
 * neither, so both N·m and ft·lb are given beside it.
 */
export function formatBoth(nm: number, printed: Quantity): { printed: string, other: string } {
  const inUnit = (unit: TorqueUnit) => formatQuantity({ value: Number(fromNm(nm, unit).toPrecision(12)), unit })
  const other = inUnit(counterpartUnit(printed.unit, nm))
  const kilograms = printed.unit === 'kgf.m' || printed.unit === 'kgf.cm'
  return { printed: formatQuantity(printed), other: kilograms ? `${inUnit('N.m')}, ${other}` : other }
}
