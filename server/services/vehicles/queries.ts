import type { VehicleBrief, VehicleQuery } from '#shared/schemas/vehicles'
import type { ReadContext } from '../../context'
import { Vehicle } from '../../db/models/vehicle'
import { Conditions, contains, type Page, page } from '../../db/page'
import { notFound } from '../../refusal'

export interface VehicleRow extends VehicleBrief {
  vinUnverified: boolean
  odometer: number | null
  createdAt: Date
}

const columns = `v.id, v.vin, v.vin_unverified AS "vinUnverified", v.unit_number AS "unitNumber", v.plate, v.year, v.make,
  v.model, v.engine, v.odometer, v.created_at AS "createdAt"`
const searched = ['v.vin', 'v.unit_number', 'v.plate', 'v.make', 'v.model', 'v.engine']

/** Vehicles of the shop; `q` looks in VIN, unit number, plate, make, model and engine. */
export function listVehicles(ctx: ReadContext, query: VehicleQuery): Promise<Page<VehicleRow>> {
  const q = query.q?.trim()
  return page<VehicleRow>(query, {
    select: columns,
    from: 'vehicles v',
    id: 'v.id',
    where: new Conditions().add('v.shop_id = ?', ctx.shop.id)
      .when(q, searched.map(column => `${column} ILIKE ?`).join(' OR '), ...searched.map(() => contains(q ?? ''))),
    keys: {
      unitNumber: { sql: `coalesce(v.unit_number, '')`, type: 'text' },
      make: { sql: 'v.make', type: 'text' },
      createdAt: { sql: 'v.created_at', type: 'timestamptz' },
    },
    defaultSort: '-createdAt',
  })
}

/** A vehicle of the shop. @throws Refusal 404 */
export async function readVehicle(ctx: ReadContext, id: string): Promise<Vehicle> {
  const vehicle = await Vehicle.findOne({ where: { shopId: ctx.shop.id, id }, transaction: ctx.tx })
  if (!vehicle) throw notFound('This vehicle')
  return vehicle
}
