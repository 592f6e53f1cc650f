import { ApiError } from '~/composables/useApi'

/** Learns who is signed in: on the server for a page drawn there (the state goes along with it), in the browser for one that is not. */
export default defineNuxtPlugin({
  name: 'session',
  dependsOn: ['pinia', 'i18n:plugin'],
  async setup(nuxtApp) {
    if (import.meta.client && nuxtApp.payload.serverRendered) return
    const session = useSessionStore()
    const api = useApi()
    try {
      session.take(await api('GET /api/session'))
    }
    catch (error) {
      // without a signal the page still opens: what it shows without an answer is its own business
      if (import.meta.server || !(error instanceof ApiError && error.status === undefined)) throw error
    }
  },
})
