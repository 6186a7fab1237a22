import * as z from 'zod/mini'
import { patterns } from '../torque/order'
import { specIssues, type SaidSpec } from '../torque/spec-rules'
import { jointClasses, revisionStatuses, specKinds } from '../types/words'
import { can, listOf, longText, moment, pageQuery, personBrief, positiveNumber, quantity, reason, text, torqueUnit, uuid } from './common'

export const MAX_BOLTS = 120
export const boltCount = z.int().check(z.gte(1), z.lte(MAX_BOLTS))

export const tolerance = z.discriminatedUnion('kind', [
  z.strictObject({ kind: z.literal('percent'), value: z.number().check(z.gt(0), z.lt(100)) }),
  z.strictObject({ kind: z.literal('absolute'), value: positiveNumber, unit: torqueUnit }),
  z.strictObject({ kind: z.literal('limits'), lower: quantity, upper: quantity }),
])
const degrees = z.number().check(z.gt(0), z.lte(3600))
export const stageSpec = z.discriminatedUnion('kind', [
  z.strictObject({ kind: z.literal('snug'), target: z.optional(quantity) }),
  z.strictObject({ kind: z.literal('torque'), target: quantity }),
  z.strictObject({ kind: z.literal('percent'), percent: z.number().check(z.gt(0), z.lte(100)) }),
  z.strictObject({ kind: z.literal('angle'), angleDeg: degrees, toleranceDeg: z.optional(degrees) }),
])
export const preparationStep = z.strictObject({
  code: z.string().check(z.regex(/^[a-z][a-z0-9_]{0,39}$/, { error: 'A code is lower-case letters, digits and underscores.' })),
  text: text(200),
  required: z.boolean(),
})
export const appliesTo = z.strictObject({
  make: z.optional(text(80)), model: z.optional(text(80)), engine: z.optional(text(80)),
  yearFrom: z.optional(z.int().check(z.gte(1900), z.lte(2100))), yearTo: z.optional(z.int().check(z.gte(1900), z.lte(2100))),
})
/** Where the value is printed. The date is the manual's own, as printed (a year, a month or a day). */
export const specSource = z.strictObject({
  title: text(200), section: z.optional(text(200)), page: z.optional(text(40)), date: z.optional(text(40)),
})
/** Torque needed to turn a self-locking nut before it seats, and the rule by which it counts towards the target. */
export const runningTorque = z.strictObject({
  value: positiveNumber, unit: torqueUnit, rule: z.enum(['not_added', 'always_added', 'added_from_a_third']),
})
export const retorque = z.strictObject({
  afterKm: z.optional(z.int().check(z.gt(0), z.lte(100_000))), afterDays: z.optional(z.int().check(z.gt(0), z.lte(3650))), note: z.optional(text(400)),
})
/** Where a bolt sits, for patterns drawn as they are: 0 to 1000 across and down. */
export const boltPlace = z.strictObject({
  position: z.int().check(z.gte(1), z.lte(MAX_BOLTS)),
  x: z.optional(z.number().check(z.gte(0), z.lte(1000))),
  y: z.optional(z.number().check(z.gte(0), z.lte(1000))),
  long: z.optional(z.boolean()),
  label: z.optional(text(20)),
})

const revisionFields = {
  jointClass: z._default(z.enum(jointClasses), 'general'),
  boltCount: z.optional(boltCount),
  pattern: z.optional(z.enum(patterns)),
  places: z.optional(z.array(boltPlace).check(z.maxLength(MAX_BOLTS))),
  thread: z.optional(text(60)),
  leftHand: z.optional(z.boolean()),
  propertyClass: z.optional(text(60)),
  threadCondition: z.optional(text(80)),
  runningTorque: z.optional(runningTorque),
  preparation: z.optional(z.array(preparationStep).check(z.maxLength(20))),
  target: z.optional(quantity),
  printed: z.optional(quantity),
  printedLimits: z.optional(z.strictObject({ lower: quantity, upper: quantity })),
  tolerance: z.optional(z.nullable(tolerance)),
  stages: z.optional(z.array(stageSpec).check(z.minLength(1), z.maxLength(12))),
  order: z.optional(z.array(z.int().check(z.gte(1), z.lte(MAX_BOLTS))).check(z.maxLength(MAX_BOLTS))),
  secondCheckRequired: z.optional(z.boolean()),
  oneTimeUse: z.optional(z.boolean()),
  retorque: z.optional(retorque),
  caution: z.optional(longText),
  source: specSource,
}
/** The rules that concern several fields, each issue beside the field it concerns. */
const takenTogether = z.check<SaidSpec>(({ value, issues }) => {
  // Each field must be right on its own first.
  if (issues.length > 0) return
  issues.push(...specIssues(value).map(issue => ({ code: 'custom' as const, input: value, ...issue })))
})
/** What one revision says; the identity of the joint (component, application, applies-to) belongs to the spec. */
export const specRevisionBody = z.strictObject(revisionFields).check(takenTogether)
export const createSpecBody = z.strictObject({
  kind: z._default(z.enum(specKinds), 'joint'),
  component: text(120),
  application: text(200),
  appliesTo: z.optional(appliesTo),
  ...revisionFields,
}).check(takenTogether)
export const approveSpecBody = z.strictObject({ governs: z.optional(z.enum(['target', 'printed'])) })
export const withdrawSpecBody = z.strictObject({ reason })

export const specFlag = z.strictObject({
  code: z.literal('dual_unit_mismatch'),
  message: z.string(),
  diffNm: z.number(),
  limitNm: z.number(),
  swapped: z.boolean(),
})
export const limits = z.strictObject({ targetNm: z.number(), lowerNm: z.number(), upperNm: z.number() })
export const stageAnswer = z.strictObject({
  number: z.int(),
  kind: z.enum(['snug', 'torque', 'percent', 'angle']),
  targetNm: z.nullable(z.number()),
  lowerNm: z.nullable(z.number()),
  upperNm: z.nullable(z.number()),
  angleDeg: z.nullable(z.number()),
  toleranceDeg: z.nullable(z.number()),
})
const noted = z.strictObject({ value: z.number(), unit: torqueUnit })
export const revisionAnswer = z.strictObject({
  id: uuid,
  number: z.int(),
  status: z.enum(revisionStatuses),
  jointClass: z.enum(jointClasses),
  boltCount: z.nullable(z.int()),
  pattern: z.nullable(z.enum(patterns)),
  places: z.array(boltPlace),
  thread: z.nullable(z.string()),
  leftHand: z.boolean(),
  propertyClass: z.nullable(z.string()),
  threadCondition: z.nullable(z.string()),
  runningTorque: z.nullable(runningTorque),
  preparation: z.array(preparationStep),
  target: z.nullable(z.strictObject({ ...noted.shape, nm: z.number() })),
  printed: z.nullable(z.strictObject({ ...noted.shape, nm: z.number() })),
  printedLimits: z.nullable(z.strictObject({ lower: noted, upper: noted })),
  tolerance: z.nullable(tolerance),
  stages: z.array(stageAnswer),
  order: z.nullable(z.array(z.int())),
  secondCheckRequired: z.boolean(),
  oneTimeUse: z.boolean(),
  retorque: z.nullable(retorque),
  caution: z.nullable(z.string()),
  source: z.strictObject({ title: z.string(), section: z.nullable(z.string()), page: z.nullable(z.string()), date: z.nullable(z.string()) }),
  limits,
  flags: z.array(specFlag),
  governs: z.nullable(z.enum(['target', 'printed'])),
  /** Used where no spec is published; never for a safety joint. */
  shopValue: z.boolean(),
  /** What a shop value rests on. */
  reasoning: z.nullable(z.string()),
  createdBy: personBrief,
  createdAt: moment,
  approvedBy: z.nullable(personBrief),
  approvedAt: z.nullable(moment),
  withdrawnReason: z.nullable(z.string()),
})
export const specAnswer = z.strictObject({
  id: uuid,
  kind: z.enum(specKinds),
  component: z.string(),
  application: z.string(),
  appliesTo: z.nullable(appliesTo),
  createdAt: moment,
  /** The newest approved revision, else the newest of all. */
  revision: revisionAnswer,
  can,
})
/** One spec with every revision, newest first. */
export const specDetailAnswer = z.strictObject({ ...specAnswer.shape, revisions: z.array(revisionAnswer) })

export const specSorts = ['component', 'application', 'targetNm', 'jointClass', 'status', 'source', 'createdAt'] as const
export const specQuery = z.strictObject({
  ...pageQuery(specSorts),
  kind: z.optional(z.enum(specKinds)),
  status: z.optional(z.enum(revisionStatuses)),
  jointClass: z.optional(z.enum(jointClasses)),
  flagged: z.optional(z.enum(['true', 'false'])),
  q: z.optional(z.string().check(z.maxLength(100))),
})
export const specListAnswer = listOf(specAnswer)

export const importQuery = z.strictObject({ partial: z.optional(z.enum(['true', 'false'])) })
export const importReport = z.strictObject({
  rows: z.array(z.strictObject({
    line: z.int(),
    status: z.enum(['imported', 'refused']),
    id: z.optional(uuid),
    component: z.optional(z.string()),
    flags: z.array(specFlag),
    issues: z.array(z.strictObject({ path: z.string(), message: z.string() })),
  })),
})

export type CreateSpecBody = z.infer<typeof createSpecBody>
export type SpecRevisionBody = z.infer<typeof specRevisionBody>
export type SpecAnswer = z.infer<typeof specAnswer>
export type SpecDetail = z.infer<typeof specDetailAnswer>
export type SpecRevisionAnswer = z.infer<typeof revisionAnswer>
export type SpecQuery = z.infer<typeof specQuery>
export type SpecFlag = z.infer<typeof specFlag>
export type ImportReport = z.infer<typeof importReport>
export type StageAnswer = z.infer<typeof stageAnswer>
export type PreparationStep = z.infer<typeof preparationStep>
export type BoltPlace = z.infer<typeof boltPlace>
