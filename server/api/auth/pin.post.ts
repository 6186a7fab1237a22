import { changePin as contract } from '../../contract/people'
import { changePin } from '../../services/people/people'
import { defineRoute } from '../../utils/defineRoute'

export default defineRoute(contract, async (ctx, { body }) => {
  await changePin(ctx, body)
  return { done: true as const }
})
