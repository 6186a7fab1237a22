import { DataTypes, type InferAttributes, type InferCreationAttributes, type Sequelize } from 'sequelize'
import type { TorqueUnit } from '#shared/torque/units'
import { keyPart, required } from '../columns'
import { ShopModel, shopOptions } from '../base'

/** What a second check found at one fastener. Never changed. */
export class SecondCheckReading
  extends ShopModel<InferAttributes<SecondCheckReading>, InferCreationAttributes<SecondCheckReading>> {
  declare secondCheckId: string
  declare position: number
  declare value: number
  declare unit: TorqueUnit
  declare nm: number
  declare turned: boolean
}

export function initSecondCheckReading(sequelize: Sequelize) {
  SecondCheckReading.init({
    secondCheckId: keyPart(DataTypes.UUID),
    shopId: required(DataTypes.UUID),
    position: keyPart(DataTypes.INTEGER),
    value: required(DataTypes.DOUBLE),
    unit: required(DataTypes.TEXT),
    nm: required(DataTypes.DOUBLE),
    turned: required(DataTypes.BOOLEAN),
  }, shopOptions(sequelize, 'second_check_readings'))
}
