import { tighteningOrder } from '../../contract/torque'
import { order } from '../../services/torque/bench'
import { defineRoute } from '../../utils/defineRoute'

export default defineRoute(tighteningOrder, async (_ctx, { body }) => order(body))
