import {
  DataTypes, type CreationOptional, type InferAttributes,
  type InferCreationAttributes, type NonAttribute, type Sequelize,
} from 'sequelize'
import type * as z from 'zod/mini'
import type { deviceSignature, SecondCheckAnswer } from '#shared/schemas/sign-offs'
import type { Adapter } from '#shared/torque/adapter'
import type { Verdict } from '#shared/torque/verdict'
import type { CalibrationStatus, SecondCheckMethod } from '#shared/types/words'
import { key, optional, required, withDefault } from '../columns'
import { ShopModel, shopOptions } from '../base'
import type { SecondCheckReading } from './second-check-reading'
import type { SignOff } from './sign-off'
import type { User } from './user'
import type { Wrench } from './wrench'

/** A second person's check of a signed joint. Never changed. */
export class SecondCheck extends ShopModel<InferAttributes<SecondCheck>, InferCreationAttributes<SecondCheck>> {
  declare id: string
  declare signOffId: string
  declare method: SecondCheckMethod
  declare wrenchId: string | null
  declare calibrationId: string | null
  declare calibrationStatus: CalibrationStatus | null
  declare adapter: Adapter | null
  declare verdict: Verdict | null
  declare passed: boolean
  declare exceptions: CreationOptional<SecondCheckAnswer['exceptions']>
  declare note: string | null
  declare at: Date
  declare receivedAt: Date
  declare capturedOffline: boolean
  declare deviceId: string | null
  declare deviceSignature: z.infer<typeof deviceSignature> | null
  declare checkedBy: string
  declare contentHash: string
  declare answer: SecondCheckAnswer
  declare logSequence: number

  declare signOff?: NonAttribute<SignOff>
  declare readings?: NonAttribute<SecondCheckReading[]>
  declare checkedByUser?: NonAttribute<User>
  declare wrench?: NonAttribute<Wrench | null>
}

export function initSecondCheck(sequelize: Sequelize) {
  SecondCheck.init({
    id: key(),
    shopId: required(DataTypes.UUID),
    signOffId: required(DataTypes.UUID),
    method: required(DataTypes.TEXT),
    wrenchId: optional(DataTypes.UUID),
    calibrationId: optional(DataTypes.UUID),
    calibrationStatus: optional(DataTypes.TEXT),
    adapter: optional(DataTypes.JSONB),
    verdict: optional(DataTypes.TEXT),
    passed: required(DataTypes.BOOLEAN),
    exceptions: withDefault(DataTypes.JSONB, []),
    note: optional(DataTypes.TEXT),
    at: required(DataTypes.DATE),
    receivedAt: required(DataTypes.DATE),
    capturedOffline: required(DataTypes.BOOLEAN),
    deviceId: optional(DataTypes.UUID),
    deviceSignature: optional(DataTypes.JSONB),
    checkedBy: required(DataTypes.UUID),
    contentHash: required(DataTypes.CHAR(64)),
    answer: required(DataTypes.JSON),
    logSequence: required(DataTypes.BIGINT),
  }, shopOptions(sequelize, 'second_checks'))
}
