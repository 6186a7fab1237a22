import { recordSignOff as contract } from '../../contract/sign-offs'
import { recordSignOff } from '../../services/sign-offs/record'
import { defineRoute, Reply } from '../../utils/defineRoute'

export default defineRoute(contract, async (ctx, { params, body }) => {
  const { answer, made } = await recordSignOff(ctx, params.id, body)
  return new Reply(made ? 201 : 200, answer)
})
