import { updateVehicle as contract } from '../../contract/vehicles'
import { presentVehicle } from '../../presenters/vehicles'
import { updateVehicle } from '../../services/vehicles/vehicles'
import { defineRoute } from '../../utils/defineRoute'

export default defineRoute(contract, async (ctx, { params, body }) =>
  presentVehicle(ctx.actor, await updateVehicle(ctx, params.id, body)))
