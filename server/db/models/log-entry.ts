import { DataTypes, type InferAttributes, type InferCreationAttributes, type Sequelize } from 'sequelize'
import { keyPart, optional, required } from '../columns'
import { ShopModel, shopOptions } from '../base'

/** One entry of a shop's hash-chained log. Written by services/log/append only; never changed. */
export class LogEntry extends ShopModel<InferAttributes<LogEntry>, InferCreationAttributes<LogEntry>> {
  declare sequence: number
  /** `<resource>.<verb>` */
  declare kind: string
  /** Id of the record it is about. */
  declare subject: string
  /** The person who did it; null where the product did it itself. */
  declare actor: string | null
  declare at: Date
  /** Canonical JSON (RFC 8785) of what was recorded. */
  declare content: string
  declare previousHash: string
  declare hash: string
}

export function initLogEntry(sequelize: Sequelize) {
  LogEntry.init({
    shopId: keyPart(DataTypes.UUID),
    sequence: keyPart(DataTypes.BIGINT),
    kind: required(DataTypes.TEXT),
    subject: required(DataTypes.UUID),
    actor: optional(DataTypes.UUID),
    at: required(DataTypes.DATE),
    content: required(DataTypes.TEXT),
    previousHash: required(DataTypes.CHAR(64)),
    hash: required(DataTypes.CHAR(64)),
  }, shopOptions(sequelize, 'log_entries'))
}
