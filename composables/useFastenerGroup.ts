import type { GroupAnswer, RepairOrderAnswer } from '#shared/schemas/repair-orders'
import type { WrenchAnswer } from '#shared/schemas/wrenches'

/** A fastener group, the wrenches with how they suit it, and the order it belongs to (once the page is there). */
export function useFastenerGroup(id: string) {
  const $api = useApi()
  const { data: group, status, error, refresh } = useRead<GroupAnswer>(`fastener-group:${id}`, `/fastener-groups/${id}`)
  const { data: listed, error: wrenchError, refresh: refreshWrenches } = useRead<{ items: WrenchAnswer[] }>(`wrenches-for:${id}`, '/wrenches', { fitFor: id, limit: 200 })

  /** Fit ones first, then as the crib lists them. */
  const wrenches = computed(() => (listed.value?.items ?? []).toSorted((a, b) => Number(b.fit ?? false) - Number(a.fit ?? false)))

  const order = shallowRef<RepairOrderAnswer | null>(null)
  /** Comfort only (progress, what comes next): without an answer the screen works as well. */
  async function loadOrder() {
    const orderId = group.value?.repairOrder.id
    if (orderId) order.value = await $api<RepairOrderAnswer>(`/repair-orders/${orderId}`).catch(() => null)
  }
  onMounted(() => watch(() => group.value?.repairOrder.id, loadOrder, { immediate: true }))

  return { group, wrenches, wrenchError, refreshWrenches, order, loadOrder, status, error, refresh }
}
