import { readLogHead } from '../../contract/sign-offs'
import { logHead } from '../../services/log/queries'
import { defineRoute } from '../../utils/defineRoute'

export default defineRoute(readLogHead, async (ctx) => {
  const { sequence, hash, at } = await logHead(ctx)
  return { sequence, hash, at: at?.toISOString() ?? null }
})
