import { uuidv7 } from '#shared/ids/uuid'
import type { Actor, Context, Shop } from './context'
import { database } from './db'

/** Runs a service outside a route (seeds, jobs, tests) in one transaction, as a given person at a given time. */
export function inTransaction<Result>(who: { actor: Actor, shop: Shop, now: Date }, work: (ctx: Context) => Promise<Result>): Promise<Result> {
  return database().transaction(tx => work({ ...who, tx, requestId: uuidv7(who.now.getTime()) }))
}
