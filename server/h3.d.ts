import type { Actor, Shop } from './context'

declare module 'h3' {
  interface H3EventContext {
    requestId: string
    /** Whoever is signed in; the gate sets it. */
    actor?: Actor
    shop?: Shop
    /** Set on a page's response: the one nonce its inline scripts carry. */
    nonce?: string
  }
}

declare module '#auth-utils' {
  interface UserSession {
    sessionId?: string
  }
}

export {}
