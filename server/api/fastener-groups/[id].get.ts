import { readGroup as contract } from '../../contract/repair-orders'
import { presentGroup } from '../../presenters/fastener-groups'
import { readGroup } from '../../services/fastener-groups/queries'
import { defineRoute } from '../../utils/defineRoute'

export default defineRoute(contract, async (ctx, { params }) => presentGroup(ctx, await readGroup(ctx, params.id)))
