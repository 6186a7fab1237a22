import type { SpecAnswer, SpecDetail, SpecRevisionAnswer } from '#shared/schemas/torque-specs'
import { stagesOf } from '#shared/torque/stages'
import { toNm, type Quantity } from '#shared/torque/units'
import type { ReadContext } from '../context'
import type { TorqueSpecRevision } from '../db/models/torque-spec-revision'
import { decide, roleMay } from '../policies/policy'
import * as policies from '../policies/torque-specs'
import type { SpecRecord } from '../services/torque-specs/queries'
import { printedOf, targetOf } from '../services/torque-specs/values'

const withNm = (quantity: Quantity | undefined) => quantity ? { ...quantity, nm: toNm(quantity) } : null

/** A revision as printed, and what it comes to in N·m. Needs `createdByUser` and `approvedByUser` loaded. */
export function presentRevision(revision: TorqueSpecRevision): SpecRevisionAnswer {
  const { createdByUser, approvedByUser, approvedBy } = revision
  if (!createdByUser || (approvedBy !== null && !approvedByUser)) throw new Error('A revision without its people.')
  const limits = { targetNm: revision.targetNm, lowerNm: revision.lowerNm, upperNm: revision.upperNm }
  return {
    id: revision.id,
    number: revision.number,
    status: revision.status,
    jointClass: revision.jointClass,
    boltCount: revision.boltCount,
    pattern: revision.pattern,
    places: revision.places,
    thread: revision.thread,
    leftHand: revision.leftHand,
    propertyClass: revision.propertyClass,
    threadCondition: revision.threadCondition,
    runningTorque: revision.runningTorque,
    preparation: revision.preparation,
    target: withNm(targetOf(revision)),
    printed: withNm(printedOf(revision)),
    printedLimits: revision.printedLimits,
    tolerance: revision.tolerance,
    stages: stagesOf(limits, revision.stages, revision.tolerance),
    order: revision.printedOrder,
    secondCheckRequired: revision.secondCheckRequired,
    oneTimeUse: revision.oneTimeUse,
    retorque: revision.retorque,
    caution: revision.caution,
    source: {
      title: revision.sourceTitle,
      section: revision.sourceSection,
      page: revision.sourcePage,
      date: revision.sourceDate,
    },
    limits,
    flags: revision.flags,
    governs: revision.governs,
    shopValue: revision.shopValue,
    reasoning: revision.reasoning,
    createdBy: { id: createdByUser.id, name: createdByUser.name },
    createdAt: revision.createdAt.toISOString(),
    approvedBy: approvedByUser ? { id: approvedByUser.id, name: approvedByUser.name } : null,
    approvedAt: revision.approvedAt?.toISOString() ?? null,
    withdrawnReason: revision.withdrawnReason,
  }
}

function mayDo({ actor, shop }: ReadContext, revisions: readonly TorqueSpecRevision[]): Record<string, boolean> {
  const [newest] = revisions
  const { approveOwnDraft } = shop.rules
  const isApproved = revisions.some(revision => revision.status === 'approved')
  return {
    revise: roleMay(actor.role, policies.reviseSpec).allowed,
    approve: newest?.status === 'draft'
      && decide(actor, policies.approveSpec, { createdBy: newest.createdBy, approveOwnDraft }).allowed,
    withdraw: isApproved && roleMay(actor.role, policies.withdrawSpec).allowed,
  }
}

/** A spec with one revision: the newest approved, else the newest of all, unless another is named by its id. */
export function presentSpec(ctx: ReadContext, { spec, revisions }: SpecRecord, revisionId?: string): SpecAnswer {
  const isShown = (item: TorqueSpecRevision) => revisionId === undefined ? item.status === 'approved' : item.id === revisionId
  const revision = revisions.find(isShown) ?? revisions[0]
  if (!revision) throw new Error('A spec without a revision.')
  return {
    id: spec.id,
    kind: spec.kind,
    component: spec.component,
    application: spec.application,
    appliesTo: spec.appliesTo,
    createdAt: spec.createdAt.toISOString(),
    revision: presentRevision(revision),
    can: mayDo(ctx, revisions),
  }
}

/** A spec with every revision, newest first. */
export const presentSpecDetail = (ctx: ReadContext, record: SpecRecord): SpecDetail =>
  ({ ...presentSpec(ctx, record), revisions: record.revisions.map(presentRevision) })
