import {
  DataTypes, type CreationOptional, type InferAttributes, type InferCreationAttributes, type Sequelize,
} from 'sequelize'
import type { Role } from '#shared/types/roles'
import { key, optional, required, withDefault } from '../columns'
import { ShopModel, shopOptions } from '../base'

/** A person of the shop. Secrets are kept as a scrypt hash (passphrase) and a keyed verifier (PIN). */
export class User extends ShopModel<InferAttributes<User>, InferCreationAttributes<User>> {
  declare id: string
  declare name: string
  declare email: string
  declare role: Role
  declare active: CreationOptional<boolean>
  declare passphraseHash: string
  declare mustChangePassphrase: CreationOptional<boolean>
  declare pinVerifier: string | null
  declare pinFailures: CreationOptional<number>
  declare createdAt: Date
}

export function initUser(sequelize: Sequelize) {
  User.init({
    id: key(),
    shopId: required(DataTypes.UUID),
    name: required(DataTypes.TEXT),
    email: required(DataTypes.TEXT),
    role: required(DataTypes.TEXT),
    active: withDefault(DataTypes.BOOLEAN, true),
    passphraseHash: required(DataTypes.TEXT),
    mustChangePassphrase: withDefault(DataTypes.BOOLEAN, false),
    pinVerifier: optional(DataTypes.TEXT),
    pinFailures: withDefault(DataTypes.INTEGER, 0),
    createdAt: required(DataTypes.DATE),
  }, shopOptions(sequelize, 'users'))
}
