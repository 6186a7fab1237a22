import { uuidv7 } from '#shared/ids/uuid'
import type { CreateSpecBody, SpecRevisionBody } from '#shared/schemas/torque-specs'
import type { Context } from '../../context'
import { TorqueSpec } from '../../db/models/torque-spec'
import { TorqueSpecRevision } from '../../db/models/torque-spec-revision'
import { authorize } from '../../policies/policy'
import * as policies from '../../policies/torque-specs'
import { conflict, notFound, refused } from '../../refusal'
import { appendToLog } from '../log/append'
import { printedValues, refuseSpecIssues, revisionValues } from './values'

/** A spec as it is drafted; a shop value stands where none is published, with the reasoning behind it. */
export type NewSpec = CreateSpecBody & { shopValue?: boolean, reasoning?: string }

export interface SpecWithRevision {
  spec: TorqueSpec
  revision: TorqueSpecRevision
}

const undecided = { approvedBy: null, approvedAt: null, withdrawnBy: null, withdrawnAt: null, withdrawnReason: null }

function refuseSafetyShopValue(shopValue: boolean, { jointClass }: Pick<SpecRevisionBody, 'jointClass'>): void {
  if (shopValue && jointClass === 'safety') {
    const message = 'A safety joint needs a published spec: no shop value may stand in for it.'
    throw refused('safety_joint', message, 'jointClass')
  }
}

/** What a new spec comes to, before anything is written. @throws Refusal 400, 422 `safety_joint` */
export function draftOf(ctx: Pick<Context, 'shop' | 'actor' | 'now'>, input: NewSpec, importKey: string | null = null) {
  const { kind, component, application, appliesTo, shopValue = false, reasoning, ...body } = input
  refuseSpecIssues(input)
  refuseSafetyShopValue(shopValue, body)
  const identity = { kind, component, application, appliesTo: appliesTo ?? null }
  const values = revisionValues(body, kind, ctx.shop.rules.defaultTolerancePercent)
  const said = { ...values, shopValue, reasoning: reasoning ?? null }
  const id = uuidv7(ctx.now.getTime())
  const revisionId = uuidv7(ctx.now.getTime())
  return {
    content: { ...identity, revision: { id: revisionId, number: 1, ...said } },
    spec: { id, shopId: ctx.shop.id, ...identity, importKey, createdAt: ctx.now },
    revision: {
      id: revisionId, shopId: ctx.shop.id, specId: id, number: 1, status: 'draft' as const, ...said,
      createdBy: ctx.actor.id, createdAt: ctx.now, ...undecided,
    },
  }
}

/** Drafts a spec, whoever makes it: approving is a step of its own. @throws Refusal 400, 422 `safety_joint` */
export async function createSpec(ctx: Context, input: NewSpec): Promise<SpecWithRevision> {
  authorize(ctx.actor, policies.createSpec, undefined)
  const draft = draftOf(ctx, input)
  await appendToLog(ctx, { kind: 'torque_specs.create', subject: draft.spec.id, content: draft.content })
  const spec = await TorqueSpec.create(draft.spec, { transaction: ctx.tx })
  const revision = await TorqueSpecRevision.create(draft.revision, { transaction: ctx.tx })
  return { spec, revision }
}

/** Locks a spec, so that its revisions are decided one after another; newest revision first. @throws Refusal 404 */
async function lockSpec(ctx: Context, id: string): Promise<{ spec: TorqueSpec, revisions: TorqueSpecRevision[] }> {
  const spec = await TorqueSpec.findOne({
    where: { shopId: ctx.shop.id, id }, lock: ctx.tx.LOCK.UPDATE, transaction: ctx.tx,
  })
  if (!spec) throw notFound('This torque spec')
  const revisions = await TorqueSpecRevision.findAll({
    where: { shopId: ctx.shop.id, specId: id }, order: [['number', 'DESC']], transaction: ctx.tx,
  })
  return { spec, revisions }
}

/** Drafts a new revision. What was approved stays approved, and means what it meant. @throws as createSpec, 404 */
export async function reviseSpec(ctx: Context, id: string, body: SpecRevisionBody): Promise<SpecWithRevision> {
  const { spec, revisions: [newest] } = await lockSpec(ctx, id)
  if (!newest) throw new Error('A spec without a revision.')
  authorize(ctx.actor, policies.reviseSpec, undefined)
  refuseSpecIssues(body)
  // A shop value becomes a spec like any other once a published source is found.
  const shopValue = newest.shopValue && body.source.title === newest.sourceTitle
  refuseSafetyShopValue(shopValue, body)
  const said = {
    ...revisionValues(body, spec.kind, ctx.shop.rules.defaultTolerancePercent),
    shopValue, reasoning: shopValue ? newest.reasoning : null,
  }
  const revisionId = uuidv7(ctx.now.getTime())
  const number = newest.number + 1
  const content = { revision: { id: revisionId, number, ...said } }
  await appendToLog(ctx, { kind: 'torque_specs.revise', subject: id, content })
  const revision = await TorqueSpecRevision.create({
    id: revisionId, shopId: ctx.shop.id, specId: id, number, status: 'draft', ...said,
    createdBy: ctx.actor.id, createdAt: ctx.now, ...undecided,
  }, { transaction: ctx.tx })
  return { spec, revision }
}

/**
 * Makes the newest draft usable. A draft whose two printed units disagree needs a person to say which one governs.
 * @throws Refusal 404, 403 `same_person`, 409 `already_decided`, 422 `dual_unit_mismatch`, 422 `governs`
 */
export async function approveSpec(
  ctx: Context, id: string, { governs }: { governs?: 'target' | 'printed' | undefined } = {},
): Promise<SpecWithRevision> {
  const { spec, revisions: [draft] } = await lockSpec(ctx, id)
  // An older draft is overtaken by whatever came after it.
  if (draft?.status !== 'draft') {
    throw conflict('already_decided', 'There is no draft to approve: somebody has decided it already.')
  }
  const { approveOwnDraft } = ctx.shop.rules
  authorize(ctx.actor, policies.approveSpec, { createdBy: draft.createdBy, approveOwnDraft })
  if (draft.flags.length > 0 && !governs) {
    const message = `${draft.flags.map(flag => flag.message).join(' ')} Say which one governs.`
    throw refused('dual_unit_mismatch', message, 'governs')
  }
  const values = governs === 'printed' ? printedValues(draft, ctx.shop.rules.defaultTolerancePercent) : {}
  const revision = await draft.update({
    ...values, governs: governs ?? null, status: 'approved', approvedBy: ctx.actor.id, approvedAt: ctx.now,
  }, { transaction: ctx.tx })
  const { number, flags, stages, targetNm, lowerNm, upperNm } = revision
  await appendToLog(ctx, {
    kind: 'torque_specs.approve',
    subject: id,
    content: {
      revision: { id: revision.id, number, governs: revision.governs, flags, stages },
      limits: { targetNm, lowerNm, upperNm },
    },
  })
  return { spec, revision }
}

/**
 * Takes the newest approved revision out of use; what was signed by it stays signed.
 * @throws Refusal 404, 409 `already_decided`
 */
export async function withdrawSpec(ctx: Context, id: string, reason: string): Promise<SpecWithRevision> {
  const { spec, revisions } = await lockSpec(ctx, id)
  authorize(ctx.actor, policies.withdrawSpec, undefined)
  const approved = revisions.find(revision => revision.status === 'approved')
  if (!approved) throw conflict('already_decided', 'No approved revision is left to withdraw.')
  const revision = await approved.update({
    status: 'withdrawn', withdrawnBy: ctx.actor.id, withdrawnAt: ctx.now, withdrawnReason: reason,
  }, { transaction: ctx.tx })
  await appendToLog(ctx, {
    kind: 'torque_specs.withdraw', subject: id, content: { revision: { id: revision.id, number: revision.number }, reason },
  })
  return { spec, revision }
}
