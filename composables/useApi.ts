export interface ApiOptions {
  /** @default 'GET' */
  method?: 'GET' | 'POST' | 'PUT' | 'PATCH' | 'DELETE'
  /** Empty strings, null and undefined are left out. */
  query?: Readonly<Record<string, string | number | boolean | null | undefined>>
  /** Sent as JSON; a string with a content type of its own is sent as it is. */
  body?: object | string
  headers?: Record<string, string>
  signal?: AbortSignal
}

/** One request to the API under /api. `T` is the answer's type from shared/schemas. @throws ApiError */
export type Api = <T>(path: string, options?: ApiOptions) => Promise<T>

/**
 * `const $api = useApi()`. While the server draws a page it asks as the visitor. A read by somebody whose session has
 * ended leads to the sign-in page and back; a write is only refused, so that nothing typed is lost.
 */
export function useApi(): Api {
  const nuxtApp = useNuxtApp()
  const request = useRequestFetch()
  const session = useSessionStore()

  return async <T>(path: string, { method = 'GET', query = {}, ...options }: ApiOptions = {}) => {
    const given = Object.fromEntries(Object.entries(query).filter(([, value]) => value !== '' && value !== null && value !== undefined))
    try {
      return await request<T>(path, { ...options, method, query: given, baseURL: '/api' })
    } catch (thrown) {
      const error = toApiError(thrown)
      if (error.code !== 'signed_out' || import.meta.server) throw error
      if (method !== 'GET') throw new ApiError(401, 'You are signed out. Nothing was saved: sign in again in another tab, then repeat it here.', error.data)
      session.clear()
      await nuxtApp.runWithContext(() => navigateTo(signInAddress(useRouter().currentRoute.value.fullPath)))
      throw error
    }
  }
}
