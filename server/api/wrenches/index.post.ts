import { createWrench } from '../../contract/wrenches'
import { presentWrenchDetail } from '../../presenters/wrenches'
import { readWrench } from '../../services/wrenches/queries'
import { addWrench } from '../../services/wrenches/wrenches'
import { defineRoute } from '../../utils/defineRoute'

export default defineRoute(createWrench, async (ctx, { body }) => {
  const { id } = await addWrench(ctx, body)
  return presentWrenchDetail(ctx.actor, await readWrench(ctx, id))
})
