import * as people from './people'

/** What a role may ever do, for the navigation and for the buttons that stand outside a record. */
export const navigation = {
  listUsers: people.listUsers,
  changeShopRules: people.changeShopRules,
}
