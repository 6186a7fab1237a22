import type { SignOffDetail } from '#shared/schemas/sign-offs'
import { newDraft, type SignOffDraft } from './sign-off-draft'

/** A draft with everything an earlier sign-off says, to be changed and signed in its place. */
export function draftToCorrect(signOff: SignOffDetail, reason: string): SignOffDraft {
  const settings = signOff.wrench.kind === 'setting'
    ? signOff.readings.flatMap(({ stage, value, unit }) => value !== null && unit !== null && unit !== 'deg' ? [[stage, { value, unit }] as const] : [])
    : []
  return {
    ...newDraft(signOff.wrench.id),
    corrects: { id: signOff.id, reason },
    adapter: signOff.adapter,
    multiplierRatio: signOff.multiplierRatio,
    settings: Object.fromEntries(settings),
    prep: Object.fromEntries(signOff.preparation.map(step => [step.code, step.confirmed])),
    prepReason: signOff.prepReason ?? '',
    deviationReason: signOff.deviationReason ?? '',
    acts: signOff.readings.map(({ position, stage, value, unit, verdict }) => ({
      kind: 'entered', positions: [position], stage, value, unit, ...((verdict === 'low' || verdict === 'high') && { kept: true }),
    })),
    note: signOff.note ?? '',
    parts: signOff.parts.map(({ name, partNumber = '', lot = '' }) => ({ name, partNumber, lot })),
  }
}
