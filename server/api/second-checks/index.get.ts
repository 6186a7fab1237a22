import { listSecondChecks as contract } from '../../contract/sign-offs'
import { presentWaiting } from '../../presenters/second-checks'
import { listWaiting } from '../../services/second-checks/queries'
import { defineRoute } from '../../utils/defineRoute'

export default defineRoute(contract, async (ctx, { query }) => {
  const { items, nextCursor } = await listWaiting(ctx, query)
  return { items: items.map(waiting => presentWaiting(ctx, waiting)), nextCursor }
})
