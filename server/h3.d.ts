import type { H3Event } from 'h3'
import type { Actor, Shop } from './context'

declare module 'h3' {
  interface H3EventContext {
    requestId: string
    /** Whoever is signed in; the gate sets it. */
    actor?: Actor
    shop?: Shop
  }
}

declare module '#auth-utils' {
  interface UserSession {
    sessionId?: string
  }
}

// Nitro's own auto-imports are not those of the pages, which one type check covers with the server.
declare module '#imports' {
  export function getUserSession(event: H3Event): Promise<{ sessionId?: string }>
  export function setUserSession(event: H3Event, data: { sessionId: string }): Promise<unknown>
  export function clearUserSession(event: H3Event): Promise<unknown>
}

export {}
