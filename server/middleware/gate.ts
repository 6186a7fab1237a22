import { defineEventHandler, getRequestHeader, getRequestHost, setResponseHeader } from 'h3'
import { uuidv7 } from '#shared/ids/uuid'
import { Refusal } from '../refusal'
import { readSession } from '../services/people/sessions'
import { answerRefusal, toRefusal } from '../utils/answer'
import { sessionIdOf } from '../utils/session'

/** The only addresses under /api that need no session. */
const open = new Set(['/api/health', '/api/auth/sign-in', '/api/auth/sign-out', '/api/openapi.json'])

/** Every request: an id, the person behind the session, and no entry under /api without one. */
export default defineEventHandler(async (event) => {
  const requestId = uuidv7()
  event.context.requestId = requestId
  setResponseHeader(event, 'X-Request-Id', requestId)
  const path = event.path.split('?')[0] ?? ''
  const isApi = path.startsWith('/api/')
  if (!isApi) return
  setResponseHeader(event, 'Cache-Control', 'no-store')
  try {
    const sessionId = await sessionIdOf(event)
    const session = sessionId ? await readSession(sessionId, new Date()) : null
    if (session) {
      event.context.actor = session.actor
      event.context.shop = session.shop
    } else if (!open.has(path)) {
      throw new Refusal(401, 'signed_out', 'Sign in first.')
    }
    if (event.method !== 'GET' && event.method !== 'HEAD') refuseForeignOrigin(event)
  } catch (error) {
    return answerRefusal(event, toRefusal(error, { requestId, path }))
  }
})

/** A browser names the page a request comes from; another site's page may change nothing here. */
function refuseForeignOrigin(event: Parameters<typeof getRequestHost>[0]): void {
  const origin = getRequestHeader(event, 'origin')
  if (origin === undefined) return
  const host = URL.canParse(origin) ? new URL(origin).host : null
  if (host !== getRequestHost(event)) throw new Refusal(403, 'foreign_origin', 'This came from another site\'s page.')
}
