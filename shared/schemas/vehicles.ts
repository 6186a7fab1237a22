import * as z from 'zod/mini'
import { can, listOf, moment, pageQuery, text, uuid } from './common'

/** 17 characters without I, O and Q (ISO 3779; 49 CFR 565). The check digit is judged apart: genuine foreign VINs fail it. */
export const vin = z.string().check(z.trim(), z.toUpperCase(), z.regex(/^[A-HJ-NPR-Z0-9]{17}$/, { error: 'A VIN has 17 letters and digits, without I, O and Q.' }))
const odometer = z.int().check(z.gte(0), z.lte(9_999_999))

const fields = {
  vin: z.optional(vin),
  vinUnverified: z.optional(z.boolean()),
  unitNumber: z.optional(text(40)),
  plate: z.optional(text(20)),
  year: z.optional(z.int().check(z.gte(1900), z.lte(2100))),
  engine: z.optional(text(80)),
  odometer: z.optional(odometer),
}
export const createVehicleBody = z.strictObject({ ...fields, make: text(80), model: text(80) })
export const updateVehicleBody = z.strictObject({ ...fields, make: z.optional(text(80)), model: z.optional(text(80)) })

export const vehicleSorts = ['unitNumber', 'make', 'createdAt'] as const
export const vehicleQuery = z.strictObject({ ...pageQuery(vehicleSorts), q: z.optional(z.string().check(z.maxLength(100))) })

export const vehicleAnswer = z.strictObject({
  id: uuid,
  vin: z.nullable(z.string()),
  vinUnverified: z.boolean(),
  unitNumber: z.nullable(z.string()),
  plate: z.nullable(z.string()),
  year: z.nullable(z.int()),
  make: z.string(),
  model: z.string(),
  engine: z.nullable(z.string()),
  odometer: z.nullable(z.int()),
  createdAt: moment,
  can,
})
/** A vehicle as named beside a repair order. */
export const vehicleBrief = z.strictObject({
  id: uuid, vin: z.nullable(z.string()), unitNumber: z.nullable(z.string()), plate: z.nullable(z.string()),
  year: z.nullable(z.int()), make: z.string(), model: z.string(), engine: z.nullable(z.string()),
})
export const vehicleListAnswer = listOf(vehicleAnswer)

export type CreateVehicleBody = z.infer<typeof createVehicleBody>
export type UpdateVehicleBody = z.infer<typeof updateVehicleBody>
export type VehicleQuery = z.infer<typeof vehicleQuery>
export type VehicleAnswer = z.infer<typeof vehicleAnswer>
export type VehicleBrief = z.infer<typeof vehicleBrief>
export { odometer }
