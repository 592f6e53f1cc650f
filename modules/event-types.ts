import { addTypeTemplate, defineNuxtModule } from '@nuxt/kit'

/** What the server's middleware puts beside a request, known to every project that sees route files. */
export default defineNuxtModule({
  meta: { name: 'event-types' },
  setup() {
    addTypeTemplate({
      filename: 'types/event-context.d.ts',
      getContents: () => `
import type { SignedIn } from '#server/services/sessions'
declare module 'h3' {
  interface H3EventContext {
    /** Set by the session middleware: whoever is signed in, and who that is in the firm at hand (null: no firm chosen, or no role left). */
    signedIn?: SignedIn | null
    /** True in a demonstration folder, for a loopback or private peer, without a forwarding header. */
    demo?: boolean
  }
}
export {}
`,
    }, { nuxt: true, nitro: true, node: true })
  },
})
