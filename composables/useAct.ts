/**
 * One act of a person that the server may refuse: `run` does it, `busy` while it runs, `refusal` is why it was refused.
 * Errors of fields are told by `errorOf(path)`, and the first field marked invalid (`aria-invalid`; a group of radio
 * buttons within `data-invalid`) gets the focus.
 * @param fields paths shown beside a field of the form; issues of others are told by `notice`
 */
export function useAct<Args extends unknown[], Result>(act: (...args: Args) => Promise<Result>, fields: MaybeRefOrGetter<readonly string[]> = []) {
  const busy = ref(false)
  const refusal = shallowRef<ApiError | null>(null)

  const errorOf = (path: string) => refusal.value?.issues.find(issue => issue.path === path)?.message ?? null

  /** What is to be said beside the button: null when each issue stands beside its field. */
  const notice = computed(() => {
    if (!refusal.value) return null
    const { issues, message } = refusal.value
    const others = issues.filter(({ path }) => !toValue(fields).includes(path))
    if (issues.length === 0) return message
    return others.length > 0 ? others.map(issue => issue.message).join(' ') : null
  })

  /** Resolves to the answer, or to undefined when it was refused or is still under way. */
  async function run(...args: Args): Promise<Result | undefined> {
    if (busy.value) return undefined
    busy.value = true
    refusal.value = null
    try {
      return await act(...args)
    } catch (thrown) {
      refusal.value = toApiError(thrown)
      await nextTick()
      focusFirstInvalid()
      return undefined
    } finally {
      busy.value = false
    }
  }

  function reset() {
    refusal.value = null
  }

  return { busy, refusal, notice, errorOf, run, reset }
}

/** A dialog that is open covers what lies behind it. */
function focusFirstInvalid() {
  const root = [...document.querySelectorAll('dialog[open]')].at(-1) ?? document
  root.querySelector<HTMLElement>('[aria-invalid="true"], [data-invalid] input')?.focus()
}
