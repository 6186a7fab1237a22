import { listOrders as contract } from '../../contract/repair-orders'
import { presentOrderLine } from '../../presenters/repair-orders'
import { listOrders } from '../../services/repair-orders/queries'
import { defineRoute } from '../../utils/defineRoute'

export default defineRoute(contract, async (ctx, { query }) => {
  const { items, nextCursor } = await listOrders(ctx, query)
  return { items: items.map(view => presentOrderLine(ctx, view)), nextCursor }
})
