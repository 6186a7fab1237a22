import type { ApiOptions } from './useApi'

/**
 * A read of the API that the server already makes while it draws the page. A changed query reads again under the same
 * key, so what is shown stays until the new answer is there.
 * @param key names what is read, such as `sign-offs` or `sign-off:${id}`; for `refreshNuxtData(key)` after a write
 */
export function useRead<T>(key: string, path: string, query?: MaybeRefOrGetter<ApiOptions['query']>) {
  const $api = useApi()
  const event = useRequestEvent()
  const asked = computed(() => toValue(query))

  const { data, status, error, refresh } = useAsyncData(key, async () => {
    try {
      return await $api<T>(path, { query: asked.value })
    } catch (thrown) {
      const refused = toApiError(thrown)
      if (event) setResponseStatus(event, refused.status || 503)
      throw refused
    }
  }, { watch: [asked] })

  return { data, status, error: computed(() => error.value ? toApiError(error.value) : null), refresh }
}
