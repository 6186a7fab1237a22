import { addGroup as contract } from '../../../contract/repair-orders'
import { presentGroup } from '../../../presenters/fastener-groups'
import { addGroup } from '../../../services/fastener-groups/groups'
import { readGroup } from '../../../services/fastener-groups/queries'
import { defineRoute } from '../../../utils/defineRoute'

export default defineRoute(contract, async (ctx, { params, body }) => {
  const groupId = await addGroup(ctx, params.id, body)
  return presentGroup(ctx, await readGroup(ctx, groupId))
})
