import { createRepairOrderBody, type CreateRepairOrderBody } from '#shared/schemas/repair-orders'
import { createVehicleBody, type CreateVehicleBody } from '#shared/schemas/vehicles'
import { checkVin } from '#shared/vehicle/vin'
import { FieldReader, readForm } from './form-issues'

/** A new repair order as typed. */
export const emptyOrder = { number: '', bay: '', complaint: '', odometer: '' }
export type OrderEntry = typeof emptyOrder

/** A new vehicle as typed; `keepVin` says that a VIN with a wrong check digit is right all the same. */
export const emptyVehicle = { vin: '', unitNumber: '', plate: '', year: '', make: '', model: '', engine: '', keepVin: false }
export type VehicleEntry = typeof emptyVehicle

/** @throws ApiError 400 `invalid` with every issue */
export function readOrder({ number, bay, complaint, odometer }: OrderEntry, vehicleId: string): CreateRepairOrderBody {
  const read = new FieldReader()
  const value = {
    number, vehicleId, bay: read.text(bay), complaint: read.text(complaint), odometer: read.number('odometer', odometer),
  }
  return readForm(createRepairOrderBody, { value, issues: read.issues })
}

/** The doubt about a typed VIN that a person can overrule; null when there is none. */
export function vinDoubt(vin: string): string | null {
  const { problem, message } = checkVin(vin)
  return problem === 'check_digit' ? message : null
}

/** @throws ApiError 400 `invalid` with every issue */
export function readVehicle(entry: VehicleEntry): CreateVehicleBody {
  const read = new FieldReader()
  const { vin, unitNumber, plate, year, make, model, engine, keepVin } = entry
  const value = {
    vin: read.text(vin), unitNumber: read.text(unitNumber), plate: read.text(plate), year: read.number('year', year),
    engine: read.text(engine), make, model,
    ...(keepVin && vinDoubt(vin) ? { vinUnverified: true } : {}),
  }
  return readForm(createVehicleBody, { value, issues: read.issues })
}
