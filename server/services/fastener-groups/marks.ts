import { uuidv7 } from '#shared/ids/uuid'
import type { Context } from '../../context'
import { Concession } from '../../db/models/concession'
import { Disturbance } from '../../db/models/disturbance'
import { NotDisturbedMark } from '../../db/models/not-disturbed-mark'
import { authorize } from '../../policies/policy'
import { concedeGroup as mayConcede, disturbGroup as mayDisturb, markNotDisturbed as mayMark } from '../../policies/sign-offs'
import { conflict, notFound, refused } from '../../refusal'
import { appendToLog } from '../log/append'
import { requirePin } from '../people/pin'
import { factsOfGroup } from './facts'
import { lockGroup } from './load'
import { deriveGroup, standingSignOffs } from './state'

async function lockWithFacts(ctx: Context, id: string) {
  const loaded = await lockGroup(ctx, id)
  const facts = loaded ? await factsOfGroup(ctx, id) : undefined
  if (!loaded || !facts) throw notFound('This fastener group')
  const signerIds = [...new Set(standingSignOffs(facts).map(signOff => signOff.technicianId))]
  return { loaded, facts, signerIds, derived: deriveGroup(facts) }
}

const row = (ctx: Context, fastenerGroupId: string, reason: string, logSequence: number) => ({
  id: uuidv7(ctx.now.getTime()), shopId: ctx.shop.id, fastenerGroupId, reason, at: ctx.now, byUser: ctx.actor.id, logSequence,
})

function refuseReleased(released: boolean): void {
  if (released) throw conflict('already_released', 'This repair order is released. Nothing was changed.')
}

/** A signed joint was opened again: what was signed stays true of then, and has to be signed anew. */
export async function disturb(ctx: Context, id: string, reason: string): Promise<void> {
  const { loaded, derived } = await lockWithFacts(ctx, id)
  authorize(ctx.actor, mayDisturb, undefined)
  refuseReleased(loaded.released)
  if (derived.standing.length === 0) throw refused('nothing_signed', 'Nothing of this joint is signed, so there is nothing to open again.')
  const { sequence } = await appendToLog(ctx, { kind: 'fastener_groups.disturb', subject: id, content: { reason } })
  await Disturbance.create(row(ctx, id, reason, sequence), { transaction: ctx.tx })
}

/** The foreman accepts a joint with its exceptions. Never his own, never a safety joint. */
export async function concede(ctx: Context, id: string, { reason, pin }: { reason: string, pin: string }): Promise<void> {
  const { loaded, facts, derived, signerIds } = await lockWithFacts(ctx, id)
  authorize(ctx.actor, mayConcede, { signerIds })
  await requirePin(ctx, pin)
  refuseReleased(loaded.released)
  if (derived.state === 'conceded') throw conflict('already_decided', 'This joint is already accepted.')
  if (facts.jointClass === 'safety') throw refused('safety_joint', 'A safety joint cannot be accepted as it is: it has to be right.')
  if (derived.exceptions.length === 0) throw refused('nothing_to_concede', 'This joint has no exception to accept.')
  const { sequence } = await appendToLog(ctx, {
    kind: 'fastener_groups.concede', subject: id, content: { reason, exceptions: derived.exceptions, signOffIds: derived.standing.map(signOff => signOff.id) },
  })
  await Concession.create(row(ctx, id, reason, sequence), { transaction: ctx.tx })
}

/** A listed joint that was not opened in this repair. */
export async function markNotDisturbed(ctx: Context, id: string, { reason, pin }: { reason: string, pin: string }): Promise<void> {
  const { loaded, facts, signerIds } = await lockWithFacts(ctx, id)
  authorize(ctx.actor, mayMark, { signerIds })
  await requirePin(ctx, pin)
  refuseReleased(loaded.released)
  if (facts.notDisturbed) throw conflict('already_decided', 'This joint is already marked as not disturbed.')
  if (facts.signOffs.length > 0) throw conflict('already_signed', 'This joint has been tightened and signed: it was disturbed.')
  if (facts.jointClass === 'safety') throw refused('safety_joint', 'A safety joint on the order is tightened and signed, or taken off by a new order.')
  const { sequence } = await appendToLog(ctx, { kind: 'fastener_groups.mark_not_disturbed', subject: id, content: { reason } })
  await NotDisturbedMark.create(row(ctx, id, reason, sequence), { transaction: ctx.tx })
}
