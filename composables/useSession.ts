import type { Me, SignInBody } from '#shared/schemas/auth'

/** Signing in and out, and reading again who is signed in. */
export function useSession() {
  const $api = useApi()
  const session = useSessionStore()

  /** Reads person, shop and rules again; nobody signed in is an answer, not an error. @throws ApiError */
  async function load() {
    try {
      session.setMe(await $api<Me>('/auth/me'))
    } catch (thrown) {
      if (toApiError(thrown).code !== 'signed_out') throw thrown
      session.clear()
    }
  }

  /** @throws ApiError 401 `bad_credentials`, 429 `too_many` */
  async function signIn(body: SignInBody) {
    await $api('/auth/sign-in', { method: 'POST', body })
    await load()
  }

  /** Ends the session and loads the sign-in page afresh: nothing the person saw stays in memory. @throws ApiError */
  async function signOut() {
    await $api('/auth/sign-out', { method: 'POST' })
    await navigateTo('/sign-in', { external: true })
  }

  return { load, signIn, signOut }
}
