import { DataTypes, type DataType } from 'sequelize'

// Sequelize writes into the definitions it is given, so every column gets one of its own.

/** The table's own key, made by whoever makes the record. */
export const key = () => ({ type: DataTypes.UUID, primaryKey: true, allowNull: false })

/** A part of a key that several columns make up. */
export const keyPart = (type: DataType) => ({ type, primaryKey: true, allowNull: false })

/** A column that always has a value. */
export const required = (type: DataType) => ({ type, allowNull: false })

/** A column that may be empty. */
export const optional = (type: DataType) => ({ type, allowNull: true })

/** A column that always has a value: this one, unless another is given. */
export const withDefault = (type: DataType, value: unknown) => ({ type, allowNull: false, defaultValue: value })
