import { updateUser } from '../../contract/people'
import { presentChangedUser } from '../../presenters/people'
import { changeUser } from '../../services/people/people'
import { defineRoute } from '../../utils/defineRoute'

export default defineRoute(updateUser, async (ctx, { params, body }) => {
  const { user, temporaryPassphrase } = await changeUser(ctx, params.id, body)
  return { ...presentChangedUser(ctx.actor, user), ...(temporaryPassphrase ? { temporaryPassphrase } : {}) }
})
