import { wrenchSetting } from '../../contract/torque'
import { setting } from '../../services/torque/bench'
import { defineRoute } from '../../utils/defineRoute'

export default defineRoute(wrenchSetting, async (_ctx, { body }) => setting(body))
