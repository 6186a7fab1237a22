/**
 * Filters, sort and place in a list, kept in the address: they survive a reload and the back button, and a link shows
 * somebody else the same. Changing any of them begins at the first page again.
 */
export function useQueryState<Key extends string>(keys: readonly Key[]) {
  const route = useRoute()

  const value = (key: Key | 'cursor'): string => {
    const given = route.query[key]
    return typeof given === 'string' ? given : ''
  }

  const addressWith = (changes: Record<string, string | undefined>) =>
    ({ path: route.path, query: { ...route.query, cursor: undefined, ...changes } })

  /** One of them, to bind a control to. */
  const field = (key: Key) => computed({
    get: () => value(key),
    set: (chosen) => {
      void navigateTo(addressWith({ [key]: chosen || undefined }))
    },
  })

  /** Whether anything narrows the list; the order of it does not. */
  const narrowed = computed(() => keys.some(key => key !== 'sort' && value(key) !== ''))

  const clearedTo = computed(() => ({ path: route.path, query: { sort: route.query.sort } }))
  const firstTo = computed(() => value('cursor') ? addressWith({}) : undefined)
  const nextTo = (cursor: string | null | undefined) => cursor ? addressWith({ cursor }) : undefined

  return { value, field, narrowed, clearedTo, firstTo, nextTo }
}
