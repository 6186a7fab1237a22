import {
  DataTypes, type InferAttributes, type InferCreationAttributes, type NonAttribute, type Sequelize,
} from 'sequelize'
import { key, optional, required } from '../columns'
import { ShopModel, shopOptions } from '../base'
import type { CalibrationPoint } from './calibration-point'
import type { CalibrationReading } from './calibration-reading'
import type { User } from './user'
import type { Wrench } from './wrench'

/** A calibration certificate of a wrench, as recorded. Never changed. */
export class Calibration extends ShopModel<InferAttributes<Calibration>, InferCreationAttributes<Calibration>> {
  declare id: string
  declare wrenchId: string
  declare performedOn: string
  declare laboratory: string
  declare certificateNumber: string
  declare referenceUncertaintyPercent: number
  declare asFoundUnavailableReason: string | null
  declare adjusted: boolean
  declare note: string | null
  declare result: 'pass' | 'fail'
  declare usable: boolean
  declare decisionRule: string
  declare dueOn: string
  declare recordedBy: string
  declare recordedAt: Date

  declare wrench?: NonAttribute<Wrench>
  declare points?: NonAttribute<CalibrationPoint[]>
  /** The readings of all points; each says which `point` it is of. */
  declare readings?: NonAttribute<CalibrationReading[]>
  declare recordedByUser?: NonAttribute<User>
}

export function initCalibration(sequelize: Sequelize) {
  Calibration.init({
    id: key(),
    shopId: required(DataTypes.UUID),
    wrenchId: required(DataTypes.UUID),
    performedOn: required(DataTypes.DATEONLY),
    laboratory: required(DataTypes.TEXT),
    certificateNumber: required(DataTypes.TEXT),
    referenceUncertaintyPercent: required(DataTypes.DOUBLE),
    asFoundUnavailableReason: optional(DataTypes.TEXT),
    adjusted: required(DataTypes.BOOLEAN),
    note: optional(DataTypes.TEXT),
    result: required(DataTypes.TEXT),
    usable: required(DataTypes.BOOLEAN),
    decisionRule: required(DataTypes.TEXT),
    dueOn: required(DataTypes.DATEONLY),
    recordedBy: required(DataTypes.UUID),
    recordedAt: required(DataTypes.DATE),
  }, shopOptions(sequelize, 'calibrations'))
}
