import { updateShopRules } from '../contract/people'
import { changeShopRules } from '../services/people/people'
import { defineRoute } from '../utils/defineRoute'

export default defineRoute(updateShopRules, async (ctx, { body }) => {
  const rules = await changeShopRules(ctx, body)
  return { id: ctx.shop.id, name: ctx.shop.name, timeZone: ctx.shop.timeZone, rules }
})
