import { readWrench as contract } from '../../contract/wrenches'
import { presentWrenchDetail } from '../../presenters/wrenches'
import { readWrench } from '../../services/wrenches/queries'
import { defineRoute } from '../../utils/defineRoute'

export default defineRoute(contract, async (ctx, { params }) => presentWrenchDetail(ctx.actor, await readWrench(ctx, params.id)))
