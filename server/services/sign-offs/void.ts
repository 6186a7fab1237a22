import { uuidv7 } from '#shared/ids/uuid'
import type { Context } from '../../context'
import { SignOff } from '../../db/models/sign-off'
import { SignOffVoid } from '../../db/models/sign-off-void'
import { conflict, notFound } from '../../refusal'
import { lockGroup } from '../fastener-groups/load'
import { appendToLog } from '../log/append'
import { requirePin } from '../people/pin'

/**
 * Voids a sign-off with a reason: it is kept, and its positions are open again.
 * @throws Refusal 404, 403 for the PIN, 409 `superseded` when it does not stand, `already_released`
 */
export async function voidSignOff(ctx: Context, id: string, { reason, pin }: { reason: string, pin: string }): Promise<void> {
  const signOff = await SignOff.findOne({ where: { shopId: ctx.shop.id, id }, transaction: ctx.tx })
  if (!signOff) throw notFound('This sign-off')
  await requirePin(ctx, pin)
  const loaded = await lockGroup(ctx, signOff.fastenerGroupId)
  const where = { shopId: ctx.shop.id }
  const gone = await SignOffVoid.count({ where: { ...where, signOffId: id }, transaction: ctx.tx })
    + await SignOff.count({ where: { ...where, supersedesId: id }, transaction: ctx.tx })
  if (gone > 0) throw conflict('superseded', 'This sign-off does not stand any more: it was corrected or voided.')
  if (loaded?.released) throw conflict('already_released', 'This repair order is released. Nothing was changed.')
  const { sequence } = await appendToLog(ctx, { kind: 'sign_offs.void', subject: id, content: { reason, fastenerGroupId: signOff.fastenerGroupId } })
  await SignOffVoid.create({
    id: uuidv7(ctx.now.getTime()), shopId: ctx.shop.id, signOffId: id, reason, at: ctx.now, byUser: ctx.actor.id, logSequence: sequence,
  }, { transaction: ctx.tx })
}
