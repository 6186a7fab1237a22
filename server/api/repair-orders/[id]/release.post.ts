import { releaseOrder as contract } from '../../../contract/repair-orders'
import { presentOrder } from '../../../presenters/repair-orders'
import { releaseOrder } from '../../../services/repair-orders/orders'
import { readOrder } from '../../../services/repair-orders/queries'
import { defineRoute } from '../../../utils/defineRoute'

export default defineRoute(contract, async (ctx, { params, body }) => {
  await releaseOrder(ctx, params.id, body.pin)
  return presentOrder(ctx, await readOrder(ctx, params.id))
})
