import { listWrenches as contract } from '../../contract/wrenches'
import { presentWrench } from '../../presenters/wrenches'
import { listWrenches } from '../../services/wrenches/queries'
import { defineRoute } from '../../utils/defineRoute'

export default defineRoute(contract, async (ctx, { query }) => {
  const { items, nextCursor } = await listWrenches(ctx, query)
  return { items: items.map(item => presentWrench(ctx.actor, item)), nextCursor }
})
