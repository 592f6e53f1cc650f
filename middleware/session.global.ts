/** Sends whoever is not signed in to the door, and whoever has no firm (or none that opens) to the account page. The server refuses by itself; this only saves a dead end. */
export default defineNuxtRouteMiddleware((to) => {
  const session = useSessionStore()
  if (to.meta.public === true || to.matched.length === 0 || !session.known) return
  if (!session.me) return navigateTo({ path: '/sign-in', query: to.fullPath === '/' ? {} : { next: to.fullPath } })
  if (session.me.abilities.length === 0 && to.path !== '/account') return navigateTo('/account')
})
