import { uuidv7 } from '#shared/ids/uuid'
import type { CreateVehicleBody, UpdateVehicleBody } from '#shared/schemas/vehicles'
import { checkVin } from '#shared/vehicle/vin'
import type { Context } from '../../context'
import { Vehicle } from '../../db/models/vehicle'
import { authorize } from '../../policies/policy'
import * as policies from '../../policies/vehicles'
import { notFound, refused } from '../../refusal'
import { appendToLog } from '../log/append'

/**
 * Whether a VIN stands there against its check digit: right for some vehicles from outside North America, so a person
 * may say so. @throws Refusal 422 `vin_check_digit` when nobody said so
 */
function isUnverified(vin: string | null, said: boolean): boolean {
  if (vin === null) return false
  const { problem, message } = checkVin(vin)
  if (problem === 'check_digit' && !said) throw refused('vin_check_digit', message, 'vin')
  return problem === 'check_digit'
}

/** Adds a vehicle. @throws Refusal 422 `vin_check_digit`; a VIN or unit number that is there already: 409 `id_taken` */
export async function createVehicle(ctx: Context, body: CreateVehicleBody): Promise<Vehicle> {
  authorize(ctx.actor, policies.createVehicle, undefined)
  const id = uuidv7(ctx.now.getTime())
  const vin = body.vin ?? null
  const record = {
    vin,
    vinUnverified: isUnverified(vin, body.vinUnverified ?? false),
    unitNumber: body.unitNumber ?? null,
    plate: body.plate ?? null,
    year: body.year ?? null,
    make: body.make,
    model: body.model,
    engine: body.engine ?? null,
    odometer: body.odometer ?? null,
  }
  const vehicle = await Vehicle.create({ id, shopId: ctx.shop.id, ...record, createdAt: ctx.now }, {
    transaction: ctx.tx,
  })
  await appendToLog(ctx, { kind: 'vehicles.create', subject: id, content: record })
  return vehicle
}

/** Corrects or completes a vehicle. @throws Refusal 404, 422 `vin_check_digit`; 409 as createVehicle */
export async function updateVehicle(ctx: Context, id: string, body: UpdateVehicleBody): Promise<Vehicle> {
  const vehicle = await Vehicle.findOne({
    where: { shopId: ctx.shop.id, id }, lock: ctx.tx.LOCK.UPDATE, transaction: ctx.tx,
  })
  if (!vehicle) throw notFound('This vehicle')
  authorize(ctx.actor, policies.updateVehicle, undefined)
  const vin = body.vin ?? vehicle.vin
  // Once said of a VIN, it need not be said again; another VIN is judged anew.
  const said = body.vinUnverified ?? (vin === vehicle.vin && vehicle.vinUnverified)
  vehicle.set({ ...body, vinUnverified: isUnverified(vin, said) })
  if (!vehicle.changed()) return vehicle
  const before = vehicle.previous()
  const after = Object.fromEntries(Object.keys(before).map(name => [name, vehicle.get(name)]))
  await vehicle.save({ transaction: ctx.tx })
  await appendToLog(ctx, { kind: 'vehicles.update', subject: id, content: { before, after } })
  return vehicle
}
