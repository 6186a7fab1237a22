import { readLog } from '../../contract/sign-offs'
import { listLog } from '../../services/log/queries'
import { defineRoute } from '../../utils/defineRoute'

export default defineRoute(readLog, (ctx, { query }) => listLog(ctx, query))
