import { updateOrder as contract } from '../../contract/repair-orders'
import { presentOrder } from '../../presenters/repair-orders'
import { updateOrder } from '../../services/repair-orders/orders'
import { readOrder } from '../../services/repair-orders/queries'
import { defineRoute } from '../../utils/defineRoute'

export default defineRoute(contract, async (ctx, { params, body }) => {
  await updateOrder(ctx, params.id, body)
  return presentOrder(ctx, await readOrder(ctx, params.id))
})
