import type * as z from 'zod/mini'
import type { WrenchDetail, wrenchListAnswer } from '#shared/schemas/wrenches'

const keys = ['sort', 'kind', 'status', 'q'] as const

/** The wrench crib as the address narrows and sorts it; what needs somebody comes first unless it says otherwise. */
export function useWrenches() {
  const state = useQueryState(keys)
  const { value } = state

  const list = useRead<z.infer<typeof wrenchListAnswer>>('wrenches', '/wrenches', () => ({
    sort: value('sort') || 'status',
    kind: value('kind'),
    status: value('status'),
    q: value('q'),
    cursor: value('cursor'),
  }))

  return { ...state, list }
}

/** One wrench with its calibrations, newest first. */
export function useWrench(id: string) {
  return useRead<WrenchDetail>(`wrench:${id}`, `/wrenches/${id}`)
}

/** Today in the shop, YYYY-MM-DD; the same on server and client, also around midnight. */
export function useShopToday() {
  const session = useSessionStore()
  return useState('shop-today', () => dayIn(new Date(), session.timeZone))
}
