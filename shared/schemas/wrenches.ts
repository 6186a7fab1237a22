import * as z from 'zod/mini'
import { toolClasses } from '../wrench/classes'
import { calibrationStatuses, wrenchKinds, wrenchStates } from '../types/words'
import { can, day, listOf, longText, moment, pageQuery, personBrief, positiveInteger, positiveNumber, quantity, reason, text, torqueUnit, uuid } from './common'

export const directions = ['clockwise', 'anticlockwise'] as const
const range = z.strictObject({ min: positiveNumber, max: positiveNumber, unit: torqueUnit })
const wrenchFields = {
  assetTag: text(40),
  serial: text(80),
  kind: z.enum(wrenchKinds),
  toolClass: z.optional(z.enum(toolClasses)),
  range,
  graduation: z.optional(quantity),
  gripLengthMm: z.optional(z.number().check(z.gt(0), z.lte(5000))),
  drive: z.optional(text(40)),
  directions: z.optional(z.array(z.enum(directions)).check(z.minLength(1), z.maxLength(2))),
  permissiblePercent: z.optional(z.number().check(z.gt(0), z.lte(20))),
  intervalMonths: z.int().check(z.gte(1), z.lte(120)),
  intervalCycles: z.optional(positiveInteger),
  location: z.optional(text(80)),
}
export const createWrenchBody = z.strictObject(wrenchFields)
export const updateWrenchBody = z.strictObject({
  ...z.partial(z.strictObject(wrenchFields)).shape,
  state: z.optional(z.enum(wrenchStates)),
  stateReason: z.optional(reason),
})

export const wrenchSorts = ['assetTag', 'kind', 'rangeMax', 'dueOn', 'status'] as const
export const wrenchQuery = z.strictObject({
  ...pageQuery(wrenchSorts),
  fitFor: z.optional(uuid),
  kind: z.optional(z.enum(wrenchKinds)),
  status: z.optional(z.enum(calibrationStatuses)),
  q: z.optional(z.string().check(z.maxLength(100))),
})

export const fitReason = z.strictObject({ code: z.string(), text: z.string(), hard: z.boolean() })
const direction = z.optional(z.enum(directions))
const calibrationRun = z.strictObject({
  target: quantity,
  direction,
  /** Per-point figures of the certificate itself, where it states them; they replace the computed ones. */
  wPercent: z.optional(z.number().check(z.gte(0), z.lte(100))),
  wPrimePercent: z.optional(z.number().check(z.gte(0), z.lte(100))),
  readings: z.array(z.strictObject({ indicated: positiveNumber, reference: positiveNumber })).check(z.minLength(1), z.maxLength(20)),
})
const runs = z.array(calibrationRun).check(z.minLength(1), z.maxLength(24))
export const createCalibrationBody = z.strictObject({
  performedOn: day,
  laboratory: text(120),
  certificateNumber: text(80),
  reference: z.strictObject({ uncertaintyPercent: z.number().check(z.gte(0), z.lte(20)) }),
  asFound: z.optional(runs),
  asFoundUnavailable: z.optional(z.strictObject({ reason })),
  asLeft: z.optional(runs),
  adjusted: z.boolean(),
  note: z.optional(longText),
})

export const calibrationPoint = z.strictObject({
  phase: z.enum(['as_found', 'as_left']),
  direction: z.nullable(z.enum(directions)),
  target: z.strictObject({ value: z.number(), unit: torqueUnit }),
  targetNm: z.number(),
  meanDeviationPercent: z.number(),
  deviationsPercent: z.array(z.number()),
  readings: z.array(z.strictObject({ indicated: z.number(), reference: z.number() })),
  limitPercent: z.number(),
  verdict: z.enum(['pass', 'fail']),
  wPercent: z.nullable(z.number()),
  wPrimePercent: z.nullable(z.number()),
})
export const calibrationAnswer = z.strictObject({
  id: uuid,
  wrenchId: uuid,
  performedOn: day,
  laboratory: z.string(),
  certificateNumber: z.string(),
  referenceUncertaintyPercent: z.number(),
  asFoundUnavailableReason: z.nullable(z.string()),
  adjusted: z.boolean(),
  note: z.nullable(z.string()),
  result: z.enum(['pass', 'fail']),
  /** What the wrench is after this calibration: fit again only when as left (or as found without one) passes. */
  usable: z.boolean(),
  decisionRule: z.string(),
  dueOn: day,
  points: z.array(calibrationPoint),
  recordedBy: personBrief,
  recordedAt: moment,
})

export const wrenchCalibration = z.strictObject({
  id: z.nullable(uuid),
  status: z.enum(calibrationStatuses),
  performedOn: z.nullable(day),
  dueOn: z.nullable(day),
  daysLeft: z.nullable(z.int()),
  cyclesSince: z.int(),
})
export const wrenchAnswer = z.strictObject({
  id: uuid,
  assetTag: z.string(),
  serial: z.string(),
  kind: z.enum(wrenchKinds),
  toolClass: z.nullable(z.enum(toolClasses)),
  range: z.strictObject({ min: z.number(), max: z.number(), unit: torqueUnit, minNm: z.number(), maxNm: z.number() }),
  graduation: z.nullable(z.strictObject({ value: z.number(), unit: torqueUnit, nm: z.number() })),
  gripLengthMm: z.nullable(z.number()),
  drive: z.nullable(z.string()),
  directions: z.nullable(z.array(z.enum(directions))),
  permissiblePercent: z.number(),
  intervalMonths: z.int(),
  intervalCycles: z.nullable(z.int()),
  location: z.nullable(z.string()),
  state: z.enum(wrenchStates),
  stateReason: z.nullable(z.string()),
  calibration: wrenchCalibration,
  /** The calibrated points in force, for judging an entry on the device. */
  figures: z.array(z.strictObject({
    phase: z.enum(['as_found', 'as_left']), direction: z.nullable(z.enum(directions)), targetNm: z.number(),
    meanDeviationPercent: z.number(), wPercent: z.nullable(z.number()), wPrimePercent: z.nullable(z.number()),
  })),
  /** Only with `fitFor`. */
  fit: z.optional(z.boolean()),
  reasons: z.optional(z.array(fitReason)),
  can,
})
export const wrenchDetailAnswer = z.strictObject({ ...wrenchAnswer.shape, calibrations: z.array(calibrationAnswer) })
export const wrenchListAnswer = listOf(wrenchAnswer)

export type CreateWrenchBody = z.infer<typeof createWrenchBody>
export type UpdateWrenchBody = z.infer<typeof updateWrenchBody>
export type WrenchQuery = z.infer<typeof wrenchQuery>
export type WrenchAnswer = z.infer<typeof wrenchAnswer>
export type WrenchDetail = z.infer<typeof wrenchDetailAnswer>
export type CreateCalibrationBody = z.infer<typeof createCalibrationBody>
export type CalibrationAnswer = z.infer<typeof calibrationAnswer>
export type FitReason = z.infer<typeof fitReason>
