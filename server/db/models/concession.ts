import {
  DataTypes, type InferAttributes, type InferCreationAttributes, type NonAttribute, type Sequelize,
} from 'sequelize'
import { key, required } from '../columns'
import { ShopModel, shopOptions } from '../base'
import type { User } from './user'

/** A joint accepted as it is, by somebody who may, with the reason. */
export class Concession extends ShopModel<InferAttributes<Concession>, InferCreationAttributes<Concession>> {
  declare id: string
  declare fastenerGroupId: string
  declare reason: string
  declare at: Date
  declare byUser: string
  declare logSequence: number

  declare by?: NonAttribute<User>
}

export function initConcession(sequelize: Sequelize) {
  Concession.init({
    id: key(),
    shopId: required(DataTypes.UUID),
    fastenerGroupId: required(DataTypes.UUID),
    reason: required(DataTypes.TEXT),
    at: required(DataTypes.DATE),
    byUser: required(DataTypes.UUID),
    logSequence: required(DataTypes.BIGINT),
  }, shopOptions(sequelize, 'concessions'))
}
