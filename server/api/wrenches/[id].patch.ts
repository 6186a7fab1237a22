import { updateWrench } from '../../contract/wrenches'
import { presentWrenchDetail } from '../../presenters/wrenches'
import { readWrench } from '../../services/wrenches/queries'
import { changeWrench } from '../../services/wrenches/wrenches'
import { defineRoute } from '../../utils/defineRoute'

export default defineRoute(updateWrench, async (ctx, { params, body }) => {
  await changeWrench(ctx, params.id, body)
  return presentWrenchDetail(ctx.actor, await readWrench(ctx, params.id))
})
