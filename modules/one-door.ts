import { defineNuxtModule } from '@nuxt/kit'

/**
 * nuxt-auth-utils brings session routes of its own. Ours are the only door: they end the row on the server and are in the contract table.
 * Stands after nuxt-auth-utils in the list of modules.
 */
export default defineNuxtModule({
  meta: { name: 'one-door' },
  setup(_, nuxt) {
    nuxt.options.serverHandlers = nuxt.options.serverHandlers.filter(handler => !handler.route?.startsWith('/api/_auth/'))
  },
})
