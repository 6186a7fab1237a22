import { DataTypes, type InferAttributes, type InferCreationAttributes, type Sequelize } from 'sequelize'
import type { CalibrationAnswer } from '#shared/schemas/wrenches'
import type { TorqueUnit } from '#shared/torque/units'
import { keyPart, optional, required } from '../columns'
import { ShopModel, shopOptions } from '../base'

type Point = CalibrationAnswer['points'][number]

/** One test point of a calibration and what came of it. Its readings hang on the calibration, by point number. */
export class CalibrationPoint
  extends ShopModel<InferAttributes<CalibrationPoint>, InferCreationAttributes<CalibrationPoint>> {
  declare calibrationId: string
  declare number: number
  declare phase: Point['phase']
  declare direction: Point['direction']
  declare targetValue: number
  declare targetUnit: TorqueUnit
  declare targetNm: number
  declare meanDeviationPercent: number
  declare limitPercent: number
  declare verdict: Point['verdict']
  declare wPercent: number | null
  declare wPrimePercent: number | null
}

export function initCalibrationPoint(sequelize: Sequelize) {
  CalibrationPoint.init({
    calibrationId: keyPart(DataTypes.UUID),
    shopId: required(DataTypes.UUID),
    number: keyPart(DataTypes.INTEGER),
    phase: required(DataTypes.TEXT),
    direction: optional(DataTypes.TEXT),
    targetValue: required(DataTypes.DOUBLE),
    targetUnit: required(DataTypes.TEXT),
    targetNm: required(DataTypes.DOUBLE),
    meanDeviationPercent: required(DataTypes.DOUBLE),
    limitPercent: required(DataTypes.DOUBLE),
    verdict: required(DataTypes.TEXT),
    wPercent: optional(DataTypes.DOUBLE),
    wPrimePercent: optional(DataTypes.DOUBLE),
  }, shopOptions(sequelize, 'calibration_points'))
}
