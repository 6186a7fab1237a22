import {
  DataTypes, type InferAttributes, type InferCreationAttributes, type NonAttribute, type Sequelize,
} from 'sequelize'
import { key, required } from '../columns'
import { ShopModel, shopOptions } from '../base'
import type { User } from './user'

/** The vehicle handed back: nothing of the order changes after it. */
export class Release extends ShopModel<InferAttributes<Release>, InferCreationAttributes<Release>> {
  declare id: string
  declare repairOrderId: string
  declare at: Date
  declare byUser: string
  /** Whether who released it had signed one of its joints. */
  declare ownJoint: boolean
  declare logSequence: number

  declare by?: NonAttribute<User>
}

export function initRelease(sequelize: Sequelize) {
  Release.init({
    id: key(),
    shopId: required(DataTypes.UUID),
    repairOrderId: required(DataTypes.UUID),
    at: required(DataTypes.DATE),
    byUser: required(DataTypes.UUID),
    ownJoint: required(DataTypes.BOOLEAN),
    logSequence: required(DataTypes.BIGINT),
  }, shopOptions(sequelize, 'releases'))
}
