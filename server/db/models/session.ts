import {
  DataTypes, type InferAttributes, type InferCreationAttributes, type NonAttribute, type Sequelize,
} from 'sequelize'
import { key, optional, required } from '../columns'
import { ShopModel, shopOptions } from '../base'
import type { User } from './user'

/** A signed-in device. The sealed cookie holds only the id of this row. */
export class Session extends ShopModel<InferAttributes<Session>, InferCreationAttributes<Session>> {
  declare id: string
  declare userId: string
  declare device: string
  declare createdAt: Date
  declare seenAt: Date
  declare endedAt: Date | null

  declare user?: NonAttribute<User>
}

export function initSession(sequelize: Sequelize) {
  Session.init({
    id: key(),
    shopId: required(DataTypes.UUID),
    userId: required(DataTypes.UUID),
    device: required(DataTypes.TEXT),
    createdAt: required(DataTypes.DATE),
    seenAt: required(DataTypes.DATE),
    endedAt: optional(DataTypes.DATE),
  }, shopOptions(sequelize, 'sessions'))
}
