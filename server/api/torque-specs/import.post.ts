import { importSpecs as contract } from '../../contract/torque-specs'
import { importSpecs } from '../../services/torque-specs/import'
import { defineRoute } from '../../utils/defineRoute'

export default defineRoute(contract, (ctx, { query, body }) => importSpecs(ctx, body, { partial: query.partial === 'true' }))
