import { shopsAndPeople } from './20261201000100-shops-and-people'
import { vehiclesSpecsOrders } from './20261201000200-vehicles-specs-orders'
import { wrenchesCalibrations } from './20261201000300-wrenches-calibrations'
import { signOffsAndLog } from './20261201000400-sign-offs-and-log'
import { appendOnly } from './20261201000500-append-only'
import { foreignKeyIndexes } from './20261201000600-foreign-key-indexes'
import type { Migration } from './types'

/** Every migration, oldest first. Named here one by one so that the built server knows the newest too. */
export const migrations: readonly Migration[] = [
  shopsAndPeople, vehiclesSpecsOrders, wrenchesCalibrations, signOffsAndLog, appendOnly, foreignKeyIndexes,
]
