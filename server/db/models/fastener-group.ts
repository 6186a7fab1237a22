import {
  DataTypes, type InferAttributes, type InferCreationAttributes, type NonAttribute, type Sequelize,
} from 'sequelize'
import type { Pattern } from '#shared/torque/order'
import { key, required } from '../columns'
import { ShopModel, shopOptions } from '../base'
import type { Concession } from './concession'
import type { Disturbance } from './disturbance'
import type { FastenerPosition } from './fastener-position'
import type { NotDisturbedMark } from './not-disturbed-mark'
import type { RepairOrder } from './repair-order'
import type { SignOff } from './sign-off'
import type { TorqueSpecRevision } from './torque-spec-revision'

/** The joint of a repair order: this spec revision, these positions. The row to lock while it is signed. */
export class FastenerGroup extends ShopModel<InferAttributes<FastenerGroup>, InferCreationAttributes<FastenerGroup>> {
  declare id: string
  declare repairOrderId: string
  declare specRevisionId: string
  declare name: string
  declare boltCount: number
  declare pattern: Pattern
  declare tighteningOrder: number[]
  declare createdBy: string
  declare createdAt: Date

  declare positions?: NonAttribute<FastenerPosition[]>
  declare revision?: NonAttribute<TorqueSpecRevision>
  declare repairOrder?: NonAttribute<RepairOrder>
  declare signOffs?: NonAttribute<SignOff[]>
  declare disturbances?: NonAttribute<Disturbance[]>
  declare concessions?: NonAttribute<Concession[]>
  declare notDisturbedMark?: NonAttribute<NotDisturbedMark | null>
}

export function initFastenerGroup(sequelize: Sequelize) {
  FastenerGroup.init({
    id: key(),
    shopId: required(DataTypes.UUID),
    repairOrderId: required(DataTypes.UUID),
    specRevisionId: required(DataTypes.UUID),
    name: required(DataTypes.TEXT),
    boltCount: required(DataTypes.INTEGER),
    pattern: required(DataTypes.TEXT),
    tighteningOrder: required(DataTypes.JSONB),
    createdBy: required(DataTypes.UUID),
    createdAt: required(DataTypes.DATE),
  }, shopOptions(sequelize, 'fastener_groups'))
}
