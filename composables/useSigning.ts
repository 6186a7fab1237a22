import { uuidv7 } from '#shared/ids/uuid'
import type { SignOffAnswer } from '#shared/schemas/sign-offs'

/** Somebody else was quicker, or the joint moved on: the screen has to show it as it is now. */
const movedOn = ['already_signed', 'already_released', 'superseded', 'spec_withdrawn', 'id_taken']

/** Signing what was entered, exactly once. Nothing typed is lost by a refusal or by silence. */
export function useSigning(groupId: string, entry: SignOffEntry, heard: {
  recorded: (answer: SignOffAnswer) => void
  /** A refusal that is not about the PIN. */
  refused: (message: string) => void
  /** The joint is not as it was shown. */
  changed: () => void
}) {
  const $api = useApi()
  const { timeZone } = useSessionStore()

  function refused(error: ApiError) {
    // A clear refusal recorded nothing; silence and a failure of the server leave it open.
    if (error.status >= 400 && error.status < 500) entry.patch({ sent: null })
    if (movedOn.includes(error.code)) heard.changed()
    if (error.code === 'wrong_pin' || error.code === 'pin_locked') throw error
    if (error.code === 'id_taken') {
      entry.patch({ id: uuidv7() })
      return 'Your first try had reached the server after all and is signed. What you changed since is kept here: correct the sign-off below if it matters.'
    }
    return error.message
  }

  const { run, busy, refusal, reset } = useAct(async (pin: string) => {
    const { body, sent } = bodyOf(entry.draft, entry.progress, { groupId, timeZone, now: new Date() })
    const request = requestOf(entry.draft, body, pin)
    entry.patch({ sent })
    try {
      const answer = await $api<SignOffAnswer>(request.path, request)
      entry.clear()
      heard.recorded(answer)
    } catch (thrown) {
      heard.refused(refused(toApiError(thrown)))
    }
  })

  return { sign: run, busy, pinError: computed(() => refusal.value?.message ?? null), reset }
}
