import { wrenchSetting, type WrenchSetting } from '#shared/torque/adapter'
import { orderFor, type Pattern } from '#shared/torque/order'
import { simpleProbability } from '#shared/torque/probability'
import { bandIssues, specLimits } from '#shared/torque/spec-rules'
import { toNm, type Quantity } from '#shared/torque/units'
import type { Limits, Tolerance } from '#shared/torque/tolerance'
import { verdictOf, type Verdict } from '#shared/torque/verdict'
import { MAX_BOLTS } from '#shared/schemas/torque-specs'
import { FieldReader, issueAt } from './form-issues'
import type { TorqueEntry } from './second-check-form'

export type ToleranceKind = 'shop' | 'percent' | 'absolute' | 'limits'

/** A band check as typed. */
export interface BandEntry {
  target: TorqueEntry
  kind: ToleranceKind
  percent: string
  absolute: TorqueEntry
  lower: TorqueEntry
  upper: TorqueEntry
  entered: TorqueEntry
  /** Expanded uncertainty (k = 2), percent; empty when it is not known. */
  uncertainty: string
}

export interface BandResult {
  limits: Limits
  /** Null until a torque is entered. */
  reading: { nm: number, verdict: Verdict, probability: number | null, uNm: number } | null
}

/** What a form says: its result, or what is wrong with it by field; neither while it is not filled in yet. */
export interface Worked<Result> {
  result: Result | null
  errorOf: (path: string) => string | null
}

const worked = <Result>(read: FieldReader, result: Result | null): Worked<Result> =>
  ({ result, errorOf: path => issueAt(read.issues, path) })

function toleranceOf(entry: BandEntry, read: FieldReader): Tolerance | null | undefined {
  if (entry.kind === 'shop') return null
  if (entry.kind === 'percent') {
    const value = read.number('percent', entry.percent)
    if (value !== undefined && !(value > 0 && value < 100)) read.issues.push({ path: 'percent', message: 'Above 0 and below 100.' })
    return value === undefined ? undefined : { kind: 'percent', value }
  }
  if (entry.kind === 'absolute') {
    const margin = read.quantity('absolute', entry.absolute)
    return margin && { kind: 'absolute', ...margin }
  }
  const lower = read.quantity('lower', entry.lower)
  const upper = read.quantity('upper', entry.upper)
  return lower && upper && { kind: 'limits', lower, upper }
}

const fieldOf: Record<string, string> = { 'tolerance.value': 'absolute', 'tolerance.lower': 'lower', 'tolerance.upper': 'upper' }

/** Band, verdict and probability of a torque, exactly as the server computes them. */
export function checkBand(entry: BandEntry, shopDefaultPercent: number): Worked<BandResult> {
  const read = new FieldReader()
  const target = read.quantity('target', entry.target)
  const tolerance = toleranceOf(entry, read)
  const entered = read.quantity('entered', entry.entered)
  const uncertaintyPercent = read.number('uncertainty', entry.uncertainty)
  if (uncertaintyPercent !== undefined && !(uncertaintyPercent >= 0 && uncertaintyPercent <= 100)) {
    read.issues.push({ path: 'uncertainty', message: 'From 0 to 100.' })
  }
  const told = tolerance !== undefined && (target !== undefined || tolerance?.kind === 'limits')
  if (!told || read.issues.length > 0) return worked<BandResult>(read, null)
  const said = { target, tolerance }
  for (const { path, message } of bandIssues(said)) read.issues.push({ path: fieldOf[path.join('.')] ?? path.join('.'), message })
  if (read.issues.length > 0) return worked<BandResult>(read, null)
  const limits = specLimits(said, shopDefaultPercent)
  if (!entered) return worked(read, { limits, reading: null })
  const nm = toNm(entered)
  const uNm = nm * (uncertaintyPercent ?? 0) / 100
  return worked(read, {
    limits,
    reading: { nm, uNm, verdict: verdictOf({ nm, ...limits, uNm }), probability: simpleProbability({ nm, ...limits, uncertaintyPercent }) },
  })
}

/** A wrench setting as typed; lengths in mm, angle in degrees. */
export interface SettingEntry {
  target: TorqueEntry
  graduation: TorqueEntry
  extension: string
  angle: string
  length: string
  multiplier: string
}

/** What to set on the wrench, with adapter and multiplier where they are given. */
export function workSetting(entry: SettingEntry): Worked<WrenchSetting> {
  const read = new FieldReader()
  const target = read.quantity('target', entry.target)
  const graduation: Quantity | undefined = read.quantity('graduation', entry.graduation)
  const extensionMm = read.number('extension', entry.extension)
  const effectiveLengthMm = read.number('length', entry.length)
  const angleDeg = read.number('angle', entry.angle) ?? 0
  const multiplierRatio = read.number('multiplier', entry.multiplier)
  if (extensionMm !== undefined && effectiveLengthMm === undefined) {
    read.issues.push({ path: 'length', message: 'With an adapter the effective length counts: drive centre to grip centre.' })
  }
  if (!target || read.issues.length > 0) return worked<WrenchSetting>(read, null)
  const adapter = extensionMm === undefined || effectiveLengthMm === undefined ? null : { extensionMm, angleDeg, effectiveLengthMm }
  try {
    return worked(read, wrenchSetting({ targetNm: toNm(target), unit: target.unit, adapter, multiplierRatio, graduation }))
  } catch (error) {
    if (!(error instanceof RangeError)) throw error
    read.issues.push({ path: 'extension', message: error.message })
    return worked<WrenchSetting>(read, null)
  }
}

/** The product's own tightening order for a number of bolts as typed. */
export function workOrder(pattern: Pattern, count: string): Worked<number[]> {
  const read = new FieldReader()
  const bolts = read.number('count', count)
  const fits = bolts !== undefined && Number.isInteger(bolts) && bolts >= 1 && bolts <= MAX_BOLTS
  if (bolts !== undefined && !fits) read.issues.push({ path: 'count', message: `A whole number from 1 to ${MAX_BOLTS}.` })
  if (fits && pattern === 'two_rows' && bolts % 2 === 1) read.issues.push({ path: 'count', message: 'Two rows need an even number of bolts.' })
  return worked(read, fits && read.issues.length === 0 ? orderFor(pattern, bolts) : null)
}
