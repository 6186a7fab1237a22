import type { Context, ReadContext } from '../../context'
import { FastenerGroup } from '../../db/models/fastener-group'
import { Release } from '../../db/models/release'
import { RepairOrder } from '../../db/models/repair-order'
import { TorqueSpec } from '../../db/models/torque-spec'
import { TorqueSpecRevision } from '../../db/models/torque-spec-revision'
import { stagesOf, type Stage } from '#shared/torque/stages'

/** A group with the rows that its signing looks at. */
export interface LoadedGroup {
  group: FastenerGroup
  revision: TorqueSpecRevision
  spec: TorqueSpec
  order: RepairOrder
  released: boolean
  stages: Stage[]
}

/** The stages of a revision, in N·m. */
export const stagesOfRevision = (revision: TorqueSpecRevision): Stage[] =>
  stagesOf({ targetNm: revision.targetNm, lowerNm: revision.lowerNm, upperNm: revision.upperNm }, revision.stages, revision.tolerance)

async function complete(ctx: ReadContext, group: FastenerGroup): Promise<LoadedGroup> {
  const shopId = ctx.shop.id
  const at = { transaction: ctx.tx, rejectOnEmpty: true as const }
  const revision = await TorqueSpecRevision.findOne({ where: { shopId, id: group.specRevisionId }, ...at })
  const spec = await TorqueSpec.findOne({ where: { shopId, id: revision.specId }, ...at })
  const order = await RepairOrder.findOne({ where: { shopId, id: group.repairOrderId }, ...at })
  const released = await Release.count({ where: { shopId, repairOrderId: order.id }, transaction: ctx.tx }) > 0
  return { group, revision, spec, order, released, stages: stagesOfRevision(revision) }
}

/** Locks a group, so that two people cannot sign the same position, and loads what decides; null when not there. */
export async function lockGroup(ctx: Context, id: string): Promise<LoadedGroup | null> {
  const group = await FastenerGroup.findOne({ where: { shopId: ctx.shop.id, id }, lock: ctx.tx.LOCK.UPDATE, transaction: ctx.tx })
  return group ? complete(ctx, group) : null
}

/** The same without a lock, to look at. */
export async function loadGroup(ctx: ReadContext, id: string): Promise<LoadedGroup | null> {
  const group = await FastenerGroup.findOne({ where: { shopId: ctx.shop.id, id }, transaction: ctx.tx })
  return group ? complete(ctx, group) : null
}
