import * as people from './people'
import * as orders from './repair-orders'
import * as signOffs from './sign-offs'

/** What a role may ever do, for the navigation and for the buttons that stand outside a record. */
export const navigation = {
  listUsers: people.listUsers,
  changeShopRules: people.changeShopRules,
  createOrder: orders.createOrder,
  sign: signOffs.recordSignOff,
  secondCheck: signOffs.recordSecondCheck,
  readLog: signOffs.readLog,
}
