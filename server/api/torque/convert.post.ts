import { convertTorque } from '../../contract/torque'
import { convert } from '../../services/torque/bench'
import { defineRoute } from '../../utils/defineRoute'

export default defineRoute(convertTorque, async (_ctx, { body }) => convert(body))
