import { me } from '../../contract/people'
import { navigation } from '../../policies'
import { presentMe } from '../../presenters/people'
import { readMe } from '../../services/people/queries'
import { defineRoute } from '../../utils/defineRoute'

export default defineRoute(me, async ctx => presentMe(ctx, await readMe(ctx), navigation))
