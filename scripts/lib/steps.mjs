import { spawnSync } from 'node:child_process'
import { existsSync, readdirSync, statSync } from 'node:fs'
import { join, resolve } from 'node:path'

/** The steps that `npm run demo` and `npm test` share. Plain Node.js: nothing is installed yet when this runs. */
export const root = resolve(import.meta.dirname, '../..')

const SOURCES = ['assets', 'components', 'composables', 'i18n', 'layouts', 'middleware', 'modules', 'pages', 'plugins', 'public', 'server', 'stores', 'utils', 'app.vue', 'error.vue', 'nuxt.config.ts', 'tailwind.config.ts', 'package-lock.json']
/** Commands: they run from their source. */
const NOT_BUILT = join(root, 'server/cli')

export function run(command, args, options = {}) {
  const { status, error } = spawnSync(command, args, { cwd: root, stdio: 'inherit', ...options })
  if (error) throw error
  return status ?? 1
}

function runOrEnd(what, command, args, options) {
  const status = run(command, args, options)
  if (status === 0) return
  console.error(`\n${what} failed (exit ${status}).`)
  process.exit(status)
}

export function checkNode() {
  const [major = 0, minor = 0] = process.versions.node.split('.').map(Number)
  if (major === 20 && minor >= 19) return
  console.error(`Tankside runs on Node.js 20.19 or later of the 20 line; this is ${process.versions.node}.`)
  process.exit(1)
}

const modified = path => existsSync(path) ? statSync(path).mtimeMs : 0

/** The newest change below a file or folder. */
function newest(path) {
  if (!existsSync(path) || path === NOT_BUILT) return 0
  const is = statSync(path)
  return is.isDirectory() ? Math.max(0, ...readdirSync(path).map(name => newest(join(path, name)))) : is.mtimeMs
}

/** `npm ci` when nothing is installed, or when the lock file is newer than what is. */
export function install() {
  if (modified(join(root, 'node_modules/.package-lock.json')) >= modified(join(root, 'package-lock.json'))) return
  console.log('Installing packages (a few minutes the first time: the SQLite add-on may be compiled) …')
  runOrEnd('Installing', 'npm', ['ci', '--no-audit', '--no-fund'])
}

/** One production build, when a source is newer than the last one. */
export function build() {
  const made = modified(join(root, '.output/nitro.json'))
  if (made > 0 && SOURCES.every(source => newest(join(root, source)) < made)) return
  console.log('Building …')
  runOrEnd('Building', process.execPath, [join(root, 'node_modules/nuxt/bin/nuxt.mjs'), 'build'], { stdio: ['ignore', 'ignore', 'inherit'] })
}
