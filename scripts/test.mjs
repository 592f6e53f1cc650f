import { existsSync, mkdtempSync, readFileSync, rmSync } from 'node:fs'
import { spawnSync } from 'node:child_process'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { build, checkNode, install, root, run } from './lib/steps.mjs'

/** Programs that tests read pages and paper with, and the Debian package of each. */
const PROGRAMS = { chromium: 'chromium', pdftotext: 'poppler-utils', qpdf: 'qpdf', sqlite3: 'sqlite3' }

const has = program => spawnSync('sh', ['-c', `command -v ${program}`]).status === 0

/** Installs what is missing where apt is at hand and we may; else the tests that need it say which package to install. */
function installPrograms() {
  const missing = Object.keys(PROGRAMS).filter(program => !has(program))
  if (missing.length === 0) return
  const packages = missing.map(program => PROGRAMS[program])
  if (!has('apt-get') || process.getuid?.() !== 0) {
    console.error(`Some tests will fail: install Debian's ${packages.join(', ')} (or what your system calls them).`)
    return
  }
  console.log(`Installing ${packages.join(', ')} …`)
  const env = { ...process.env, DEBIAN_FRONTEND: 'noninteractive' }
  run('apt-get', ['update', '-qq'], { env, stdio: ['ignore', 'ignore', 'inherit'] })
  if (run('apt-get', ['install', '-y', '-qq', '--no-install-recommends', ...packages], { env, stdio: ['ignore', 'ignore', 'inherit'] }) !== 0) console.error(`Some tests will fail: ${packages.join(', ')} could not be installed.`)
}

checkNode()
install()
installPrograms()
build()

const folder = mkdtempSync(join(tmpdir(), 'tankside-results-'))
const results = join(folder, 'results.json')
const status = run(process.execPath, [join(root, 'node_modules/vitest/vitest.mjs'), 'run', '--reporter=default', '--reporter=json', `--outputFile.json=${results}`, ...process.argv.slice(2)])

const { numPassedTests = 0, numFailedTests = 0, numPendingTests = 0, testResults = [] } = existsSync(results) ? JSON.parse(readFileSync(results, 'utf8')) : {}
rmSync(folder, { recursive: true, force: true })
// A file that fails before its first test has no test to count.
const broken = testResults.filter(file => file.status === 'failed' && file.assertionResults.every(test => test.status !== 'failed')).length
const failed = Math.max(numFailedTests + broken, status === 0 ? 0 : 1)
console.log(`${numPassedTests} passed, ${failed} failed${numPendingTests > 0 ? `, ${numPendingTests} skipped` : ''}`)
process.exitCode = failed > 0 || numPassedTests === 0 ? 1 : 0
