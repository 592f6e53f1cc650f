import { readFileSync, readdirSync } from 'node:fs'
import { join, relative, resolve } from 'node:path'
import { describe, expect, it } from 'vitest'

/** The table of DEVELOPERS.md, "Who may import whom", held against the tree: lint covers what it is run on, this covers every file. */
const root = resolve(import.meta.dirname, '../../..')
const SKIP = new Set(['node_modules', '.nuxt', '.output', '.git', 'tests', 'docs', '.data', '.keys'])

function filesUnder(folder: string): string[] {
  return readdirSync(join(root, folder), { withFileTypes: true }).flatMap((entry) => {
    const path = join(folder, entry.name)
    if (entry.isDirectory()) return SKIP.has(entry.name) ? [] : filesUnder(path)
    return /\.(ts|vue|mjs)$/.test(entry.name) ? [path] : []
  })
}

/** What a file imports, as paths from the root for our own files, as names for packages. */
function importsOf(file: string): string[] {
  const text = readFileSync(join(root, file), 'utf8')
  return [...text.matchAll(/(?:from|import)\s*\(?\s*'([^']+)'/g)].map(([, name = '']) => {
    const bare = name.replace(/\?(worker|asset)-file$/, '')
    if (bare.startsWith('#shared/')) return bare.replace('#shared/', 'utils/')
    if (bare.startsWith('#server/')) return bare.replace('#server/', 'server/')
    if (/^[~@]{1,2}\//.test(bare)) return bare.replace(/^[~@]{1,2}\//, '')
    return bare.startsWith('.') ? relative(root, resolve(root, file, '..', bare)) : bare
  })
}

const RULES: [folder: string, never: RegExp][] = [
  ['utils', /^(server\/|vue$|#app|#imports|h3$|node:|better-sqlite3|kysely|components\/|stores\/|composables\/)/],
  ['server/database', /^(server\/(services|api|routes|utils)\/|h3$|vue)/],
  ['server/services', /^(server\/(api|routes|utils)\/|h3$|vue)/],
  ['server/reports', /^(server\/(database|services|api)\/|kysely)/],
  ['server/mail', /^(server\/(database|api)\/|kysely)/],
  ['server/workers', /^server\/(services|api|routes)\//],
  ['server/api', /^(server\/database\/|kysely|better-sqlite3)/],
  ['server/routes', /^(server\/database\/|kysely|better-sqlite3)/],
  ['components', /^(server\/|node:)/],
  ['pages', /^(server\/|node:)/],
  ['stores', /^(server\/|components\/|node:)/],
  ['composables', /^(server\/|components\/|node:)/],
]

describe.each(RULES)('%s', (folder, never) => {
  it(`imports nothing of ${String(never)}`, () => {
    const broken = filesUnder(folder).flatMap(file => importsOf(file).filter(name => never.test(name)).map(name => `${file} imports ${name}`))
    expect(broken).toEqual([])
  })
})

it('no file of the program is past 250 lines', () => {
  const folders = ['utils', 'server', 'components', 'pages', 'stores', 'composables', 'layouts', 'modules', 'seeds', 'scripts']
  const long = folders.flatMap(filesUnder).filter(file => !file.includes('migrations/')).filter(file => readFileSync(join(root, file), 'utf8').split('\n').length > 251)
  expect(long).toEqual([])
})
