import type * as z from 'zod/mini'
import type { SpecDetail, specListAnswer } from '#shared/schemas/torque-specs'

const keys = ['sort', 'kind', 'status', 'jointClass', 'flagged', 'q'] as const

/** The shop's torque specs as the address narrows and sorts them. */
export function useTorqueSpecs() {
  const state = useQueryState(keys)
  const { value } = state

  const list = useRead<z.infer<typeof specListAnswer>>('torque-specs', '/torque-specs', () => ({
    sort: value('sort') || 'component',
    kind: value('kind'),
    status: value('status'),
    jointClass: value('jointClass'),
    flagged: value('flagged'),
    q: value('q'),
    cursor: value('cursor'),
  }))

  return { ...state, list }
}

/** One torque spec with every revision, newest first. */
export function useTorqueSpec(id: string) {
  return useRead<SpecDetail>(`torque-spec:${id}`, `/torque-specs/${id}`)
}
