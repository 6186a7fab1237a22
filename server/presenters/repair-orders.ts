import type { GroupBrief, RepairOrderAnswer, RepairOrderListItem } from '#shared/schemas/repair-orders'
import type { ReadContext } from '../context'
import * as orders from '../policies/repair-orders'
import { canDo, roleMay } from '../policies/policy'
import { isReleasable } from '../services/fastener-groups/state'
import type { OrderView } from '../services/repair-orders/queries'

function presentGroup({ facts, derived }: OrderView['groups'][number]): GroupBrief {
  return {
    id: facts.id,
    name: facts.name,
    state: derived.state,
    component: facts.component,
    jointClass: facts.jointClass,
    boltCount: facts.boltCount,
    positionsDone: derived.positionsDone,
    limits: { targetNm: facts.targetNm, lowerNm: facts.lowerNm, upperNm: facts.upperNm },
    target: facts.targetValue !== null && facts.targetUnit !== null ? { value: facts.targetValue, unit: facts.targetUnit } : null,
    shopValue: facts.shopValue,
    secondCheckRequired: facts.secondCheckRequired,
    verdict: derived.verdict,
    exceptions: derived.exceptions,
  }
}

function presentCommon(ctx: ReadContext, { row, groups }: OrderView) {
  const holding = groups.filter(({ derived }) => !isReleasable(derived.state))
  const signerIds = groups.flatMap(({ derived }) => derived.standing.map(signOff => signOff.technicianId))
  const open = row.release === null
  return {
    id: row.id,
    number: row.number,
    vehicle: row.vehicle,
    complaint: row.complaint,
    odometer: row.odometer,
    bay: row.bay,
    openedAt: row.openedAt.toISOString(),
    openedBy: row.openedBy,
    holds: holding.map(({ facts, derived }) => ({ fastenerGroupId: facts.id, code: derived.state })),
    release: row.release ? { ...row.release, at: new Date(row.release.at).toISOString() } : null,
    can: {
      update: open && roleMay(ctx.actor.role, orders.updateOrder).allowed,
      addGroup: open && roleMay(ctx.actor.role, orders.addGroup).allowed,
      release: open && canDo(ctx.actor, { signerIds, releaseOwnJoint: ctx.shop.rules.releaseOwnJoint }, { release: orders.releaseOrder }).release === true,
    },
  }
}

/** A repair order with its groups. */
export const presentOrder = (ctx: ReadContext, view: OrderView): RepairOrderAnswer =>
  ({ ...presentCommon(ctx, view), fastenerGroups: view.groups.map(presentGroup) })

/** A repair order as a line of the list. */
export const presentOrderLine = (ctx: ReadContext, view: OrderView): RepairOrderListItem => ({
  ...presentCommon(ctx, view),
  groupCount: view.groups.length,
  groupsDone: view.groups.filter(({ derived }) => isReleasable(derived.state)).length,
  groupStates: view.groups.map(({ derived }) => derived.state),
})
