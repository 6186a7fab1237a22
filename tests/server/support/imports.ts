/** What the server takes from Nitro's auto-imports, for tests that run its routes without a build. */
export { clearUserSession, getUserSession, setUserSession } from '../../../node_modules/nuxt-auth-utils/dist/runtime/server/utils/session.js'

export const useRuntimeConfig = () => ({
  session: {
    name: 'jamnut', password: 'a session password only for tests, long enough', maxAge: 43_200, cookie: { sameSite: 'lax', secure: false },
  },
})
