import type { RepairOrderAnswer, RepairOrderListItem } from '#shared/schemas/repair-orders'
import type { VehicleAnswer } from '#shared/schemas/vehicles'

/** The repair orders of the shop as the address narrows and sorts them, newest first unless it says otherwise. */
export function useRepairOrders() {
  const state = useQueryState(['sort', 'state', 'mine', 'q'] as const)
  const { value } = state

  const list = useRead<{ items: RepairOrderListItem[], nextCursor: string | null }>('repair-orders', '/repair-orders', () => ({
    sort: value('sort') || '-openedAt', state: value('state'), mine: value('mine'), q: value('q'), cursor: value('cursor'),
  }))

  return { ...state, list }
}

/** Vehicles of the shop in which the words occur. */
export function useVehicleSearch(words: Ref<string>) {
  return useRead<{ items: VehicleAnswer[] }>('vehicle-search', '/vehicles', () => ({ q: words.value.trim(), limit: 8 }))
}

/** Opening repair orders and adding vehicles. Each throws ApiError when the server refuses. */
export function useRepairOrderActions() {
  const $api = useApi()

  /** @throws ApiError 422 `vin_check_digit`, 409 `id_taken` */
  const addVehicle = (entry: VehicleEntry) =>
    $api<VehicleAnswer>('/vehicles', { method: 'POST', body: readVehicle(entry) })

  /** @throws ApiError 409 `id_taken` */
  const open = (entry: OrderEntry, vehicleId: string) =>
    $api<RepairOrderAnswer>('/repair-orders', { method: 'POST', body: readOrder(entry, vehicleId) })

  return { addVehicle, open }
}
