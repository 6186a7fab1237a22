import type { Transaction } from 'sequelize'
import type { Role } from '#shared/types/roles'
import type { ShopRules } from '#shared/schemas/auth'

/** The person who asks, as the database knows them at this request. */
export interface Actor {
  id: string
  name: string
  email: string
  role: Role
  shopId: string
  sessionId: string | null
}

/** The shop that everything in a request belongs to. */
export interface Shop {
  id: string
  name: string
  timeZone: string
  rules: ShopRules
}

/** What a service reads with. Time is an input: services never ask the clock. */
export interface ReadContext {
  actor: Actor
  shop: Shop
  now: Date
  requestId: string
  /** The transaction of a mutation; reads outside one have none. */
  tx: Transaction | null
}

/** What a service changes with: always inside one transaction. */
export interface Context extends ReadContext {
  tx: Transaction
}
