/** Who is signed in is known before anything is drawn; the server's finding travels to the browser with the page. */
export default defineNuxtPlugin({
  name: 'session',
  dependsOn: ['pinia'],
  async setup({ payload }) {
    if (import.meta.client && payload.serverRendered) return
    try {
      await useSession().load()
    } catch (thrown) {
      const error = toApiError(thrown)
      if (error.status >= 500) showError({ statusCode: error.status, message: error.message })
    }
  },
})
