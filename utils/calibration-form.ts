import type { WrenchAnswer } from '#shared/schemas/wrenches'
import { fromNm, type TorqueUnit } from '#shared/torque/units'
import { classOf, readingsPerPoint } from '#shared/wrench/classes'

export type Direction = NonNullable<WrenchAnswer['directions']>[number]

export interface ReadingEntry {
  indicated: string
  reference: string
}

export interface PointEntry {
  key: number
  target: string
  direction: Direction | ''
  readings: ReadingEntry[]
  /** The certificate's own figures, where it states them. */
  wPercent: string
  wPrimePercent: string
}

/** Everything the form of a calibration holds, as typed. All torques are in `unit`. */
export interface CalibrationForm {
  performedOn: string
  laboratory: string
  certificateNumber: string
  uncertaintyPercent: string
  unit: TorqueUnit
  /** A setting wrench: every reading indicates the point itself, so only the reference is typed. */
  indicatesPoint: boolean
  statesUncertainty: boolean
  asFoundMeasured: boolean
  unavailableReason: string
  asFound: PointEntry[]
  adjusted: boolean
  asLeftMeasured: boolean
  asLeft: PointEntry[]
  note: string
}

export type Phase = 'asFound' | 'asLeft'

/** What of a wrench a calibration needs to know. */
export type CalibratedWrench = Pick<WrenchAnswer, 'kind' | 'toolClass' | 'range' | 'graduation' | 'directions' | 'permissiblePercent' | 'intervalMonths'>

export const emptyReading = (): ReadingEntry => ({ indicated: '', reference: '' })

/**
 * Test points of a tool in a unit: its lowest marked value (20 % of its largest torque for many), 60 % and 100 % of its
 * largest torque. A fixed tool has one point. Source: ISO 6789-1:2017 [memory]; the lowest marked value from an article
 * on the 2017 edition.
 */
export function testPoints({ min, max }: { min: number, max: number }): number[] {
  const middle = Number((0.6 * max).toPrecision(4))
  return [min, ...[middle, max].filter(point => point > min)]
}

/** The points a calibration of this wrench usually has, each with room for the readings of its class. */
export function defaultPoints(wrench: CalibratedWrench, unit: TorqueUnit): PointEntry[] {
  const { range } = wrench
  const inUnit = (nm: number) => Number(fromNm(nm, unit).toPrecision(4))
  const targets = testPoints(unit === range.unit ? range : { min: inUnit(range.minNm), max: inUnit(range.maxNm) })
  const readings = readingsPerPoint(classOf(wrench))
  const directions: (Direction | '')[] = wrench.directions?.length ? wrench.directions : ['']
  return directions.flatMap(direction => targets.map(target => ({ target, direction }))).map(({ target, direction }, index) => ({
    key: index + 1, target: String(target), direction, readings: Array.from({ length: readings }, emptyReading), wPercent: '', wPrimePercent: '',
  }))
}

export function emptyCalibrationForm(wrench: CalibratedWrench, today: string): CalibrationForm {
  const unit = wrench.range.unit
  return {
    performedOn: today, laboratory: '', certificateNumber: '', uncertaintyPercent: '', unit,
    indicatesPoint: wrench.kind === 'setting', statesUncertainty: false, asFoundMeasured: true, unavailableReason: '',
    asFound: defaultPoints(wrench, unit), adjusted: false, asLeftMeasured: false, asLeft: defaultPoints(wrench, unit), note: '',
  }
}

/** A further point after the last, as roomy as that one. */
export function nextPoint(points: readonly PointEntry[]): PointEntry {
  const last = points.at(-1)
  return {
    key: Math.max(0, ...points.map(point => point.key)) + 1, target: '', direction: last?.direction ?? '',
    readings: Array.from({ length: last?.readings.length ?? 5 }, emptyReading), wPercent: '', wPrimePercent: '',
  }
}

/** Points of the phase are asked for: as left after an adjustment, without an as found, or where it was measured. */
export function asksFor(form: CalibrationForm, phase: Phase): boolean {
  if (phase === 'asFound') return form.asFoundMeasured
  return form.adjusted || form.asLeftMeasured || !form.asFoundMeasured
}

/** Nothing has been measured in it yet. */
export const isUntouched = (points: readonly PointEntry[]): boolean =>
  points.every(point => point.readings.every(({ indicated, reference }) => !indicated.trim() && !reference.trim()))
