import {
  DataTypes, type CreationOptional, type InferAttributes,
  type InferCreationAttributes, type NonAttribute, type Sequelize,
} from 'sequelize'
import type * as z from 'zod/mini'
import type {
  BoltPlace, PreparationStep, retorque, revisionAnswer, runningTorque, SpecFlag, stageSpec, tolerance,
} from '#shared/schemas/torque-specs'
import type { Pattern } from '#shared/torque/order'
import type { TorqueUnit } from '#shared/torque/units'
import type { JointClass, RevisionStatus } from '#shared/types/words'
import { key, optional, required, withDefault } from '../columns'
import { ShopModel, shopOptions } from '../base'
import type { TorqueSpec } from './torque-spec'
import type { User } from './user'

/** What a manual says of a joint, as printed, and what it comes to in N·m. Only an approved one can be used. */
export class TorqueSpecRevision
  extends ShopModel<InferAttributes<TorqueSpecRevision>, InferCreationAttributes<TorqueSpecRevision>> {
  declare id: string
  declare specId: string
  declare number: number
  declare status: RevisionStatus
  declare jointClass: JointClass
  declare boltCount: number | null
  declare pattern: Pattern | null
  declare places: CreationOptional<BoltPlace[]>
  declare thread: string | null
  declare leftHand: CreationOptional<boolean>
  declare propertyClass: string | null
  declare threadCondition: string | null
  declare runningTorque: z.infer<typeof runningTorque> | null
  declare preparation: CreationOptional<PreparationStep[]>
  declare targetValue: number | null
  declare targetUnit: TorqueUnit | null
  declare printedValue: number | null
  declare printedUnit: TorqueUnit | null
  declare printedLimits: z.infer<typeof revisionAnswer>['printedLimits']
  declare tolerance: z.infer<typeof tolerance> | null
  declare stages: z.infer<typeof stageSpec>[] | null
  declare printedOrder: number[] | null
  declare secondCheckRequired: CreationOptional<boolean>
  declare oneTimeUse: CreationOptional<boolean>
  declare retorque: z.infer<typeof retorque> | null
  declare caution: string | null
  declare sourceTitle: string
  declare sourceSection: string | null
  declare sourcePage: string | null
  declare sourceDate: string | null
  declare targetNm: number
  declare lowerNm: number
  declare upperNm: number
  declare flags: CreationOptional<SpecFlag[]>
  declare governs: 'target' | 'printed' | null
  declare shopValue: CreationOptional<boolean>
  declare reasoning: string | null
  declare createdBy: string
  declare createdAt: Date
  declare approvedBy: string | null
  declare approvedAt: Date | null
  declare withdrawnBy: string | null
  declare withdrawnAt: Date | null
  declare withdrawnReason: string | null

  declare spec?: NonAttribute<TorqueSpec>
  declare createdByUser?: NonAttribute<User>
  declare approvedByUser?: NonAttribute<User | null>
}

export function initTorqueSpecRevision(sequelize: Sequelize) {
  TorqueSpecRevision.init({
    id: key(),
    shopId: required(DataTypes.UUID),
    specId: required(DataTypes.UUID),
    number: required(DataTypes.INTEGER),
    status: required(DataTypes.TEXT),
    jointClass: required(DataTypes.TEXT),
    boltCount: optional(DataTypes.INTEGER),
    pattern: optional(DataTypes.TEXT),
    places: withDefault(DataTypes.JSONB, []),
    thread: optional(DataTypes.TEXT),
    leftHand: withDefault(DataTypes.BOOLEAN, false),
    propertyClass: optional(DataTypes.TEXT),
    threadCondition: optional(DataTypes.TEXT),
    runningTorque: optional(DataTypes.JSONB),
    preparation: withDefault(DataTypes.JSONB, []),
    targetValue: optional(DataTypes.DOUBLE),
    targetUnit: optional(DataTypes.TEXT),
    printedValue: optional(DataTypes.DOUBLE),
    printedUnit: optional(DataTypes.TEXT),
    printedLimits: optional(DataTypes.JSONB),
    tolerance: optional(DataTypes.JSONB),
    stages: optional(DataTypes.JSONB),
    printedOrder: optional(DataTypes.JSONB),
    secondCheckRequired: withDefault(DataTypes.BOOLEAN, false),
    oneTimeUse: withDefault(DataTypes.BOOLEAN, false),
    retorque: optional(DataTypes.JSONB),
    caution: optional(DataTypes.TEXT),
    sourceTitle: required(DataTypes.TEXT),
    sourceSection: optional(DataTypes.TEXT),
    sourcePage: optional(DataTypes.TEXT),
    sourceDate: optional(DataTypes.TEXT),
    targetNm: required(DataTypes.DOUBLE),
    lowerNm: required(DataTypes.DOUBLE),
    upperNm: required(DataTypes.DOUBLE),
    flags: withDefault(DataTypes.JSONB, []),
    governs: optional(DataTypes.TEXT),
    shopValue: withDefault(DataTypes.BOOLEAN, false),
    reasoning: optional(DataTypes.TEXT),
    createdBy: required(DataTypes.UUID),
    createdAt: required(DataTypes.DATE),
    approvedBy: optional(DataTypes.UUID),
    approvedAt: optional(DataTypes.DATE),
    withdrawnBy: optional(DataTypes.UUID),
    withdrawnAt: optional(DataTypes.DATE),
    withdrawnReason: optional(DataTypes.TEXT),
  }, shopOptions(sequelize, 'torque_spec_revisions'))
}
