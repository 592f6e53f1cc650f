import { fileURLToPath } from 'node:url'
import { defineVitestProject } from '@nuxt/test-utils/config'
import { defineConfig } from 'vitest/config'

const at = (path: string) => fileURLToPath(new URL(path, import.meta.url))
const alias = { '#shared': at('./utils'), '#server': at('./server'), '~~': at('.'), '~': at('.') }
const served = { globalSetup: ['tests/support/built.ts'], fileParallelism: false, isolate: false, testTimeout: 120_000, hookTimeout: 120_000 }

export default defineConfig({
  test: {
    projects: [
      { resolve: { alias }, test: { name: 'unit', environment: 'node', include: ['tests/unit/**/*.test.ts', 'tests/reference/**/*.test.ts'], testTimeout: 30_000 } },
      await defineVitestProject({
        test: { name: 'component', include: ['tests/component/**/*.test.ts'], environment: 'nuxt', environmentOptions: { nuxt: { domEnvironment: 'happy-dom' } } },
      }),
      { resolve: { alias }, test: { name: 'api', environment: 'node', include: ['tests/api/**/*.test.ts'], ...served } },
      { resolve: { alias }, test: { name: 'browser', environment: 'node', include: ['tests/browser/**/*.test.ts'], ...served, testTimeout: 240_000 } },
    ],
  },
})
