import { checkTorque } from '../../contract/torque'
import { check } from '../../services/torque/bench'
import { defineRoute } from '../../utils/defineRoute'

export default defineRoute(checkTorque, async (ctx, { body }) => check(ctx, body))
