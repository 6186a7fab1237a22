import { uuidv7 } from '#shared/ids/uuid'
import type { CreateRepairOrderBody, UpdateRepairOrderBody } from '#shared/schemas/repair-orders'
import type { Context } from '../../context'
import { FastenerGroup } from '../../db/models/fastener-group'
import { Release } from '../../db/models/release'
import { RepairOrder } from '../../db/models/repair-order'
import { Vehicle } from '../../db/models/vehicle'
import { authorize } from '../../policies/policy'
import { releaseOrder as mayRelease } from '../../policies/repair-orders'
import { conflict, notFound, refused, unknownReference } from '../../refusal'
import { factsOfOrders } from '../fastener-groups/facts'
import { deriveGroup, isReleasable } from '../fastener-groups/state'
import { appendToLog } from '../log/append'
import { requirePin } from '../people/pin'

/** Opens a repair order for a vehicle of the shop. @throws Refusal 409 `id_taken` for a number in use, 422 `unknown_reference` */
export async function openOrder(ctx: Context, body: CreateRepairOrderBody): Promise<RepairOrder> {
  const vehicle = await Vehicle.findOne({ where: { shopId: ctx.shop.id, id: body.vehicleId }, transaction: ctx.tx })
  const taken = await RepairOrder.count({ where: { shopId: ctx.shop.id, number: body.number }, transaction: ctx.tx })
  if (taken > 0) {
    const message = `There is a repair order ${body.number} already.`
    throw conflict('id_taken', message, { issues: [{ path: 'number', message, code: 'id_taken' }] })
  }
  if (!vehicle) throw unknownReference('vehicleId', 'This vehicle')
  const id = uuidv7(ctx.now.getTime())
  const record = { number: body.number, vehicleId: vehicle.id, complaint: body.complaint ?? null, odometer: body.odometer ?? null, bay: body.bay ?? null }
  await appendToLog(ctx, { kind: 'repair_orders.create', subject: id, content: record })
  return RepairOrder.create({ id, shopId: ctx.shop.id, ...record, openedAt: ctx.now, openedBy: ctx.actor.id }, { transaction: ctx.tx })
}

/** Locks an order for a change of it or of what it lists. @throws Refusal 404 */
export async function lockOrder(ctx: Context, id: string): Promise<{ order: RepairOrder, released: boolean }> {
  const order = await RepairOrder.findOne({ where: { shopId: ctx.shop.id, id }, lock: ctx.tx.LOCK.UPDATE, transaction: ctx.tx })
  if (!order) throw notFound('This repair order')
  const released = await Release.count({ where: { shopId: ctx.shop.id, repairOrderId: id }, transaction: ctx.tx }) > 0
  return { order, released }
}

/** Changes complaint, odometer or bay of an order that is not released. */
export async function updateOrder(ctx: Context, id: string, body: UpdateRepairOrderBody): Promise<void> {
  const { order, released } = await lockOrder(ctx, id)
  if (released) throw conflict('already_released', 'This repair order is released. Nothing was changed.')
  const before = { complaint: order.complaint, odometer: order.odometer, bay: order.bay }
  await order.update(body, { transaction: ctx.tx })
  await appendToLog(ctx, { kind: 'repair_orders.update', subject: id, content: { before, after: body } })
}

const holdWords: Record<string, string> = {
  disturbed: 'was opened again after signing', open: 'is not tightened', in_progress: 'is only partly signed',
  exception: 'has an exception to decide', pending_approval: 'waits for its spec to be approved',
  second_check_waiting: 'waits for a second check',
}

/**
 * Releases the vehicle when every joint is signed, checked or decided.
 * @throws Refusal 404, 403 `same_person`, 409 `already_released`, 422 `held` naming each group that holds it back
 */
export async function releaseOrder(ctx: Context, id: string, pin: string): Promise<void> {
  const { order, released } = await lockOrder(ctx, id)
  // No joint may change between the look at it and the release.
  await FastenerGroup.findAll({
    where: { shopId: ctx.shop.id, repairOrderId: id }, order: ['id'], lock: ctx.tx.LOCK.UPDATE, transaction: ctx.tx,
  })
  const groups = (await factsOfOrders(ctx, [id])).map(facts => ({ facts, derived: deriveGroup(facts) }))
  const signerIds = [...new Set(groups.flatMap(({ derived }) => derived.standing.map(signOff => signOff.technicianId)))]
  authorize(ctx.actor, mayRelease, { signerIds, releaseOwnJoint: ctx.shop.rules.releaseOwnJoint })
  await requirePin(ctx, pin)
  if (released) throw conflict('already_released', 'This repair order is already released.')
  const holding = groups.filter(({ derived }) => !isReleasable(derived.state))
  if (holding.length > 0) {
    const issues = holding.map(({ facts, derived }) => ({
      path: `fastenerGroups.${facts.id}`, message: `${facts.name} ${holdWords[derived.state]}.`, code: derived.state,
    }))
    throw refused('held', issues.map(issue => issue.message).join(' '), undefined, { issues })
  }
  const ownJoint = signerIds.includes(ctx.actor.id)
  const { sequence } = await appendToLog(ctx, {
    kind: 'repair_orders.release',
    subject: id,
    content: { number: order.number, ownJoint, groups: groups.map(({ facts, derived }) => ({ id: facts.id, name: facts.name, state: derived.state })) },
  })
  await Release.create({
    id: uuidv7(ctx.now.getTime()), shopId: ctx.shop.id, repairOrderId: id, at: ctx.now, byUser: ctx.actor.id, ownJoint, logSequence: sequence,
  }, { transaction: ctx.tx })
}
