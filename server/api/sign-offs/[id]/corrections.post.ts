import { correctSignOff as contract } from '../../../contract/sign-offs'
import { correctSignOff } from '../../../services/sign-offs/record'
import { defineRoute, Reply } from '../../../utils/defineRoute'

export default defineRoute(contract, async (ctx, { params, body }) => {
  const { answer, made } = await correctSignOff(ctx, params.id, body)
  return new Reply(made ? 201 : 200, answer)
})
