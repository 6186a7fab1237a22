import type { Sequelize } from 'sequelize'
import { associate } from './associations'
import { connect } from './client'
import { initCalibration } from './models/calibration'
import { initCalibrationPoint } from './models/calibration-point'
import { initCalibrationReading } from './models/calibration-reading'
import { initConcession } from './models/concession'
import { initDisturbance } from './models/disturbance'
import { initFastenerGroup } from './models/fastener-group'
import { initFastenerPosition } from './models/fastener-position'
import { initLogEntry } from './models/log-entry'
import { initNotDisturbedMark } from './models/not-disturbed-mark'
import { initRelease } from './models/release'
import { initRepairOrder } from './models/repair-order'
import { initSecondCheck } from './models/second-check'
import { initSecondCheckReading } from './models/second-check-reading'
import { initSession } from './models/session'
import { initShop } from './models/shop'
import { initSignOff } from './models/sign-off'
import { initSignOffReading } from './models/sign-off-reading'
import { initSignOffVoid } from './models/sign-off-void'
import { initTorqueSpec } from './models/torque-spec'
import { initTorqueSpecRevision } from './models/torque-spec-revision'
import { initUser } from './models/user'
import { initVehicle } from './models/vehicle'
import { initWrench } from './models/wrench'

const initAll = [
  initShop, initUser, initSession, initVehicle, initTorqueSpec, initTorqueSpecRevision, initRepairOrder,
  initFastenerGroup, initFastenerPosition, initWrench, initCalibration, initCalibrationPoint, initCalibrationReading,
  initSignOff, initSignOffReading, initSignOffVoid, initSecondCheck, initSecondCheckReading, initDisturbance,
  initConcession, initNotDisturbedMark, initRelease, initLogEntry,
]

let opened: { url: string, sequelize: Sequelize } | undefined

/**
 * Opens the database and binds the models to it. Again with the same address: answers the one that is open.
 * @throws Error when another address is open, for the models belong to one database
 */
export function openDatabase(url: string, options: Parameters<typeof connect>[1] = {}): Sequelize {
  if (opened) {
    if (opened.url !== url) throw new Error('Another database is open: close it first.')
    return opened.sequelize
  }
  const sequelize = connect(url, options)
  for (const init of initAll) init(sequelize)
  associate()
  opened = { url, sequelize }
  return sequelize
}

/** The open database. @throws Error before openDatabase */
export function database(): Sequelize {
  if (!opened) throw new Error('The database is not open.')
  return opened.sequelize
}

/** Closes all connections, once what runs on them has ended. */
export async function closeDatabase(): Promise<void> {
  const closing = opened
  opened = undefined
  await closing?.sequelize.close()
}
