import {
  DataTypes, type InferAttributes, type InferCreationAttributes, type NonAttribute, type Sequelize,
} from 'sequelize'
import { key, required } from '../columns'
import { ShopModel, shopOptions } from '../base'
import type { User } from './user'

/** A sign-off taken back, with the reason. It stays readable; it no longer counts. */
export class SignOffVoid extends ShopModel<InferAttributes<SignOffVoid>, InferCreationAttributes<SignOffVoid>> {
  declare id: string
  declare signOffId: string
  declare reason: string
  declare at: Date
  declare byUser: string
  declare logSequence: number

  declare by?: NonAttribute<User>
}

export function initSignOffVoid(sequelize: Sequelize) {
  SignOffVoid.init({
    id: key(),
    shopId: required(DataTypes.UUID),
    signOffId: required(DataTypes.UUID),
    reason: required(DataTypes.TEXT),
    at: required(DataTypes.DATE),
    byUser: required(DataTypes.UUID),
    logSequence: required(DataTypes.BIGINT),
  }, shopOptions(sequelize, 'voids'))
}
