import { fromNm } from '#shared/torque/units'
import { assessPoint, deviationPercent, type CalibrationReading } from '#shared/wrench/calibration'
import { dueOn } from '#shared/wrench/due'
import { budget } from '#shared/wrench/uncertainty'
import { asksFor, type CalibratedWrench, type CalibrationForm, type Phase, type PointEntry, type ReadingEntry } from './calibration-form'

/** What is said of one reading while it is typed; null while it is no pair of numbers. */
export type JudgedReading = { deviationPercent: number, inside: boolean } | null

export interface JudgedPoint {
  target: number | null
  readings: JudgedReading[]
  /** Null until there is a reading. */
  figures: { meanDeviationPercent: number, wPercent: number | null, wPrimePercent: number, verdict: 'pass' | 'fail' } | null
  missing: number
}

function positive(text: string): number | null {
  const value = Number(text.trim().replace(',', '.'))
  return value > 0 && Number.isFinite(value) ? value : null
}

function pairOf(form: CalibrationForm, point: PointEntry, reading: ReadingEntry): CalibrationReading | null {
  const indicated = positive(form.indicatesPoint ? point.target : reading.indicated)
  const reference = positive(reading.reference)
  return indicated === null || reference === null ? null : { indicated, reference }
}

/** Deviation and verdict of every reading of a point, and its figures, by the rules the server computes with. */
export function judgePoint(form: CalibrationForm, point: PointEntry, wrench: CalibratedWrench): JudgedPoint {
  const limitPercent = wrench.permissiblePercent
  const pairs = point.readings.map(reading => pairOf(form, point, reading))
  const known = pairs.flatMap(pair => pair ?? [])
  const target = positive(point.target)
  const readings = pairs.map((pair) => {
    if (!pair) return null
    const deviation = deviationPercent(pair.indicated, pair.reference)
    return { deviationPercent: deviation, inside: Math.abs(deviation) <= limitPercent + 1e-9 }
  })
  const missing = pairs.length - known.length
  if (target === null || known.length === 0) return { target, readings, figures: null, missing }
  const { verdict, meanDeviationPercent } = assessPoint({ targetNm: target, readings: known, limitPercent })
  const computed = budget({
    target,
    readings: known,
    uncertaintyPercent: positive(form.uncertaintyPercent) ?? 0,
    graduation: wrench.graduation && fromNm(wrench.graduation.nm, form.unit),
  })
  const stated = form.statesUncertainty ? { w: positive(point.wPercent), wPrime: positive(point.wPrimePercent) } : { w: null, wPrime: null }
  const wPercent = stated.w ?? (stated.wPrime === null ? computed.wPercent : null)
  const wPrimePercent = stated.wPrime ?? Math.abs(meanDeviationPercent) + (wPercent ?? 0)
  return { target, readings, figures: { meanDeviationPercent, wPercent, wPrimePercent, verdict }, missing }
}

export interface JudgedPhase {
  verdict: 'pass' | 'fail'
  /** Readings not written yet. */
  missing: number
  /** The reading farthest from true. */
  worst: { target: number, deviationPercent: number }
}

/** All points of a phase together; null while nothing is measured or it is not asked for. */
export function judgePhase(form: CalibrationForm, phase: Phase, wrench: CalibratedWrench): JudgedPhase | null {
  if (!asksFor(form, phase)) return null
  const points = form[phase].map(point => judgePoint(form, point, wrench))
  const readings = points.flatMap(({ target, readings }) =>
    readings.flatMap(reading => reading && target !== null ? { target, deviationPercent: reading.deviationPercent } : []))
  const worst = readings.toSorted((a, b) => Math.abs(b.deviationPercent) - Math.abs(a.deviationPercent))[0]
  if (!worst) return null
  return {
    verdict: points.some(point => point.figures?.verdict === 'fail') ? 'fail' : 'pass',
    missing: points.reduce((sum, point) => sum + point.missing, 0),
    worst,
  }
}

/** What saving the calibration will say of the wrench. */
export interface Outcome {
  asFound: JudgedPhase | null
  asLeft: JudgedPhase | null
  /** That of as found, or of as left where as found is unavailable; null while it cannot be told. */
  result: 'pass' | 'fail' | null
  /** Fit for use afterwards: as left passes, or as found where there is no as left. */
  usable: boolean | null
  dueOn: string | null
}

export function outcomeOf(form: CalibrationForm, wrench: CalibratedWrench): Outcome {
  const asFound = judgePhase(form, 'asFound', wrench)
  const asLeft = judgePhase(form, 'asLeft', wrench)
  const last = asksFor(form, 'asLeft') ? asLeft : asFound
  return {
    asFound,
    asLeft,
    result: (form.asFoundMeasured ? asFound : asLeft)?.verdict ?? null,
    usable: last ? last.verdict === 'pass' : null,
    dueOn: /^\d{4}-\d{2}-\d{2}$/.test(form.performedOn) ? dueOn(form.performedOn, wrench.intervalMonths) : null,
  }
}
