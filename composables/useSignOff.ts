import type { SignOffDetail } from '#shared/schemas/sign-offs'

/** One sign-off with everything that was true when it was signed. */
export const useSignOff = (id: string) => useRead<SignOffDetail>(`sign-off:${id}`, `/sign-offs/${id}`)

/** What can still be done about it. Signed is signed: a void stands beside it, nothing is taken away. */
export function useSignOffActions(id: string) {
  const $api = useApi()
  const { add } = useToasts()

  /** Opens the joint again. @throws ApiError 403 `wrong_pin`, `pin_locked`; 409 `already_released`, `superseded` */
  async function voidIt(reason: string, pin: string) {
    await $api(`/sign-offs/${id}/void`, { method: 'POST', body: { reason, pin } })
    await refreshNuxtData(`sign-off:${id}`)
    add('Voided. The joint is open again.')
  }

  return { voidIt }
}
