import { DataTypes, type InferAttributes, type InferCreationAttributes, type Sequelize } from 'sequelize'
import { keyPart, required } from '../columns'
import { ShopModel, shopOptions } from '../base'

/** One reading at a point: what the wrench showed or was set to, and the reference, in the point's unit. */
export class CalibrationReading
  extends ShopModel<InferAttributes<CalibrationReading>, InferCreationAttributes<CalibrationReading>> {
  declare calibrationId: string
  declare point: number
  declare number: number
  declare indicated: number
  declare reference: number
  declare deviationPercent: number
}

export function initCalibrationReading(sequelize: Sequelize) {
  CalibrationReading.init({
    calibrationId: keyPart(DataTypes.UUID),
    point: keyPart(DataTypes.INTEGER),
    number: keyPart(DataTypes.INTEGER),
    shopId: required(DataTypes.UUID),
    indicated: required(DataTypes.DOUBLE),
    reference: required(DataTypes.DOUBLE),
    deviationPercent: required(DataTypes.DOUBLE),
  }, shopOptions(sequelize, 'calibration_readings'))
}
