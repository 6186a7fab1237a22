import type { SignOffDetail } from '#shared/schemas/sign-offs'

/** What may be done about a joint besides tightening it. Each throws ApiError when the server refuses. */
export function useFastenerGroupActions(groupId: string) {
  const $api = useApi()
  const { add } = useToasts()

  const post = (verb: string, body: object, words: string) => async () => {
    await $api(`/fastener-groups/${groupId}/${verb}`, { method: 'POST', body })
    add(words)
  }

  /** A signed joint was opened again: it has to be tightened and signed anew. */
  const disturb = (reason: string) => post('disturbed', { reason }, 'Noted. The joint has to be tightened and signed anew.')()
  /** The foreman accepts an exception. */
  const concede = (reason: string, pin: string) => post('concession', { reason, pin }, 'Accepted as it is, with your reason.')()
  /** A listed joint that was not opened. */
  const markNotDisturbed = (reason: string, pin: string) => post('not-disturbed', { reason, pin }, 'Marked as not disturbed.')()

  /** An own sign-off as a draft that will stand in for it. */
  async function correct(signOffId: string, reason: string) {
    const signOff = await $api<SignOffDetail>(`/sign-offs/${signOffId}`)
    if (!signOff.can.correct) throw new ApiError(403, 'Only who signed it can correct it, as long as it stands and the order is not released.', { code: 'role' })
    return draftToCorrect(signOff, reason)
  }

  return { disturb, concede, markNotDisturbed, correct }
}
