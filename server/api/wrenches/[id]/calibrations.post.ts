import { recordCalibration as contract } from '../../../contract/wrenches'
import { presentCalibration } from '../../../presenters/wrenches'
import { recordCalibration } from '../../../services/wrenches/calibrations'
import { calibrationsOf } from '../../../services/wrenches/queries'
import { notFound } from '../../../refusal'
import { defineRoute } from '../../../utils/defineRoute'

export default defineRoute(contract, async (ctx, { params, body }) => {
  const { id } = await recordCalibration(ctx, params.id, body)
  const [calibration] = await calibrationsOf(ctx, params.id, id)
  if (!calibration) throw notFound('This calibration')
  return presentCalibration(calibration)
})
