import {
  DataTypes, type CreationOptional, type InferAttributes, type InferCreationAttributes, type Sequelize,
} from 'sequelize'
import { keyPart, optional, required, withDefault } from '../columns'
import { ShopModel, shopOptions } from '../base'

/** Where one fastener of a group sits: 0 to 1000 across and down. */
export class FastenerPosition
  extends ShopModel<InferAttributes<FastenerPosition>, InferCreationAttributes<FastenerPosition>> {
  declare groupId: string
  declare position: number
  declare x: number | null
  declare y: number | null
  declare long: CreationOptional<boolean>
  declare label: string | null
}

export function initFastenerPosition(sequelize: Sequelize) {
  FastenerPosition.init({
    groupId: keyPart(DataTypes.UUID),
    shopId: required(DataTypes.UUID),
    position: keyPart(DataTypes.INTEGER),
    x: optional(DataTypes.DOUBLE),
    y: optional(DataTypes.DOUBLE),
    long: withDefault(DataTypes.BOOLEAN, false),
    label: optional(DataTypes.TEXT),
  }, shopOptions(sequelize, 'fastener_positions'))
}
