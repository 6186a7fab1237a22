import { changePassphrase as contract } from '../../contract/people'
import { changePassphrase } from '../../services/people/people'
import { defineRoute } from '../../utils/defineRoute'

export default defineRoute(contract, async (ctx, { body }) => {
  await changePassphrase(ctx, body)
  return { done: true as const }
})
