import { listVehicles as contract } from '../../contract/vehicles'
import { presentVehicle } from '../../presenters/vehicles'
import { listVehicles } from '../../services/vehicles/queries'
import { defineRoute } from '../../utils/defineRoute'

export default defineRoute(contract, async (ctx, { query }) => {
  const { items, nextCursor } = await listVehicles(ctx, query)
  return { items: items.map(vehicle => presentVehicle(ctx.actor, vehicle)), nextCursor }
})
