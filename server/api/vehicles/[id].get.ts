import { readVehicle as contract } from '../../contract/vehicles'
import { presentVehicle } from '../../presenters/vehicles'
import { readVehicle } from '../../services/vehicles/queries'
import { defineRoute } from '../../utils/defineRoute'

export default defineRoute(contract, async (ctx, { params }) => presentVehicle(ctx.actor, await readVehicle(ctx, params.id)))
