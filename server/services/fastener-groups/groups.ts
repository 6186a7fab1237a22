import { uuidv7 } from '#shared/ids/uuid'
import type { CreateGroupBody } from '#shared/schemas/repair-orders'
import { defaultPattern, orderFor } from '#shared/torque/order'
import type { Context } from '../../context'
import { FastenerGroup } from '../../db/models/fastener-group'
import { FastenerPosition } from '../../db/models/fastener-position'
import type { TorqueSpec } from '../../db/models/torque-spec'
import { TorqueSpecRevision } from '../../db/models/torque-spec-revision'
import { conflict, refused, unknownReference } from '../../refusal'
import { appendToLog } from '../log/append'
import { lockOrder } from '../repair-orders/orders'
import { createSpec } from '../torque-specs/specs'

interface Chosen {
  spec: TorqueSpec
  revision: TorqueSpecRevision
}

/**
 * Puts a joint on an order: by a spec's revision, or, where none is published, by a shop value that waits for approval.
 * @returns the group's id
 * @throws Refusal 404, 409 `already_released`, 422 `unknown_reference` `general_table` `spec_withdrawn` `bolt_count` `safety_joint`
 */
export async function addGroup(ctx: Context, repairOrderId: string, body: CreateGroupBody): Promise<string> {
  const { released } = await lockOrder(ctx, repairOrderId)
  if (released) throw conflict('already_released', 'This repair order is released. Nothing was added.')
  const { spec, revision } = 'noPublishedSpec' in body ? await shopValue(ctx, body) : await published(ctx, body.specRevisionId)
  const boltCount = body.boltCount ?? revision.boltCount
  if (!boltCount) throw refused('bolt_count', 'The spec does not say how many bolts there are: count them.', 'boltCount')
  const pattern = patternFor(revision, boltCount)
  const id = uuidv7(ctx.now.getTime())
  const record = {
    repairOrderId,
    specRevisionId: revision.id,
    name: body.name ?? spec.component,
    boltCount,
    pattern,
    tighteningOrder: tighteningOrder(revision, pattern, boltCount),
  }
  await appendToLog(ctx, { kind: 'fastener_groups.create', subject: id, content: record })
  await FastenerGroup.create({ id, shopId: ctx.shop.id, ...record, createdBy: ctx.actor.id, createdAt: ctx.now }, { transaction: ctx.tx })
  await FastenerPosition.bulkCreate(Array.from({ length: boltCount }, (_, index) => {
    const place = revision.places.find(item => item.position === index + 1)
    return {
      groupId: id, shopId: ctx.shop.id, position: index + 1,
      x: place?.x ?? null, y: place?.y ?? null, long: place?.long ?? false, label: place?.label ?? null,
    }
  }), { transaction: ctx.tx })
  return id
}

async function published(ctx: Context, specRevisionId: string): Promise<Chosen> {
  const revision = await TorqueSpecRevision.findOne({
    where: { shopId: ctx.shop.id, id: specRevisionId }, include: ['spec'], transaction: ctx.tx,
  })
  if (!revision?.spec) throw unknownReference('specRevisionId', 'This spec revision')
  if (revision.spec.kind === 'general_table') {
    throw refused('general_table', 'A general table is printed for a size and grade, not for this joint. It can only be the reason behind a shop value.', 'specRevisionId')
  }
  if (revision.status === 'withdrawn') throw refused('spec_withdrawn', 'This revision was withdrawn. Choose the valid one.', 'specRevisionId')
  return { spec: revision.spec, revision }
}

/** A shop value is a draft spec of its own: the same approval, and the same care, as any other. */
function shopValue(ctx: Context, body: Extract<CreateGroupBody, { noPublishedSpec: true }>): Promise<Chosen> {
  const { noPublishedSpec, reasoning, name, ...spec } = body
  return createSpec(ctx, {
    ...spec,
    kind: 'joint',
    jointClass: spec.jointClass ?? 'general',
    application: 'No published spec found',
    source: { title: 'Shop value' },
    shopValue: true,
    reasoning,
  })
}

/** The spec's pattern where it suits the number of bolts counted, else the usual one. */
function patternFor(revision: TorqueSpecRevision, boltCount: number) {
  const { pattern } = revision
  if (pattern === 'two_rows' && boltCount % 2 === 1) return defaultPattern(boltCount)
  if (pattern === 'free' && revision.places.filter(place => place.position <= boltCount).length < boltCount) return defaultPattern(boltCount)
  return pattern ?? defaultPattern(boltCount)
}

/** The printed order where it is for this many bolts: it overrides ours. */
function tighteningOrder(revision: TorqueSpecRevision, pattern: FastenerGroup['pattern'], boltCount: number): number[] {
  return revision.printedOrder?.length === boltCount ? revision.printedOrder : orderFor(pattern, boltCount)
}
