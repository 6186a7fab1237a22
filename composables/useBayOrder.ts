import type { CreateGroupBody, GroupAnswer, RepairOrderAnswer } from '#shared/schemas/repair-orders'
import type { SpecAnswer } from '#shared/schemas/torque-specs'

/** One repair order with its joints. */
export const useBayOrder = (id: string) => useRead<RepairOrderAnswer>(`repair-order:${id}`, `/repair-orders/${id}`)

/** Joint specs in which the words occur; withdrawn ones cannot be used. */
export function useJointSpecSearch(words: Ref<string>) {
  const { data, ...read } = useRead<{ items: SpecAnswer[] }>('joint-spec-search', '/torque-specs', () => ({ kind: 'joint', q: words.value.trim(), limit: 20 }))
  return { ...read, found: computed(() => (data.value?.items ?? []).filter(({ revision }) => revision.status !== 'withdrawn')) }
}

/** Putting joints on the order and releasing the vehicle. Each throws ApiError when the server refuses. */
export function useBayOrderActions(id: string) {
  const $api = useApi()
  const { add } = useToasts()

  /** @throws ApiError 422 `bolt_count`, `general_table`, `spec_withdrawn`, `safety_joint` */
  const addGroup = (body: CreateGroupBody) => $api<GroupAnswer>(`/repair-orders/${id}/fastener-groups`, { method: 'POST', body })

  /** @throws ApiError 422 `held`, 403 `same_person`, `wrong_pin` */
  async function release(pin: string) {
    await $api(`/repair-orders/${id}/release`, { method: 'POST', body: { pin } })
    await refreshNuxtData(`repair-order:${id}`)
    add('Released.')
  }

  return { addGroup, release }
}
