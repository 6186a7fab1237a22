import { readSpec as contract } from '../../contract/torque-specs'
import { presentSpecDetail } from '../../presenters/torque-specs'
import { readSpec } from '../../services/torque-specs/queries'
import { defineRoute } from '../../utils/defineRoute'

export default defineRoute(contract, async (ctx, { params }) => presentSpecDetail(ctx, await readSpec(ctx, params.id)))
