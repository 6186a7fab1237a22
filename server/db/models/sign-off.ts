import {
  DataTypes, type CreationOptional, type InferAttributes,
  type InferCreationAttributes, type NonAttribute, type Sequelize,
} from 'sequelize'
import type * as z from 'zod/mini'
import type { deviceSignature, partUsed, SignOffAnswer, SignOffDetail } from '#shared/schemas/sign-offs'
import type { Adapter } from '#shared/torque/adapter'
import type { TorqueUnit } from '#shared/torque/units'
import type { Verdict } from '#shared/torque/verdict'
import type { CalibrationStatus, ExceptionCode, WrenchKind } from '#shared/types/words'
import { key, optional, required, withDefault } from '../columns'
import { ShopModel, shopOptions } from '../base'
import type { Calibration } from './calibration'
import type { FastenerGroup } from './fastener-group'
import type { RepairOrder } from './repair-order'
import type { SecondCheck } from './second-check'
import type { SignOffReading } from './sign-off-reading'
import type { SignOffVoid } from './sign-off-void'
import type { TorqueSpecRevision } from './torque-spec-revision'
import type { User } from './user'
import type { Wrench } from './wrench'

/** A signed joint with everything that was true when it was signed. Never changed: a correction is a new one. */
export class SignOff extends ShopModel<InferAttributes<SignOff>, InferCreationAttributes<SignOff>> {
  declare id: string
  declare fastenerGroupId: string
  declare repairOrderId: string
  declare specRevisionId: string
  declare wrenchId: string
  declare calibrationId: string | null
  declare technicianId: string
  declare signedAt: Date
  declare receivedAt: Date
  declare tightenedAt: Date | null
  declare capturedOffline: boolean
  declare deviceId: string | null
  declare deviceSignature: z.infer<typeof deviceSignature> | null
  declare supersedesId: string | null
  declare supersedesReason: string | null
  declare adapter: Adapter | null
  declare multiplierRatio: number | null
  declare attestedInOrder: CreationOptional<boolean>
  declare preparation: SignOffDetail['preparation']
  declare prepReason: string | null
  declare deviationReason: string | null
  declare parts: CreationOptional<z.infer<typeof partUsed>[]>
  declare note: string | null
  declare verdict: Verdict | null
  declare exceptions: CreationOptional<ExceptionCode[]>
  declare targetValue: number | null
  declare targetUnit: TorqueUnit | null
  declare lowerNm: number
  declare upperNm: number
  declare decisionRule: string
  declare biasPercent: number | null
  declare wPercent: number | null
  declare wPrimePercent: number | null
  declare uNm: number | null
  declare probabilityInBand: number | null
  declare calibrationStatus: CalibrationStatus
  declare wrenchKind: WrenchKind
  declare wrenchSerial: string
  declare boltCount: number
  declare repairOrderNumber: string
  declare component: string
  declare targetNm: number
  declare verdictRank: number
  declare wrenchTag: string
  declare calibrationDueOn: string | null
  declare technicianName: string
  declare contentHash: string
  declare answer: SignOffAnswer
  declare logSequence: number

  declare group?: NonAttribute<FastenerGroup>
  declare repairOrder?: NonAttribute<RepairOrder>
  declare revision?: NonAttribute<TorqueSpecRevision>
  declare wrench?: NonAttribute<Wrench>
  declare calibration?: NonAttribute<Calibration | null>
  declare technician?: NonAttribute<User>
  declare readings?: NonAttribute<SignOffReading[]>
  declare voided?: NonAttribute<SignOffVoid | null>
  declare supersededBy?: NonAttribute<SignOff | null>
  declare secondChecks?: NonAttribute<SecondCheck[]>
}

export function initSignOff(sequelize: Sequelize) {
  SignOff.init({
    id: key(),
    shopId: required(DataTypes.UUID),
    fastenerGroupId: required(DataTypes.UUID),
    repairOrderId: required(DataTypes.UUID),
    specRevisionId: required(DataTypes.UUID),
    wrenchId: required(DataTypes.UUID),
    calibrationId: optional(DataTypes.UUID),
    technicianId: required(DataTypes.UUID),
    signedAt: required(DataTypes.DATE),
    receivedAt: required(DataTypes.DATE),
    tightenedAt: optional(DataTypes.DATE),
    capturedOffline: required(DataTypes.BOOLEAN),
    deviceId: optional(DataTypes.UUID),
    deviceSignature: optional(DataTypes.JSONB),
    supersedesId: optional(DataTypes.UUID),
    supersedesReason: optional(DataTypes.TEXT),
    adapter: optional(DataTypes.JSONB),
    multiplierRatio: optional(DataTypes.DOUBLE),
    attestedInOrder: withDefault(DataTypes.BOOLEAN, false),
    preparation: required(DataTypes.JSONB),
    prepReason: optional(DataTypes.TEXT),
    deviationReason: optional(DataTypes.TEXT),
    parts: withDefault(DataTypes.JSONB, []),
    note: optional(DataTypes.TEXT),
    verdict: optional(DataTypes.TEXT),
    exceptions: withDefault(DataTypes.JSONB, []),
    targetValue: optional(DataTypes.DOUBLE),
    targetUnit: optional(DataTypes.TEXT),
    lowerNm: required(DataTypes.DOUBLE),
    upperNm: required(DataTypes.DOUBLE),
    decisionRule: required(DataTypes.TEXT),
    biasPercent: optional(DataTypes.DOUBLE),
    wPercent: optional(DataTypes.DOUBLE),
    wPrimePercent: optional(DataTypes.DOUBLE),
    uNm: optional(DataTypes.DOUBLE),
    probabilityInBand: optional(DataTypes.DOUBLE),
    calibrationStatus: required(DataTypes.TEXT),
    wrenchKind: required(DataTypes.TEXT),
    wrenchSerial: required(DataTypes.TEXT),
    boltCount: required(DataTypes.INTEGER),
    repairOrderNumber: required(DataTypes.TEXT),
    component: required(DataTypes.TEXT),
    targetNm: required(DataTypes.DOUBLE),
    verdictRank: required(DataTypes.SMALLINT),
    wrenchTag: required(DataTypes.TEXT),
    calibrationDueOn: optional(DataTypes.DATEONLY),
    technicianName: required(DataTypes.TEXT),
    contentHash: required(DataTypes.CHAR(64)),
    answer: required(DataTypes.JSON),
    logSequence: required(DataTypes.BIGINT),
  }, shopOptions(sequelize, 'sign_offs'))
}
