import type { CreateSpecBody, ImportReport, SpecAnswer, SpecRevisionBody } from '#shared/schemas/torque-specs'

/** What people do with torque specs. Each throws ApiError when the server refuses. */
export function useTorqueSpecActions() {
  const $api = useApi()
  const { add } = useToasts()

  async function create(body: CreateSpecBody) {
    const spec = await $api<SpecAnswer>('/torque-specs', { method: 'POST', body })
    add(`${spec.component} is drafted. It waits for approval.`)
    return spec
  }

  async function revise(id: string, body: SpecRevisionBody) {
    const spec = await $api<SpecAnswer>(`/torque-specs/${id}/revisions`, { method: 'POST', body })
    add('The new revision is drafted. Until it is approved, the one before stays in use.')
    return spec
  }

  /** @param governs which of two disagreeing printed values holds */
  async function approve(id: string, governs?: 'target' | 'printed') {
    const spec = await $api<SpecAnswer>(`/torque-specs/${id}/approve`, { method: 'POST', body: { governs } })
    await refreshNuxtData(`torque-spec:${id}`)
    add(`${spec.component} is approved: revision ${spec.revision.number} can be used.`)
    return spec
  }

  async function withdraw(id: string, reason: string) {
    const spec = await $api<SpecAnswer>(`/torque-specs/${id}/withdraw`, { method: 'POST', body: { reason } })
    await refreshNuxtData(`torque-spec:${id}`)
    add(`${spec.component} is withdrawn.`)
    return spec
  }

  /** @param partial keep the good rows although others are refused */
  function importCsv(csv: string, partial = false) {
    return $api<ImportReport>('/torque-specs/import', {
      method: 'POST', body: csv, headers: { 'content-type': 'text/csv' }, query: { partial: partial || undefined },
    })
  }

  return { create, revise, approve, withdraw, importCsv }
}
