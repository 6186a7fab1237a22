import { createOrder } from '../../contract/repair-orders'
import { presentOrder } from '../../presenters/repair-orders'
import { openOrder } from '../../services/repair-orders/orders'
import { readOrder } from '../../services/repair-orders/queries'
import { defineRoute } from '../../utils/defineRoute'

export default defineRoute(createOrder, async (ctx, { body }) => {
  const order = await openOrder(ctx, body)
  return presentOrder(ctx, await readOrder(ctx, order.id))
})
