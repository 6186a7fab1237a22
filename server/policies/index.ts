import * as people from './people'
import * as orders from './repair-orders'
import * as signOffs from './sign-offs'
import * as wrenches from './wrenches'
import * as specs from './torque-specs'
import * as vehicles from './vehicles'

/** What a role may ever do, for the navigation and for the buttons that stand outside a record. */
export const navigation = {
  listUsers: people.listUsers,
  changeShopRules: people.changeShopRules,
  createVehicle: vehicles.createVehicle,
  createSpec: specs.createSpec,
  approveSpec: specs.approveSpec,
  importSpecs: specs.importSpecs,
  createOrder: orders.createOrder,
  sign: signOffs.recordSignOff,
  secondCheck: signOffs.recordSecondCheck,
  readLog: signOffs.readLog,
  createWrench: wrenches.createWrench,
  recordCalibration: wrenches.recordCalibration,
}
