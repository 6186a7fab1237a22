import type { CalibrationAnswer, CreateCalibrationBody, CreateWrenchBody, UpdateWrenchBody, WrenchAnswer } from '#shared/schemas/wrenches'

/** What people do with wrenches. Each throws ApiError when the server refuses. */
export function useWrenchActions() {
  const $api = useApi()
  const { add } = useToasts()

  async function create(body: CreateWrenchBody) {
    const wrench = await $api<WrenchAnswer>('/wrenches', { method: 'POST', body })
    add(`${wrench.assetTag} is in the crib. It needs a calibration before it can be used.`)
    return wrench
  }

  async function update(id: string, body: UpdateWrenchBody) {
    const wrench = await $api<WrenchAnswer>(`/wrenches/${id}`, { method: 'PATCH', body })
    await refreshNuxtData(`wrench:${id}`)
    add(`${wrench.assetTag} is changed.`)
    return wrench
  }

  async function setState(id: string, body: Pick<UpdateWrenchBody, 'state' | 'stateReason'>) {
    const wrench = await $api<WrenchAnswer>(`/wrenches/${id}`, { method: 'PATCH', body })
    await refreshNuxtData(`wrench:${id}`)
    add(`${wrench.assetTag}: ${wrenchStateWords[wrench.state].toLowerCase()}.`)
    return wrench
  }

  async function calibrate(id: string, body: CreateCalibrationBody) {
    const calibration = await $api<CalibrationAnswer>(`/wrenches/${id}/calibrations`, { method: 'POST', body })
    add(calibration.usable ? `Recorded. The next calibration is due on ${formatDay(calibration.dueOn)}.` : 'Recorded. The wrench stays quarantined.')
    return calibration
  }

  return { create, update, setState, calibrate }
}
