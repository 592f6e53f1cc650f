import { ImpoundPlugin } from 'impound'

/** `utils/` is the pure domain: the build of either side stops when it reaches for the world. */
const pureDomain = {
  include: [/\/utils\/[^.]/],
  exclude: [/node_modules/, /\/server\/utils\//],
  patterns: [
    [/(^|\/)server\//, 'utils/ is the pure domain: no server code'],
    [/^node:/, 'utils/ is the pure domain: it does no I/O'],
  ] as [RegExp, string][],
}

export default defineNuxtConfig({
  modules: ['@pinia/nuxt', '@nuxtjs/tailwindcss', '@nuxtjs/i18n', '@nuxt/eslint', 'nuxt-auth-utils', './modules/one-door', './modules/emitted-files', './modules/event-types'],
  srcDir: '.',
  dir: { shared: 'utils' },
  ignore: ['tests/**', 'seeds/**', 'docs/**', 'scripts/**'],
  components: [{ path: '~/components', pathPrefix: true }],
  compatibilityDate: '2026-11-01',
  telemetry: false,
  devtools: { enabled: false },
  experimental: { appManifest: false },
  typescript: { strict: true, tsConfig: { exclude: ['../tests/**', '../seeds/**', '../scripts/**'] } },
  eslint: { config: { standalone: true } },
  css: ['~/assets/css/fonts.css', '~/assets/css/register.css'],
  // named, or the module adds a second copy of Tailwind's own sheet
  tailwindcss: { cssPath: '~/assets/css/register.css', viewer: false },
  app: { head: { viewport: 'width=device-width, initial-scale=1', titleTemplate: '%s' } },
  routeRules: { '/visits/new': { ssr: false } },
  i18n: {
    strategy: 'no_prefix',
    defaultLocale: 'en',
    langDir: 'locales',
    locales: [{
      code: 'en',
      language: 'en-US',
      name: 'English',
      files: ['common', 'account', 'today', 'daybook', 'entry', 'visit', 'books', 'notices', 'checks', 'catalogues', 'errors', 'paper', 'mail'].map(f => `en/${f}.json`),
    }],
  },
  auth: { loadStrategy: 'none' },
  runtimeConfig: {
    dataDir: '.data',
    keyDir: '.keys',
    checkpointDir: '.checkpoints',
    logHost: '',
    publicUrl: '',
    trustedProxy: '',
    mail: { url: '', from: '' },
    session: { password: '' },
  },
  nitro: {
    preset: 'node-server',
    esbuild: { options: { target: 'node20' } },
    externals: { traceOptions: { conditions: ['node', 'module-sync'] } } as never,
    rollupConfig: { plugins: [ImpoundPlugin.rollup(pureDomain)] } as never,
  },
  vite: { plugins: [ImpoundPlugin.vite(pureDomain)] },
})
