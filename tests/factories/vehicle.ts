import type { CreateVehicleBody } from '#shared/schemas/vehicles'
import type { Actor, Shop } from '../../server/context'
import type { Vehicle } from '../../server/db/models/vehicle'
import { createVehicle } from '../../server/services/vehicles/vehicles'
import { inTransaction } from '../../server/transaction'
import { buildUser } from './shop'

/** A vehicle of a shop, added by a foreman of it unless somebody else is named. */
export async function buildVehicle(shop: Shop, overrides: Partial<CreateVehicleBody> = {}, by?: Actor): Promise<Vehicle> {
  const actor = by ?? await buildUser(shop, 'foreman')
  return inTransaction({ actor, shop, now: new Date() }, ctx => createVehicle(ctx, { make: 'Invented', model: 'Shuttle', ...overrides }))
}
