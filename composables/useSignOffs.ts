import type { SignOffListItem } from '#shared/schemas/sign-offs'
import type { WrenchAnswer } from '#shared/schemas/wrenches'

interface Page<T> {
  items: T[]
  nextCursor: string | null
}

const keys = ['sort', 'component', 'from', 'until', 'verdict', 'technicianId', 'wrenchId', 'q'] as const

/** The sign-offs of the shop as the address narrows and sorts them, newest first unless it says otherwise. */
export function useSignOffs() {
  const state = useQueryState(keys)
  const { value } = state

  const list = useRead<Page<SignOffListItem>>('sign-offs', '/sign-offs', () => ({
    sort: value('sort') || '-signedAt',
    component: value('component'),
    from: value('from'),
    to: value('until') && dayAfter(value('until')),
    verdict: value('verdict'),
    technicianId: value('technicianId'),
    wrenchId: value('wrenchId'),
    q: value('q'),
    cursor: value('cursor'),
  }))

  return { ...state, list }
}

/** What the sentence above the table can choose from: every wrench, and whoever signed anything seen so far. */
export function useSignOffChoices(seen: () => readonly SignOffListItem[] | undefined) {
  const { data: wrenches } = useRead<Page<WrenchAnswer>>('sign-off-wrenches', '/wrenches', { limit: 200 })
  const earlier = useState<Record<string, string>>('signers', () => ({}))

  const ofThese = computed(() => Object.fromEntries((seen() ?? []).map(({ technician }) => [technician.id, technician.name])))
  const names = computed(() => ({ ...earlier.value, ...ofThese.value }))
  watch(ofThese, (these) => {
    earlier.value = { ...earlier.value, ...these }
  })

  return {
    wrenches: computed(() => (wrenches.value?.items ?? []).map(({ id, assetTag }) => ({ value: id, label: assetTag }))),
    technicians: computed(() => Object.entries(names.value)
      .map(([value, label]) => ({ value, label }))
      .sort((a, b) => a.label.localeCompare(b.label))),
  }
}
