import { listSignOffs as contract } from '../../contract/sign-offs'
import { listSignOffs } from '../../services/sign-offs/queries'
import { defineRoute } from '../../utils/defineRoute'

export default defineRoute(contract, (ctx, { query }) => listSignOffs(ctx, query))
