import { uuidv7 } from '#shared/ids/uuid'
import type { SecondCheckAnswer, SecondCheckWaiting } from '#shared/schemas/sign-offs'
import type { WrenchAnswer } from '#shared/schemas/wrenches'

/** Signed joints that wait for somebody else's eye, oldest first unless the address says otherwise. */
export function useSecondChecks() {
  const state = useQueryState(['sort'] as const)
  const { value } = state
  const list = useRead<{ items: SecondCheckWaiting[], nextCursor: string | null }>('second-checks', '/second-checks', () => ({
    state: 'waiting', sort: value('sort') || 'signedAt', cursor: value('cursor'),
  }))
  return { ...state, list }
}

/**
 * One of them, by its sign-off, with the wrenches for it, fit ones first. `waiting` is null when it does not wait any
 * longer.
 */
export function useSecondCheck(signOffId: string) {
  const $api = useApi()
  const { data, status, error, refresh } = useAsyncData(`second-check:${signOffId}`, async () => {
    const { items } = await $api<{ items: SecondCheckWaiting[] }>('/second-checks', { query: { state: 'waiting', limit: 200 } })
    const waiting = items.find(item => item.signOff.id === signOffId) ?? null
    if (!waiting?.can.check) return { waiting, wrenches: [] }
    const crib = await $api<{ items: WrenchAnswer[] }>('/wrenches', { query: { fitFor: waiting.fastenerGroup.id, limit: 200 } })
    return { waiting, wrenches: crib.items.toSorted((a, b) => Number(b.fit ?? false) - Number(a.fit ?? false)) }
  })
  return {
    waiting: computed(() => data.value?.waiting ?? null),
    wrenches: computed(() => data.value?.wrenches ?? []),
    status,
    error: computed(() => error.value ? toApiError(error.value) : null),
    refresh,
  }
}

/** Signing a second check: exactly once, also when the answer gets lost and it is sent again. */
export function useSecondCheckActions() {
  const $api = useApi()
  const { add } = useToasts()
  const id = uuidv7()
  let sentAt: string | null = null

  /** @throws ApiError 400, 403 `same_person` `wrong_pin` `pin_locked`, 409 `superseded` `already_decided`, 422 */
  async function sign(entry: SecondCheckEntry, { signOffId, positions }: { signOffId: string, positions: readonly number[] }, pin: string) {
    const at = sentAt ?? new Date().toISOString()
    const body = readSecondCheck(entry, { signOffId, positions, at })
    try {
      sentAt = at
      const answer = await $api<SecondCheckAnswer>(`/second-checks/${id}`, { method: 'PUT', body: { ...body, pin } })
      add(answer.verdict === 'low' ? 'Recorded. A bolt turned: the joint still waits.' : 'Second check signed.')
      return answer
    } catch (thrown) {
      // Refused is not recorded: the next try is a check of its own. Unanswered may be recorded: it is sent unchanged.
      if (toApiError(thrown).status > 0) sentAt = null
      throw thrown
    }
  }

  return { sign }
}
