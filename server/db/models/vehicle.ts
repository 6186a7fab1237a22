import {
  DataTypes, type CreationOptional, type InferAttributes, type InferCreationAttributes, type Sequelize,
} from 'sequelize'
import { key, optional, required, withDefault } from '../columns'
import { ShopModel, shopOptions } from '../base'

/** A vehicle of the shop's customers. */
export class Vehicle extends ShopModel<InferAttributes<Vehicle>, InferCreationAttributes<Vehicle>> {
  declare id: string
  declare vin: string | null
  declare vinUnverified: CreationOptional<boolean>
  declare unitNumber: string | null
  declare plate: string | null
  declare year: number | null
  declare make: string
  declare model: string
  declare engine: string | null
  declare odometer: number | null
  declare createdAt: Date
}

export function initVehicle(sequelize: Sequelize) {
  Vehicle.init({
    id: key(),
    shopId: required(DataTypes.UUID),
    vin: optional(DataTypes.TEXT),
    vinUnverified: withDefault(DataTypes.BOOLEAN, false),
    unitNumber: optional(DataTypes.TEXT),
    plate: optional(DataTypes.TEXT),
    year: optional(DataTypes.INTEGER),
    make: required(DataTypes.TEXT),
    model: required(DataTypes.TEXT),
    engine: optional(DataTypes.TEXT),
    odometer: optional(DataTypes.INTEGER),
    createdAt: required(DataTypes.DATE),
  }, shopOptions(sequelize, 'vehicles'))
}
