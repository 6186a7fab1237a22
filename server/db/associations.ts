import { Calibration } from './models/calibration'
import { CalibrationPoint } from './models/calibration-point'
import { CalibrationReading } from './models/calibration-reading'
import { Concession } from './models/concession'
import { Disturbance } from './models/disturbance'
import { FastenerGroup } from './models/fastener-group'
import { FastenerPosition } from './models/fastener-position'
import { NotDisturbedMark } from './models/not-disturbed-mark'
import { Release } from './models/release'
import { RepairOrder } from './models/repair-order'
import { SecondCheck } from './models/second-check'
import { SecondCheckReading } from './models/second-check-reading'
import { Session } from './models/session'
import { SignOff } from './models/sign-off'
import { SignOffReading } from './models/sign-off-reading'
import { SignOffVoid } from './models/sign-off-void'
import { TorqueSpec } from './models/torque-spec'
import { TorqueSpecRevision } from './models/torque-spec-revision'
import { User } from './models/user'
import { Vehicle } from './models/vehicle'
import { Wrench } from './models/wrench'

/** Ties the models together. The keys in the database hold the shop as well, so no join crosses shops. */
export function associate() {
  Session.belongsTo(User, { as: 'user', foreignKey: 'userId' })

  TorqueSpec.hasMany(TorqueSpecRevision, { as: 'revisions', foreignKey: 'specId' })
  TorqueSpecRevision.belongsTo(TorqueSpec, { as: 'spec', foreignKey: 'specId' })
  TorqueSpecRevision.belongsTo(User, { as: 'createdByUser', foreignKey: 'createdBy' })
  TorqueSpecRevision.belongsTo(User, { as: 'approvedByUser', foreignKey: 'approvedBy' })

  RepairOrder.belongsTo(Vehicle, { as: 'vehicle', foreignKey: 'vehicleId' })
  RepairOrder.belongsTo(User, { as: 'openedByUser', foreignKey: 'openedBy' })
  RepairOrder.hasMany(FastenerGroup, { as: 'groups', foreignKey: 'repairOrderId' })
  RepairOrder.hasOne(Release, { as: 'release', foreignKey: 'repairOrderId' })
  Release.belongsTo(User, { as: 'by', foreignKey: 'byUser' })

  FastenerGroup.belongsTo(RepairOrder, { as: 'repairOrder', foreignKey: 'repairOrderId' })
  FastenerGroup.belongsTo(TorqueSpecRevision, { as: 'revision', foreignKey: 'specRevisionId' })
  FastenerGroup.hasMany(FastenerPosition, { as: 'positions', foreignKey: 'groupId' })
  FastenerGroup.hasMany(SignOff, { as: 'signOffs', foreignKey: 'fastenerGroupId' })
  FastenerGroup.hasMany(Disturbance, { as: 'disturbances', foreignKey: 'fastenerGroupId' })
  FastenerGroup.hasMany(Concession, { as: 'concessions', foreignKey: 'fastenerGroupId' })
  FastenerGroup.hasOne(NotDisturbedMark, { as: 'notDisturbedMark', foreignKey: 'fastenerGroupId' })
  Disturbance.belongsTo(User, { as: 'by', foreignKey: 'byUser' })
  Concession.belongsTo(User, { as: 'by', foreignKey: 'byUser' })
  NotDisturbedMark.belongsTo(User, { as: 'by', foreignKey: 'byUser' })

  Wrench.hasMany(Calibration, { as: 'calibrations', foreignKey: 'wrenchId' })
  Calibration.belongsTo(Wrench, { as: 'wrench', foreignKey: 'wrenchId' })
  Calibration.belongsTo(User, { as: 'recordedByUser', foreignKey: 'recordedBy' })
  Calibration.hasMany(CalibrationPoint, { as: 'points', foreignKey: 'calibrationId' })
  // Sequelize joins on one column, so the readings of all points hang on the calibration.
  Calibration.hasMany(CalibrationReading, { as: 'readings', foreignKey: 'calibrationId' })

  SignOff.belongsTo(FastenerGroup, { as: 'group', foreignKey: 'fastenerGroupId' })
  SignOff.belongsTo(RepairOrder, { as: 'repairOrder', foreignKey: 'repairOrderId' })
  SignOff.belongsTo(TorqueSpecRevision, { as: 'revision', foreignKey: 'specRevisionId' })
  SignOff.belongsTo(Wrench, { as: 'wrench', foreignKey: 'wrenchId' })
  SignOff.belongsTo(Calibration, { as: 'calibration', foreignKey: 'calibrationId' })
  SignOff.belongsTo(User, { as: 'technician', foreignKey: 'technicianId' })
  SignOff.hasMany(SignOffReading, { as: 'readings', foreignKey: 'signOffId' })
  SignOff.hasOne(SignOffVoid, { as: 'voided', foreignKey: 'signOffId' })
  SignOff.hasOne(SignOff, { as: 'supersededBy', foreignKey: 'supersedesId' })
  SignOff.hasMany(SecondCheck, { as: 'secondChecks', foreignKey: 'signOffId' })
  SignOffVoid.belongsTo(User, { as: 'by', foreignKey: 'byUser' })

  SecondCheck.belongsTo(SignOff, { as: 'signOff', foreignKey: 'signOffId' })
  SecondCheck.belongsTo(User, { as: 'checkedByUser', foreignKey: 'checkedBy' })
  SecondCheck.belongsTo(Wrench, { as: 'wrench', foreignKey: 'wrenchId' })
  SecondCheck.hasMany(SecondCheckReading, { as: 'readings', foreignKey: 'secondCheckId' })
}
