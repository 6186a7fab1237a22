import { readSignOff as contract } from '../../contract/sign-offs'
import { presentSignOff } from '../../presenters/sign-offs'
import { readSignOff } from '../../services/sign-offs/queries'
import { defineRoute } from '../../utils/defineRoute'

export default defineRoute(contract, async (ctx, { params }) => presentSignOff(ctx, await readSignOff(ctx, params.id)))
