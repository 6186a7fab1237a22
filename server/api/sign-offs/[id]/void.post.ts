import { voidSignOff as contract } from '../../../contract/sign-offs'
import { presentSignOff } from '../../../presenters/sign-offs'
import { readSignOff } from '../../../services/sign-offs/queries'
import { voidSignOff } from '../../../services/sign-offs/void'
import { defineRoute } from '../../../utils/defineRoute'

export default defineRoute(contract, async (ctx, { params, body }) => {
  await voidSignOff(ctx, params.id, body)
  return presentSignOff(ctx, await readSignOff(ctx, params.id))
})
