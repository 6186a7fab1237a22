import * as people from './people'
import * as repairOrders from './repair-orders'
import type { RouteContract } from './route'
import * as signOffs from './sign-offs'
import * as wrenches from './wrenches'
import * as torque from './torque'
import * as torqueSpecs from './torque-specs'
import * as vehicles from './vehicles'

/** Every route of the API. A test holds this list against the files of server/api. */
export const contracts: readonly RouteContract[] = [
  ...Object.values(people),
  ...Object.values(repairOrders),
  ...Object.values(signOffs),
  ...Object.values(wrenches),
  ...Object.values(torque),
  ...Object.values(torqueSpecs),
  ...Object.values(vehicles),
]
