import type { CorrectionBody, SignOffBody } from '#shared/schemas/sign-offs'
import { instantIn } from './shop-time'
import type { SignOffDraft } from './sign-off-draft'
import type { Progress } from './sign-off-progress'

type Unsigned<Body> = Omit<Body, 'pin' | 'deviceSignature'>

/**
 * What is signed, without the PIN. The same content as a try that got no answer keeps its time, so that the server
 * knows it again.
 */
export function bodyOf(draft: SignOffDraft, progress: Progress, { groupId, timeZone, now }: {
  groupId: string
  timeZone: string
  now: Date
}): { body: Unsigned<SignOffBody>, sent: NonNullable<SignOffDraft['sent']> } {
  const said = (text: string) => text.trim() || undefined
  const parts = draft.parts.filter(part => part.name.trim())
    .map(part => ({ name: part.name.trim(), partNumber: said(part.partNumber), lot: said(part.lot) }))
  const content = {
    fastenerGroupId: groupId,
    wrenchId: draft.wrenchId ?? '',
    ...(draft.adapter && { adapter: draft.adapter }),
    ...(draft.multiplierRatio && { multiplierRatio: draft.multiplierRatio }),
    readings: progress.attempts.filter(made => !made.covered).map(({ position, stage, attempt, value, unit }) =>
      ({ position, stage, attempt, ...(value !== null && unit !== null && { value, unit }) })),
    attestedInOrder: draft.acts.some(act => act.kind === 'entered' && act.positions.length > 1),
    prep: Object.fromEntries(Object.entries(draft.prep).filter(([, done]) => done)),
    prepReason: said(draft.prepReason),
    deviationReason: said(draft.deviationReason),
    note: said(draft.note),
    ...(parts.length > 0 && { parts }),
    tightenedAt: draft.tightenedAt ? instantIn(draft.tightenedAt, timeZone) ?? undefined : undefined,
    capturedOffline: false,
  }
  const text = JSON.stringify([content, draft.corrects])
  const signedAt = draft.sent?.content === text ? draft.sent.signedAt : now.toISOString()
  return { body: { ...content, signedAt }, sent: { signedAt, content: text } }
}

/** Where a draft is sent: a sign-off under its own id, or a correction of the one it stands in for. */
export function requestOf(draft: SignOffDraft, body: Unsigned<SignOffBody>, pin: string): {
  path: string
  method: 'PUT' | 'POST'
  body: SignOffBody | CorrectionBody
} {
  if (!draft.corrects) return { path: `/sign-offs/${draft.id}`, method: 'PUT', body: { ...body, pin } }
  const { id, reason } = draft.corrects
  return { path: `/sign-offs/${id}/corrections`, method: 'POST', body: { ...body, id: draft.id, reason, pin } }
}
