import { uuidv7 } from '#shared/ids/uuid'
import type { SignOffAnswer } from '#shared/schemas/sign-offs'

/** Somebody else was quicker, or the joint moved on: the screen has to show it as it is now. */
const movedOn = ['already_signed', 'already_released', 'superseded', 'spec_withdrawn', 'id_taken']

/** Signing what was entered, exactly once. Nothing typed is lost by a refusal or by silence. */
export function useSigning(groupId: string, entry: SignOffEntry, changed: () => Promise<unknown>) {
  const $api = useApi()
  const { timeZone } = useSessionStore()

  const recorded = shallowRef<SignOffAnswer | null>(null)
  const asking = ref(false)

  async function refused(error: ApiError) {
    // A clear refusal recorded nothing; silence and a failure of the server leave it open.
    if (error.status >= 400 && error.status < 500) entry.patch({ sent: null })
    if (error.code !== 'wrong_pin' && error.code !== 'pin_locked') asking.value = false
    if (movedOn.includes(error.code)) await changed()
    if (error.code !== 'id_taken') return error
    entry.patch({ id: uuidv7() })
    return new ApiError(409, 'Your first try had reached the server after all and is signed. What you changed since is kept here: correct the sign-off below if it matters.', error.data)
  }

  const act = useAct(async (pin: string) => {
    const { body, sent } = bodyOf(entry.draft, entry.progress, { groupId, timeZone, now: new Date() })
    const request = requestOf(entry.draft, body, pin)
    entry.patch({ sent })
    try {
      recorded.value = await $api<SignOffAnswer>(request.path, request)
    } catch (thrown) {
      throw await refused(toApiError(thrown))
    }
    asking.value = false
    entry.clear()
    await changed()
  })

  /** What stands in the PIN dialog; everything else stands beside the buttons. */
  const pinError = computed(() => act.refusal.value?.code === 'wrong_pin' || act.refusal.value?.code === 'pin_locked' ? act.refusal.value.message : null)
  const refusal = computed(() => pinError.value ? null : act.refusal.value?.message ?? null)

  function ask() {
    act.reset()
    recorded.value = null
    asking.value = true
  }

  return { recorded, asking, ask, sign: act.run, busy: act.busy, pinError, refusal }
}
