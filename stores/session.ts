import type { Role } from '#shared/types/roles'

export interface SessionUser {
  id: string
  name: string
  role: Role
}

export interface SessionShop {
  id: string
  name: string
  /** IANA name, such as "Europe/Berlin": dates and times are shown in it. */
  timeZone: string
}

/** Who is signed in, as far as screens need to know; the server decides what they may. */
export const useSessionStore = defineStore('session', () => {
  const user = ref<SessionUser | null>(null)
  const shop = ref<SessionShop | null>(null)

  function setUser(signedIn: SessionUser, at: SessionShop | null = null) {
    user.value = signedIn
    shop.value = at
  }

  function clear() {
    user.value = null
    shop.value = null
  }

  return { user, shop, setUser, clear }
})
