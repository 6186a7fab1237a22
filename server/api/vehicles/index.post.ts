import { createVehicle as contract } from '../../contract/vehicles'
import { presentVehicle } from '../../presenters/vehicles'
import { createVehicle } from '../../services/vehicles/vehicles'
import { defineRoute } from '../../utils/defineRoute'

export default defineRoute(contract, async (ctx, { body }) => presentVehicle(ctx.actor, await createVehicle(ctx, body)))
