import { listSpecs as contract } from '../../contract/torque-specs'
import { presentSpec } from '../../presenters/torque-specs'
import { listSpecs } from '../../services/torque-specs/queries'
import { defineRoute } from '../../utils/defineRoute'

export default defineRoute(contract, async (ctx, { query }) => {
  const { items, nextCursor } = await listSpecs(ctx, query)
  return { items: items.map(record => presentSpec(ctx, record)), nextCursor }
})
