/** What this person was doing at this fastener group on this device; it survives a reload and a lost network. */
export function useSignOffDraft(groupId: string) {
  const { user } = useSessionStore()
  const draftKey = `sign-off-draft:${user?.id}:${groupId}`
  const wrenchKey = `wrench:${user?.id}`

  /** A blank until the device has been asked: the server draws the same. */
  const draft = shallowRef<SignOffDraft>(newDraft())
  const loaded = ref(false)
  /** False when the device refuses to keep anything: a reload would lose what is entered. */
  const kept = ref(true)

  function store(key: string, value: string | null) {
    try {
      if (value === null) localStorage.removeItem(key)
      else localStorage.setItem(key, value)
      kept.value = true
    } catch {
      kept.value = false
    }
  }

  function recall(key: string) {
    try {
      return localStorage.getItem(key)
    } catch {
      return null
    }
  }

  onMounted(() => {
    draft.value = readDraft(recall(draftKey)) ?? newDraft(recall(wrenchKey))
    loaded.value = true
  })

  /** Every change goes through here, and is on the device before the next press. */
  function change(next: SignOffDraft) {
    draft.value = next
    store(draftKey, JSON.stringify(next))
    if (next.wrenchId) store(wrenchKey, next.wrenchId)
  }

  const patch = (changes: Partial<SignOffDraft>) => change({ ...draft.value, ...changes })

  /** Begins anew with the same wrench, after signing or when everything is to be taken back. */
  function clear() {
    store(draftKey, null)
    draft.value = { ...newDraft(draft.value.wrenchId), adapter: draft.value.adapter, multiplierRatio: draft.value.multiplierRatio }
  }

  return { draft, loaded, kept, change, patch, clear }
}
