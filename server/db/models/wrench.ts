import {
  DataTypes, type CreationOptional, type InferAttributes,
  type InferCreationAttributes, type NonAttribute, type Sequelize,
} from 'sequelize'
import type { WrenchAnswer } from '#shared/schemas/wrenches'
import type { TorqueUnit } from '#shared/torque/units'
import type { WrenchKind, WrenchState } from '#shared/types/words'
import type { ToolClass } from '#shared/wrench/classes'
import { key, optional, required, withDefault } from '../columns'
import { ShopModel, shopOptions } from '../base'
import type { Calibration } from './calibration'

/** A torque wrench. Whether it may be used follows from its state, its calibrations and the day. */
export class Wrench extends ShopModel<InferAttributes<Wrench>, InferCreationAttributes<Wrench>> {
  declare id: string
  declare assetTag: string
  declare serial: string
  declare kind: WrenchKind
  declare toolClass: ToolClass | null
  declare rangeMin: number
  declare rangeMax: number
  declare rangeUnit: TorqueUnit
  declare rangeMinNm: number
  declare rangeMaxNm: number
  declare graduationValue: number | null
  declare graduationUnit: TorqueUnit | null
  declare graduationNm: number | null
  declare gripLengthMm: number | null
  declare drive: string | null
  declare directions: WrenchAnswer['directions']
  declare permissiblePercent: number
  declare intervalMonths: number
  declare intervalCycles: number | null
  declare location: string | null
  declare state: CreationOptional<WrenchState>
  declare stateReason: string | null
  declare createdAt: Date

  declare calibrations?: NonAttribute<Calibration[]>
}

export function initWrench(sequelize: Sequelize) {
  Wrench.init({
    id: key(),
    shopId: required(DataTypes.UUID),
    assetTag: required(DataTypes.TEXT),
    serial: required(DataTypes.TEXT),
    kind: required(DataTypes.TEXT),
    toolClass: optional(DataTypes.TEXT),
    rangeMin: required(DataTypes.DOUBLE),
    rangeMax: required(DataTypes.DOUBLE),
    rangeUnit: required(DataTypes.TEXT),
    rangeMinNm: required(DataTypes.DOUBLE),
    rangeMaxNm: required(DataTypes.DOUBLE),
    graduationValue: optional(DataTypes.DOUBLE),
    graduationUnit: optional(DataTypes.TEXT),
    graduationNm: optional(DataTypes.DOUBLE),
    gripLengthMm: optional(DataTypes.DOUBLE),
    drive: optional(DataTypes.TEXT),
    directions: optional(DataTypes.JSONB),
    permissiblePercent: required(DataTypes.DOUBLE),
    intervalMonths: required(DataTypes.INTEGER),
    intervalCycles: optional(DataTypes.INTEGER),
    location: optional(DataTypes.TEXT),
    state: withDefault(DataTypes.TEXT, 'in_use'),
    stateReason: optional(DataTypes.TEXT),
    createdAt: required(DataTypes.DATE),
  }, shopOptions(sequelize, 'wrenches'))
}
