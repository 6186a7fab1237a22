import { type H3Event, getCookie } from 'h3'
import { clearUserSession, getUserSession, setUserSession } from '#imports'

const COOKIE = 'jamnut'
const KEPT = 2000
// Unsealing is the costliest step of a request; what a cookie string holds never changes.
const unsealed = new Map<string, string>()

/** The session id in the request's sealed cookie, or null; asks for none where there is none. */
export async function sessionIdOf(event: H3Event): Promise<string | null> {
  const cookie = getCookie(event, COOKIE)
  if (!cookie) return null
  const known = unsealed.get(cookie)
  if (known) return known
  const { sessionId } = await getUserSession(event)
  if (!sessionId) return null
  if (unsealed.size >= KEPT) unsealed.delete(unsealed.keys().next().value ?? '')
  unsealed.set(cookie, sessionId)
  return sessionId
}

/** Seals a session id into the cookie. */
export async function keepSession(event: H3Event, sessionId: string): Promise<void> {
  await setUserSession(event, { sessionId })
}

/** Takes the cookie away. */
export async function dropSession(event: H3Event): Promise<void> {
  await clearUserSession(event)
}
