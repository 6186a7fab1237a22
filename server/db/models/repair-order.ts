import {
  DataTypes, type InferAttributes, type InferCreationAttributes, type NonAttribute, type Sequelize,
} from 'sequelize'
import { key, optional, required } from '../columns'
import { ShopModel, shopOptions } from '../base'
import type { FastenerGroup } from './fastener-group'
import type { Release } from './release'
import type { User } from './user'
import type { Vehicle } from './vehicle'

/** One visit of a vehicle, under the shop's own number. */
export class RepairOrder extends ShopModel<InferAttributes<RepairOrder>, InferCreationAttributes<RepairOrder>> {
  declare id: string
  declare number: string
  declare vehicleId: string
  declare complaint: string | null
  declare odometer: number | null
  declare bay: string | null
  declare openedAt: Date
  declare openedBy: string

  declare vehicle?: NonAttribute<Vehicle>
  declare groups?: NonAttribute<FastenerGroup[]>
  declare release?: NonAttribute<Release | null>
  declare openedByUser?: NonAttribute<User>
}

export function initRepairOrder(sequelize: Sequelize) {
  RepairOrder.init({
    id: key(),
    shopId: required(DataTypes.UUID),
    number: required(DataTypes.TEXT),
    vehicleId: required(DataTypes.UUID),
    complaint: optional(DataTypes.TEXT),
    odometer: optional(DataTypes.INTEGER),
    bay: optional(DataTypes.TEXT),
    openedAt: required(DataTypes.DATE),
    openedBy: required(DataTypes.UUID),
  }, shopOptions(sequelize, 'repair_orders'))
}
