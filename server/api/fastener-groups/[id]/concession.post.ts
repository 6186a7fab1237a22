import { concedeGroup as contract } from '../../../contract/repair-orders'
import { presentGroup } from '../../../presenters/fastener-groups'
import { concede } from '../../../services/fastener-groups/marks'
import { readGroup } from '../../../services/fastener-groups/queries'
import { defineRoute } from '../../../utils/defineRoute'

export default defineRoute(contract, async (ctx, { params, body }) => {
  await concede(ctx, params.id, body)
  return presentGroup(ctx, await readGroup(ctx, params.id))
})
