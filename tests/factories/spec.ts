import type { Actor, Shop } from '../../server/context'
import { approveSpec, createSpec, type NewSpec, type SpecWithRevision } from '../../server/services/torque-specs/specs'
import { inTransaction } from '../../server/transaction'
import { buildUser, unique } from './shop'

/** The body of a spec of 41 N·m for four bolts on a circle. */
export function specBody(overrides: Partial<NewSpec> = {}): NewSpec {
  return {
    kind: 'joint',
    component: unique('Water pump to block'),
    application: 'engine, cooling system',
    jointClass: 'general',
    boltCount: 4,
    pattern: 'circle',
    target: { value: 41, unit: 'N.m' },
    source: { title: 'Invented manual', section: '6-12', page: '214' },
    ...overrides,
  }
}

/** A spec drafted by a foreman of the shop unless somebody else is named. */
export async function buildSpecDraft(shop: Shop, overrides: Partial<NewSpec> = {}, by?: Actor): Promise<SpecWithRevision> {
  const actor = by ?? await buildUser(shop, 'foreman')
  return inTransaction({ actor, shop, now: new Date() }, ctx => createSpec(ctx, specBody(overrides)))
}

/** An approved spec: drafted by a technician, approved by a foreman. */
export async function buildApprovedSpec(shop: Shop, overrides: Partial<NewSpec> = {}): Promise<SpecWithRevision> {
  const { spec } = await buildSpecDraft(shop, overrides, await buildUser(shop, 'technician'))
  const actor = await buildUser(shop, 'foreman')
  return inTransaction({ actor, shop, now: new Date() }, ctx => approveSpec(ctx, spec.id))
}
