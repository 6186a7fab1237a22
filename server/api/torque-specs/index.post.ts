import { createSpec as contract } from '../../contract/torque-specs'
import { presentSpec } from '../../presenters/torque-specs'
import { readSpec } from '../../services/torque-specs/queries'
import { createSpec } from '../../services/torque-specs/specs'
import { defineRoute } from '../../utils/defineRoute'

export default defineRoute(contract, async (ctx, { body }) => {
  const { spec } = await createSpec(ctx, body)
  return presentSpec(ctx, await readSpec(ctx, spec.id))
})
