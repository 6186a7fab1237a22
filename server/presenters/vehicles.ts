import type { VehicleAnswer, VehicleBrief } from '#shared/schemas/vehicles'
import type { Actor } from '../context'
import { canDo } from '../policies/policy'
import { updateVehicle } from '../policies/vehicles'
import type { VehicleRow } from '../services/vehicles/queries'

/** A vehicle as named beside a repair order. */
export const vehicleBrief = ({ id, vin, unitNumber, plate, year, make, model, engine }: VehicleBrief): VehicleBrief =>
  ({ id, vin, unitNumber, plate, year, make, model, engine })

/** A vehicle with what may be done to it. */
export const presentVehicle = (actor: Actor, vehicle: VehicleRow): VehicleAnswer => ({
  ...vehicleBrief(vehicle),
  vinUnverified: vehicle.vinUnverified,
  odometer: vehicle.odometer,
  createdAt: vehicle.createdAt.toISOString(),
  can: canDo(actor, undefined, { update: updateVehicle }),
})
