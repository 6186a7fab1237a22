import {
  DataTypes, type InferAttributes, type InferCreationAttributes, type NonAttribute, type Sequelize,
} from 'sequelize'
import { key, required } from '../columns'
import { ShopModel, shopOptions } from '../base'
import type { User } from './user'

/** A signed joint was loosened again: what was signed before counts no more. */
export class Disturbance extends ShopModel<InferAttributes<Disturbance>, InferCreationAttributes<Disturbance>> {
  declare id: string
  declare fastenerGroupId: string
  declare reason: string
  declare at: Date
  declare byUser: string
  declare logSequence: number

  declare by?: NonAttribute<User>
}

export function initDisturbance(sequelize: Sequelize) {
  Disturbance.init({
    id: key(),
    shopId: required(DataTypes.UUID),
    fastenerGroupId: required(DataTypes.UUID),
    reason: required(DataTypes.TEXT),
    at: required(DataTypes.DATE),
    byUser: required(DataTypes.UUID),
    logSequence: required(DataTypes.BIGINT),
  }, shopOptions(sequelize, 'disturbances'))
}
