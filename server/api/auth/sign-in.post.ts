import { defineEventHandler } from 'h3'
import { signIn as contract } from '../../contract/people'
import { signIn } from '../../services/people/signIn'
import { clientOf } from '../../utils/client'
import { defineRoute } from '../../utils/defineRoute'
import { keepSession } from '../../utils/session'

export default defineEventHandler(event => defineRoute(contract, async (ctx, { body }) => {
  const { user, sessionId } = await signIn(body, clientOf(event), ctx.now)
  await keepSession(event, sessionId)
  return { user }
})(event))
