import * as z from 'zod/mini'
import { groupStates, jointClasses } from '../types/words'
import { can, listOf, longText, moment, pageQuery, personBrief, quantity, text, uuid } from './common'
import { odometer, vehicleBrief } from './vehicles'
import { boltCount, boltPlace, limits, preparationStep, revisionAnswer, stageAnswer, tolerance } from './torque-specs'
import { signOffListItem } from './sign-offs'

export const createRepairOrderBody = z.strictObject({
  number: text(40),
  vehicleId: uuid,
  complaint: z.optional(longText),
  odometer: z.optional(odometer),
  bay: z.optional(text(40)),
})
export const updateRepairOrderBody = z.strictObject({
  complaint: z.optional(longText), odometer: z.optional(odometer), bay: z.optional(text(40)),
})

/** A group copies the decision "this spec revision, these positions"; without a published spec it carries a shop value. */
export const createGroupBody = z.union([
  z.strictObject({ specRevisionId: uuid, name: z.optional(text(120)), boltCount: z.optional(boltCount) }),
  z.strictObject({
    noPublishedSpec: z.literal(true),
    component: text(120),
    boltCount,
    name: z.optional(text(120)),
    jointClass: z.optional(z.enum(jointClasses)),
    target: quantity,
    tolerance: z.optional(z.nullable(tolerance)),
    thread: z.optional(text(60)),
    propertyClass: z.optional(text(60)),
    threadCondition: z.optional(text(80)),
    /** Why this value: the table, size, grade and condition it rests on. */
    reasoning: longText,
  }),
])

/** One position and stage, and the sign-off that covers it. */
const covered = z.strictObject({ stage: z.int(), signOffId: uuid })
export const groupPosition = z.strictObject({
  position: z.int(),
  x: z.nullable(z.number()),
  y: z.nullable(z.number()),
  long: z.boolean(),
  label: z.nullable(z.string()),
  covered: z.array(covered),
})
export const mark = z.strictObject({ reason: z.string(), at: moment, by: personBrief })
export const groupAnswer = z.strictObject({
  id: uuid,
  name: z.string(),
  state: z.enum(groupStates),
  repairOrder: z.strictObject({ id: uuid, number: z.string(), released: z.boolean(), vehicle: vehicleBrief }),
  component: z.string(),
  application: z.string(),
  specId: uuid,
  specRevision: revisionAnswer,
  limits,
  pattern: z.enum(['circle', 'row', 'two_rows', 'free']),
  positions: z.array(groupPosition),
  order: z.array(z.int()),
  stages: z.array(stageAnswer),
  preparation: z.array(preparationStep),
  places: z.array(boltPlace),
  signOffs: z.array(signOffListItem),
  notDisturbed: z.nullable(mark),
  concession: z.nullable(mark),
  disturbed: z.nullable(mark),
  can,
})
/** A group as a line of its repair order. */
export const groupBrief = z.strictObject({
  id: uuid,
  name: z.string(),
  state: z.enum(groupStates),
  component: z.string(),
  jointClass: z.enum(jointClasses),
  boltCount: z.int(),
  positionsDone: z.int(),
  limits,
  target: z.nullable(z.strictObject({ value: z.number(), unit: z.string() })),
  shopValue: z.boolean(),
  secondCheckRequired: z.boolean(),
  /** Worst counting verdict of the standing sign-offs. */
  verdict: z.nullable(z.string()),
  exceptions: z.array(z.string()),
})
export const hold = z.strictObject({ fastenerGroupId: uuid, code: z.string() })
export const release = z.strictObject({ id: uuid, at: moment, by: personBrief, sequence: z.int(), hash: z.string(), ownJoint: z.boolean() })

const orderFields = {
  id: uuid,
  number: z.string(),
  vehicle: vehicleBrief,
  complaint: z.nullable(z.string()),
  odometer: z.nullable(z.int()),
  bay: z.nullable(z.string()),
  openedAt: moment,
  openedBy: personBrief,
  holds: z.array(hold),
  release: z.nullable(release),
  can,
}
export const repairOrderAnswer = z.strictObject({ ...orderFields, fastenerGroups: z.array(groupBrief) })
export const repairOrderListItem = z.strictObject({ ...orderFields, groupCount: z.int(), groupsDone: z.int(), groupStates: z.array(z.enum(groupStates)) })
export const repairOrderSorts = ['openedAt', 'number', 'bay'] as const
export const repairOrderQuery = z.strictObject({
  ...pageQuery(repairOrderSorts),
  state: z.optional(z.enum(['open', 'released'])),
  mine: z.optional(z.enum(['true'])),
  vehicleId: z.optional(uuid),
  q: z.optional(z.string().check(z.maxLength(100))),
})
export const repairOrderListAnswer = listOf(repairOrderListItem)

export type CreateRepairOrderBody = z.infer<typeof createRepairOrderBody>
export type UpdateRepairOrderBody = z.infer<typeof updateRepairOrderBody>
export type CreateGroupBody = z.infer<typeof createGroupBody>
export type GroupAnswer = z.infer<typeof groupAnswer>
export type GroupBrief = z.infer<typeof groupBrief>
export type GroupPosition = z.infer<typeof groupPosition>
export type RepairOrderAnswer = z.infer<typeof repairOrderAnswer>
export type RepairOrderListItem = z.infer<typeof repairOrderListItem>
export type RepairOrderQuery = z.infer<typeof repairOrderQuery>
