import {
  DataTypes, Model, type CreationOptional, type InferAttributes, type InferCreationAttributes, type Sequelize,
} from 'sequelize'
import { key, required, withDefault } from '../columns'
import { tableOptions } from '../base'

/** A repair shop, its rules, and the head of its log. The row is locked while the log is appended to. */
export class Shop extends Model<InferAttributes<Shop>, InferCreationAttributes<Shop>> {
  declare id: string
  declare name: string
  declare timeZone: CreationOptional<string>
  declare defaultTolerancePercent: CreationOptional<number>
  declare dueSoonDays: CreationOptional<number>
  declare unfitWrench: CreationOptional<'refuse' | 'exception'>
  declare approveOwnDraft: CreationOptional<boolean>
  declare releaseOwnJoint: CreationOptional<boolean>
  declare logSequence: CreationOptional<number>
  declare logHash: CreationOptional<string>
  declare createdAt: Date
}

export function initShop(sequelize: Sequelize) {
  Shop.init({
    id: key(),
    name: required(DataTypes.TEXT),
    timeZone: withDefault(DataTypes.TEXT, 'UTC'),
    defaultTolerancePercent: withDefault(DataTypes.DOUBLE, 10),
    dueSoonDays: withDefault(DataTypes.INTEGER, 30),
    unfitWrench: withDefault(DataTypes.TEXT, 'refuse'),
    approveOwnDraft: withDefault(DataTypes.BOOLEAN, true),
    releaseOwnJoint: withDefault(DataTypes.BOOLEAN, false),
    logSequence: withDefault(DataTypes.BIGINT, 0),
    logHash: withDefault(DataTypes.CHAR(64), '0'.repeat(64)),
    createdAt: required(DataTypes.DATE),
  }, tableOptions(sequelize, 'shops'))
}
