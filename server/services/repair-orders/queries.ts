import { QueryTypes } from 'sequelize'
import type { RepairOrderQuery } from '#shared/schemas/repair-orders'
import type { VehicleBrief } from '#shared/schemas/vehicles'
import type { ReadContext } from '../../context'
import { database } from '../../db'
import { Conditions, contains, type Page, page } from '../../db/page'
import { notFound } from '../../refusal'
import { factsOfOrders } from '../fastener-groups/facts'
import { type DerivedGroup, deriveGroup, type GroupFacts } from '../fastener-groups/state'

export interface OrderRow {
  id: string
  number: string
  vehicle: VehicleBrief
  complaint: string | null
  odometer: number | null
  bay: string | null
  openedAt: Date
  openedBy: { id: string, name: string }
  release: { id: string, at: string, by: { id: string, name: string }, sequence: number, hash: string, ownJoint: boolean } | null
}
/** An order with its groups and what is derived of each. */
export interface OrderView {
  row: OrderRow
  groups: { facts: GroupFacts, derived: DerivedGroup }[]
}

const from = `repair_orders o
  JOIN vehicles v ON v.id = o.vehicle_id
  JOIN users u ON u.id = o.opened_by
  LEFT JOIN releases x ON x.shop_id = o.shop_id AND x.repair_order_id = o.id
  LEFT JOIN users xu ON xu.id = x.by_user
  LEFT JOIN log_entries xl ON xl.shop_id = x.shop_id AND xl.sequence = x.log_sequence`

export const vehicleJson = `json_build_object('id', v.id, 'vin', v.vin, 'unitNumber', v.unit_number, 'plate', v.plate,
  'year', v.year, 'make', v.make, 'model', v.model, 'engine', v.engine)`

const select = `o.id, o.number, ${vehicleJson} AS vehicle, o.complaint, o.odometer, o.bay, o.opened_at AS "openedAt",
  json_build_object('id', u.id, 'name', u.name) AS "openedBy",
  CASE WHEN x.id IS NULL THEN NULL ELSE json_build_object('id', x.id, 'at', x.at, 'by', json_build_object('id', xu.id, 'name', xu.name),
    'sequence', x.log_sequence, 'hash', xl.hash, 'ownJoint', x.own_joint) END AS release`

async function withGroups(ctx: ReadContext, rows: OrderRow[]): Promise<OrderView[]> {
  const facts = rows.length > 0 ? await factsOfOrders(ctx, rows.map(row => row.id)) : []
  const groups = facts.map(item => ({ facts: item, derived: deriveGroup(item) }))
  return rows.map(row => ({ row, groups: groups.filter(group => group.facts.repairOrderId === row.id) }))
}

/** Repair orders; `mine` are those that the asking person opened or signed on. */
export async function listOrders(ctx: ReadContext, query: RepairOrderQuery): Promise<Page<OrderView>> {
  const where = new Conditions().add('o.shop_id = ?', ctx.shop.id)
    .when(query.vehicleId, 'o.vehicle_id = ?')
    .when(query.q && contains(query.q), 'o.number ILIKE ? OR v.unit_number ILIKE ? OR v.vin ILIKE ? OR v.plate ILIKE ?', ...Array.from({ length: 4 }, () => contains(query.q ?? '')))
  if (query.state === 'open') where.add('x.id IS NULL')
  if (query.state === 'released') where.add('x.id IS NOT NULL')
  if (query.mine) {
    where.add('o.opened_by = ? OR EXISTS (SELECT 1 FROM sign_offs s WHERE s.shop_id = o.shop_id AND s.repair_order_id = o.id AND s.technician_id = ?)', ctx.actor.id, ctx.actor.id)
  }
  const { items, nextCursor } = await page<OrderRow>(query, {
    select,
    from,
    id: 'o.id',
    where,
    keys: {
      openedAt: { sql: 'o.opened_at', type: 'timestamptz' },
      number: { sql: 'o.number', type: 'text' },
      bay: { sql: `coalesce(o.bay, '')`, type: 'text' },
    },
    defaultSort: '-openedAt',
  })
  return { items: await withGroups(ctx, items), nextCursor }
}

/** One order. @throws Refusal 404 */
export async function readOrder(ctx: ReadContext, id: string): Promise<OrderView> {
  const rows = await database().query<OrderRow>(
    `SELECT ${select} FROM ${from} WHERE o.shop_id = $1 AND o.id = $2`,
    { bind: [ctx.shop.id, id], type: QueryTypes.SELECT, transaction: ctx.tx },
  )
  const [view] = await withGroups(ctx, rows)
  if (!view) throw notFound('This repair order')
  return view
}
