import { readOrder as contract } from '../../contract/repair-orders'
import { presentOrder } from '../../presenters/repair-orders'
import { readOrder } from '../../services/repair-orders/queries'
import { defineRoute } from '../../utils/defineRoute'

export default defineRoute(contract, async (ctx, { params }) => presentOrder(ctx, await readOrder(ctx, params.id)))
