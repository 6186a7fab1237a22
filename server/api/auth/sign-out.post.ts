import { defineEventHandler } from 'h3'
import { signOut } from '../../contract/people'
import { endSession } from '../../services/people/sessions'
import { defineRoute } from '../../utils/defineRoute'
import { dropSession } from '../../utils/session'

export default defineEventHandler(event => defineRoute(signOut, async (ctx) => {
  const sessionId = event.context.actor?.sessionId
  if (sessionId) await endSession(sessionId, ctx.now)
  await dropSession(event)
  return { done: true as const }
})(event))
