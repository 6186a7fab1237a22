import { withdrawSpec as contract } from '../../../contract/torque-specs'
import { presentSpec } from '../../../presenters/torque-specs'
import { readSpec } from '../../../services/torque-specs/queries'
import { withdrawSpec } from '../../../services/torque-specs/specs'
import { defineRoute } from '../../../utils/defineRoute'

export default defineRoute(contract, async (ctx, { params, body }) => {
  await withdrawSpec(ctx, params.id, body.reason)
  return presentSpec(ctx, await readSpec(ctx, params.id))
})
