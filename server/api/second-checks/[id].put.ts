import { recordSecondCheck as contract } from '../../contract/sign-offs'
import { recordSecondCheck } from '../../services/second-checks/record'
import { defineRoute, Reply } from '../../utils/defineRoute'

export default defineRoute(contract, async (ctx, { params, body }) => {
  const { answer, made } = await recordSecondCheck(ctx, params.id, body)
  return new Reply(made ? 201 : 200, answer)
})
