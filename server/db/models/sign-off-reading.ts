import { DataTypes, type InferAttributes, type InferCreationAttributes, type Sequelize } from 'sequelize'
import type { ReadingAnswer } from '#shared/schemas/sign-offs'
import type { Verdict } from '#shared/torque/verdict'
import { keyPart, optional, required } from '../columns'
import { ShopModel, shopOptions } from '../base'

/** One attempt at one stage of one fastener; the last attempt counts. Never changed. */
export class SignOffReading
  extends ShopModel<InferAttributes<SignOffReading>, InferCreationAttributes<SignOffReading>> {
  declare signOffId: string
  declare position: number
  declare stage: number
  declare attempt: number
  declare counts: boolean
  declare value: number | null
  declare unit: ReadingAnswer['unit']
  declare nm: number | null
  declare verdict: Verdict | null
  declare probabilityInBand: number | null
}

export function initSignOffReading(sequelize: Sequelize) {
  SignOffReading.init({
    signOffId: keyPart(DataTypes.UUID),
    shopId: required(DataTypes.UUID),
    position: keyPart(DataTypes.INTEGER),
    stage: keyPart(DataTypes.INTEGER),
    attempt: keyPart(DataTypes.INTEGER),
    counts: required(DataTypes.BOOLEAN),
    value: optional(DataTypes.DOUBLE),
    unit: optional(DataTypes.TEXT),
    nm: optional(DataTypes.DOUBLE),
    verdict: optional(DataTypes.TEXT),
    probabilityInBand: optional(DataTypes.DOUBLE),
  }, shopOptions(sequelize, 'sign_off_readings'))
}
