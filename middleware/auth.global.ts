/** Comfort only: the server refuses whoever has no session. */
export default defineNuxtRouteMiddleware((to) => {
  const { user } = useSessionStore()
  if (to.path === '/sign-in') return user ? navigateTo(returnAddress(to.query.to)) : undefined
  if (!user) return navigateTo(signInAddress(to.fullPath))
  if (user.mustChangePassphrase && to.path !== '/me') return navigateTo('/me')
})
