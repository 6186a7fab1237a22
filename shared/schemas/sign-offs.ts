import * as z from 'zod/mini'
import { torqueUnits } from '../torque/units'
import { verdicts } from '../torque/verdict'
import { exceptionCodes, secondCheckMethods } from '../types/words'
import { can, day, listOf, longText, moment, pageQuery, personBrief, pin, positiveNumber, reason, text, torqueUnit, uuid } from './common'
import { limits, MAX_BOLTS, preparationStep } from './torque-specs'

/** An adapter between drive and fastener; lengths in mm, angle from straight ahead. */
export const adapter = z.strictObject({
  extensionMm: z.number().check(z.gt(0), z.lte(5000)),
  angleDeg: z.number().check(z.gte(0), z.lte(180)),
  effectiveLengthMm: z.number().check(z.gt(0), z.lte(5000)),
})
const multiplierRatio = z.number().check(z.gte(1), z.lte(200))
/** What is set or shown on the wrench for one position and stage; an angle stage is in `deg`. A snug stage has no value to give. */
export const readingBody = z.strictObject({
  position: z.int().check(z.gte(1), z.lte(MAX_BOLTS)),
  stage: z.int().check(z.gte(1), z.lte(12)),
  attempt: z._default(z.int().check(z.gte(1), z.lte(20)), 1),
  value: z.optional(positiveNumber),
  unit: z.optional(z.enum([...torqueUnits, 'deg'])),
})
/** A signature made on an enrolled device; verified by the server. */
export const deviceSignature = z.strictObject({ deviceId: uuid, keyId: text(100), value: text(500) })
const signature = { pin: z.optional(pin), deviceSignature: z.optional(deviceSignature) }
export const partUsed = z.strictObject({ name: text(120), partNumber: z.optional(text(60)), lot: z.optional(text(60)) })

const signOffFields = {
  fastenerGroupId: uuid,
  wrenchId: uuid,
  adapter: z.optional(z.nullable(adapter)),
  multiplierRatio: z.optional(multiplierRatio),
  readings: z.array(readingBody).check(z.minLength(1), z.maxLength(1000)),
  attestedInOrder: z.optional(z.boolean()),
  prep: z.record(z.string().check(z.maxLength(40)), z.boolean()),
  prepReason: z.optional(reason),
  deviationReason: z.optional(reason),
  parts: z.optional(z.array(partUsed).check(z.maxLength(40))),
  note: z.optional(longText),
  tightenedAt: z.optional(moment),
  signedAt: moment,
  capturedOffline: z.boolean(),
  ...signature,
}
export const signOffBody = z.strictObject(signOffFields)
export const correctionBody = z.strictObject({ id: uuid, reason, ...signOffFields })
export const voidBody = z.strictObject({ reason, pin })
export const disturbBody = z.strictObject({ reason })
export const decisionBody = z.strictObject({ reason, pin })
export const releaseBody = z.strictObject({ pin })

const verdict = z.enum(verdicts)
export const readingAnswer = z.strictObject({
  position: z.int(),
  stage: z.int(),
  attempt: z.int(),
  value: z.nullable(z.number()),
  unit: z.nullable(z.enum([...torqueUnits, 'deg'])),
  nm: z.nullable(z.number()),
  verdict: z.nullable(verdict),
  probabilityInBand: z.nullable(z.number()),
})
export const signOffWrench = z.strictObject({ id: uuid, assetTag: z.string(), serial: z.string(), kind: z.enum(['setting', 'indicating']) })
export const signOffCalibration = z.strictObject({ id: z.nullable(uuid), dueOn: z.nullable(day), status: z.string() })
/** The answer to a sign-off: first and every later time the same. */
export const signOffAnswer = z.strictObject({
  id: uuid,
  sequence: z.int(),
  verdict: z.nullable(verdict),
  exceptions: z.array(z.enum(exceptionCodes)),
  readings: z.array(readingAnswer),
  wrench: signOffWrench,
  calibration: signOffCalibration,
  limits,
  hash: z.string(),
})
export const secondCheckAnswer = z.strictObject({
  id: uuid,
  sequence: z.int(),
  verdict: z.nullable(verdict),
  exceptions: z.array(z.string()),
  hash: z.string(),
})
export const secondCheckRecord = z.strictObject({
  ...secondCheckAnswer.shape,
  method: z.enum(secondCheckMethods),
  /** Whether it counts as the second check of the joint: a check that found a bolt turning does not. */
  passed: z.boolean(),
  at: moment,
  checkedBy: personBrief,
  wrench: z.nullable(signOffWrench),
  readings: z.array(z.strictObject({ position: z.int(), value: z.number(), unit: torqueUnit, nm: z.number(), turned: z.boolean() })),
  note: z.nullable(z.string()),
})
/** Everything that was true when it was signed. */
export const signOffDetailAnswer = z.strictObject({
  ...signOffAnswer.shape,
  standing: z.boolean(),
  signedAt: moment,
  receivedAt: moment,
  tightenedAt: z.nullable(moment),
  capturedOffline: z.boolean(),
  technician: personBrief,
  repairOrder: z.strictObject({ id: uuid, number: z.string() }),
  fastenerGroup: z.strictObject({ id: uuid, name: z.string() }),
  component: z.string(),
  vehicle: z.strictObject({ id: uuid, vin: z.nullable(z.string()), unitNumber: z.nullable(z.string()), make: z.string(), model: z.string() }),
  specRevision: z.strictObject({ id: uuid, specId: uuid, number: z.int(), source: z.strictObject({ title: z.string(), section: z.nullable(z.string()), page: z.nullable(z.string()), date: z.nullable(z.string()) }), threadCondition: z.nullable(z.string()), shopValue: z.boolean() }),
  target: z.nullable(z.strictObject({ value: z.number(), unit: torqueUnit, nm: z.number() })),
  adapter: z.nullable(adapter),
  multiplierRatio: z.nullable(z.number()),
  attestedInOrder: z.boolean(),
  preparation: z.array(z.strictObject({ ...preparationStep.shape, confirmed: z.boolean() })),
  prepReason: z.nullable(z.string()),
  deviationReason: z.nullable(z.string()),
  parts: z.array(partUsed),
  note: z.nullable(z.string()),
  decisionRule: z.string(),
  biasPercent: z.nullable(z.number()),
  wPercent: z.nullable(z.number()),
  wPrimePercent: z.nullable(z.number()),
  probabilityInBand: z.nullable(z.number()),
  supersedes: z.nullable(z.strictObject({ id: uuid, reason: z.string() })),
  supersededBy: z.nullable(uuid),
  voided: z.nullable(z.strictObject({ reason: z.string(), at: moment, by: personBrief })),
  secondChecks: z.array(secondCheckRecord),
  previousHash: z.string(),
  can,
})

export const signOffSorts = [
  'signedAt', 'repairOrder', 'component', 'targetNm', 'verdict', 'wrench', 'calibrationDueOn', 'technician',
] as const
export const signOffQuery = z.strictObject({
  ...pageQuery(signOffSorts),
  wrenchId: z.optional(uuid),
  verdict: z.optional(verdict),
  technicianId: z.optional(uuid),
  component: z.optional(z.string().check(z.maxLength(120))),
  from: z.optional(day),
  to: z.optional(day),
  q: z.optional(z.string().check(z.maxLength(100))),
})
export const signOffListItem = z.strictObject({
  id: uuid,
  signedAt: moment,
  repairOrder: z.strictObject({ id: uuid, number: z.string() }),
  fastenerGroupId: uuid,
  component: z.string(),
  targetNm: z.number(),
  target: z.nullable(z.strictObject({ value: z.number(), unit: torqueUnit })),
  limits,
  verdict: z.nullable(verdict),
  /** Each counting torque at the fastener, for the small drawing of the band. */
  readings: z.array(z.strictObject({ nm: z.number(), verdict: z.nullable(verdict) })),
  boltCount: z.int(),
  wPrimePercent: z.nullable(z.number()),
  exceptions: z.array(z.enum(exceptionCodes)),
  standing: z.boolean(),
  checked: z.boolean(),
  wrench: z.strictObject({ id: uuid, assetTag: z.string(), kind: z.enum(['setting', 'indicating']) }),
  calibrationDueOn: z.nullable(day),
  technician: personBrief,
})
export const signOffListAnswer = listOf(signOffListItem)

export const secondCheckBody = z.strictObject({
  signOffId: uuid,
  wrenchId: z.optional(uuid),
  adapter: z.optional(z.nullable(adapter)),
  method: z.enum(secondCheckMethods),
  readings: z.optional(z.array(z.strictObject({
    position: z.int().check(z.gte(1), z.lte(MAX_BOLTS)),
    value: positiveNumber,
    unit: torqueUnit,
    /** The fastener turned before the wrench clicked: it was below the setting. */
    turned: z.optional(z.boolean()),
  })).check(z.maxLength(MAX_BOLTS))),
  note: z.optional(longText),
  at: moment,
  capturedOffline: z.boolean(),
  ...signature,
})
export const secondCheckQuery = z.strictObject({ ...pageQuery(['signedAt'] as const), state: z.optional(z.enum(['waiting'])) })
/** A signed joint that waits for somebody else's eye. */
export const secondCheckWaiting = z.strictObject({
  signOff: signOffListItem,
  fastenerGroup: z.strictObject({ id: uuid, name: z.string() }),
  vehicle: z.strictObject({ id: uuid, vin: z.nullable(z.string()), unitNumber: z.nullable(z.string()), make: z.string(), model: z.string() }),
  methods: z.array(z.strictObject({ method: z.enum(secondCheckMethods), allowed: z.boolean(), why: z.nullable(z.string()) })),
  positions: z.array(z.int()),
  can,
})
export const secondCheckListAnswer = listOf(secondCheckWaiting)

export type SignOffBody = z.infer<typeof signOffBody>
export type CorrectionBody = z.infer<typeof correctionBody>
export type SignOffAnswer = z.infer<typeof signOffAnswer>
export type SignOffDetail = z.infer<typeof signOffDetailAnswer>
export type SignOffQuery = z.infer<typeof signOffQuery>
export type SignOffListItem = z.infer<typeof signOffListItem>
export type ReadingBody = z.infer<typeof readingBody>
export type ReadingAnswer = z.infer<typeof readingAnswer>
export type SecondCheckBody = z.infer<typeof secondCheckBody>
export type SecondCheckAnswer = z.infer<typeof secondCheckAnswer>
export type SecondCheckRecord = z.infer<typeof secondCheckRecord>
export type SecondCheckWaiting = z.infer<typeof secondCheckWaiting>
export type SecondCheckQuery = z.infer<typeof secondCheckQuery>
