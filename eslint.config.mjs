import './eslint.group-by.mjs'
import withNuxt from './.nuxt/eslint.config.mjs'

const SERVER = ['**/server/**', '~~/server/**', '~/server/**', '@/server/**', '#server/**']
const forbid = (...rules) => ['error', { patterns: rules.map(([group, message]) => ({ group, message })) }]

// One block a folder: a later block replaces the rule for the same file, it does not add to it.
export default withNuxt(
  { rules: { 'vue/multi-word-component-names': 'off', 'vue/no-multiple-template-root': 'off', '@typescript-eslint/no-explicit-any': 'error', 'vue/html-self-closing': 'off', 'vue/require-default-prop': 'off', 'no-console': 'error' } },
  { files: ['utils/**/*.ts'], rules: {
    'no-restricted-imports': forbid(
      [SERVER, 'utils/ is the pure domain: hand the value in as an argument'],
      [['vue', '#app', '#imports', 'h3', '**/components/**', '**/stores/**', '**/composables/**'], 'utils/ is the pure domain: no framework'],
      [['node:*', 'better-sqlite3', 'kysely'], 'utils/ does no I/O: do it in server/ and hand the result in']),
    'no-restricted-globals': ['error', 'document', 'window', 'fetch', '$fetch', 'process', 'crypto', 'performance'],
    'no-restricted-properties': ['error', { object: 'Math', property: 'random', message: 'no randomness in the domain' }, { object: 'Date', property: 'now', message: 'no clock in the domain' }],
    'no-restricted-syntax': ['error', { selector: 'NewExpression[callee.name="Date"][arguments.length=0]', message: 'no clock in the domain' }],
  } },
  { files: ['server/database/**/*.ts'], rules: { 'no-restricted-imports': forbid([['**/services/**', '**/server/api/**', 'h3'], 'repositories know no service and no request']) } },
  { files: ['server/services/**/*.ts'], rules: { 'no-restricted-imports': forbid([['h3', '**/server/api/**', '**/server/utils/**', 'vue'], 'services know no request: pass plain values']) } },
  { files: ['server/reports/**/*.ts', 'server/mail/**/*.ts'], rules: { 'no-restricted-imports': forbid([['**/repositories/**', '**/database/**', 'kysely'], 'adapters are handed their data']) } },
  { files: ['server/workers/**/*.ts'], rules: { 'no-restricted-imports': forbid([['**/services/**', '**/api/**'], 'workers read and draw, they do not decide']) } },
  { files: ['server/api/**/*.ts', 'server/routes/**/*.ts', 'server/tasks/**/*.ts'], rules: { 'no-restricted-imports': forbid([['**/database/**', 'kysely', 'better-sqlite3'], 'routes call services']) } },
  { files: ['components/**/*.{ts,vue}', 'pages/**/*.vue', 'composables/**/*.ts', 'stores/**/*.ts', 'layouts/**/*.vue'], rules: { 'no-restricted-imports': forbid([SERVER, 'the browser reaches the server by its routes']) } },
  { files: ['scripts/**', 'server/cli/**', 'tests/**', 'seeds/**'], rules: { 'no-console': 'off' } },
)
