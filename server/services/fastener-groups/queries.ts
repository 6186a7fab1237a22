import type { ReadContext } from '../../context'
import { FastenerGroup } from '../../db/models/fastener-group'
import { Vehicle } from '../../db/models/vehicle'
import { notFound } from '../../refusal'
import { signOffsOfGroup } from '../sign-offs/queries'
import { factsOfGroup } from './facts'
import { loadGroup } from './load'
import { deriveGroup } from './state'

/** A group with everything its screen shows. @throws Refusal 404 */
export async function readGroup(ctx: ReadContext, id: string) {
  const loaded = await loadGroup(ctx, id)
  const facts = loaded ? await factsOfGroup(ctx, id) : undefined
  if (!loaded || !facts) throw notFound('This fastener group')
  const at = { transaction: ctx.tx, rejectOnEmpty: true as const }
  const where = { shopId: ctx.shop.id }
  const marked = await FastenerGroup.findOne({
    where: { ...where, id },
    include: [
      'positions',
      { association: 'disturbances', include: ['by'] },
      { association: 'concessions', include: ['by'] },
      { association: 'notDisturbedMark', include: ['by'] },
      { association: 'revision', include: ['spec', 'createdByUser', 'approvedByUser'] },
    ],
    ...at,
  })
  const vehicle = await Vehicle.findOne({ where: { ...where, id: loaded.order.vehicleId }, ...at })
  return { ...loaded, marked, vehicle, facts, derived: deriveGroup(facts), signOffs: await signOffsOfGroup(ctx, id) }
}

/** What `readGroup` answers. */
export type GroupView = Awaited<ReturnType<typeof readGroup>>
