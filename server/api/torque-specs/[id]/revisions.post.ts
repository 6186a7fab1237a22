import { reviseSpec as contract } from '../../../contract/torque-specs'
import { presentSpec } from '../../../presenters/torque-specs'
import { readSpec } from '../../../services/torque-specs/queries'
import { reviseSpec } from '../../../services/torque-specs/specs'
import { defineRoute } from '../../../utils/defineRoute'

export default defineRoute(contract, async (ctx, { params, body }) => {
  const { revision } = await reviseSpec(ctx, params.id, body)
  return presentSpec(ctx, await readSpec(ctx, params.id), revision.id)
})
