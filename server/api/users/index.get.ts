import { listUsers as contract } from '../../contract/people'
import { presentUser } from '../../presenters/people'
import { listUsers } from '../../services/people/queries'
import { defineRoute } from '../../utils/defineRoute'

export default defineRoute(contract, async (ctx, { query }) => {
  const { items, nextCursor } = await listUsers(ctx, query)
  return { items: items.map(user => presentUser(ctx.actor, user)), nextCursor }
})
