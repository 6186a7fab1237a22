import { createUser } from '../../contract/people'
import { presentChangedUser } from '../../presenters/people'
import { addUser } from '../../services/people/people'
import { defineRoute } from '../../utils/defineRoute'

export default defineRoute(createUser, async (ctx, { body }) => {
  const { user, temporaryPassphrase } = await addUser(ctx, body)
  return { ...presentChangedUser(ctx.actor, user), temporaryPassphrase }
})
