import type { SecondCheckQuery, SignOffListItem } from '#shared/schemas/sign-offs'
import type { StageSpec } from '#shared/torque/stages'
import type { ReadContext } from '../../context'
import { Conditions, type Page, page } from '../../db/page'
import { checkedSql, itemSql, standingSql } from '../sign-offs/queries'

export interface WaitingRow {
  signOff: SignOffListItem
  fastenerGroup: { id: string, name: string }
  vehicle: { id: string, vin: string | null, unitNumber: string | null, make: string, model: string }
  threadCondition: string | null
  stages: StageSpec[] | null
  confirmed: string[]
  positions: number[]
}

/** Standing sign-offs whose spec asks for a second check that has not passed yet, oldest first. */
export function listWaiting(ctx: ReadContext, query: SecondCheckQuery): Promise<Page<WaitingRow>> {
  return page<WaitingRow>(query, {
    select: `${itemSql} AS "signOff", json_build_object('id', g.id, 'name', g.name) AS "fastenerGroup",
      json_build_object('id', c.id, 'vin', c.vin, 'unitNumber', c.unit_number, 'make', c.make, 'model', c.model) AS vehicle,
      r.thread_condition AS "threadCondition", r.stages,
      (SELECT coalesce(json_agg(step->>'code'), '[]') FROM jsonb_array_elements(s.preparation) step WHERE (step->>'confirmed')::boolean) AS confirmed,
      (SELECT json_agg(DISTINCT p.position) FROM sign_off_readings p WHERE p.shop_id = s.shop_id AND p.sign_off_id = s.id) AS positions`,
    from: `sign_offs s JOIN fastener_groups g ON g.id = s.fastener_group_id JOIN torque_spec_revisions r ON r.id = s.spec_revision_id
      JOIN repair_orders o ON o.id = s.repair_order_id JOIN vehicles c ON c.id = o.vehicle_id`,
    id: 's.id',
    where: new Conditions().add('s.shop_id = ?', ctx.shop.id).add('r.second_check_required').add(standingSql('s')).add(`NOT ${checkedSql('s')}`),
    keys: { signedAt: { sql: 's.signed_at', type: 'timestamptz' } },
    defaultSort: 'signedAt',
  })
}
