import { readFileSync, readdirSync } from 'node:fs'
import { join, resolve } from 'node:path'
import { describe, expect, it } from 'vitest'
import { CHECKS, OUTCOMES } from '#shared/checks/finding'
import { ERROR_STATUS } from '#shared/errors'

const root = resolve(import.meta.dirname, '../../..')
const locales = join(root, 'i18n/locales/en')
const catalogue: Record<string, unknown> = Object.assign({}, ...readdirSync(locales).map(file => JSON.parse(readFileSync(join(locales, file), 'utf8')) as object))
const at = (key: string): unknown => key.split('.').reduce<unknown>((node, part) => typeof node === 'object' && node !== null ? (node as Record<string, unknown>)[part] : undefined, catalogue)

function sources(folder: string): string[] {
  return readdirSync(join(root, folder), { withFileTypes: true }).flatMap((entry) => {
    const path = join(folder, entry.name)
    if (entry.isDirectory()) return sources(path)
    return /\.(ts|vue)$/.test(entry.name) ? [path] : []
  })
}
const files = ['components', 'pages', 'layouts', 'composables', 'stores', 'server', 'utils'].flatMap(sources).concat('app.vue', 'error.vue')
const used = files.flatMap(file => [...readFileSync(join(root, file), 'utf8').matchAll(/(?:\bt|\$t|\bwords)\(\s*'([a-z][\w-]*(?:\.[\w-]+)+)'/g)].map(([, key = '']) => ({ file, key })))

describe('every sentence that is asked for is in the catalogue', () => {
  it('by its literal key', () => {
    expect(used.length).toBeGreaterThan(100)
    expect(used.filter(({ key }) => typeof at(key) !== 'string').map(({ file, key }) => `${file}: ${key}`)).toEqual([])
  })
  it('for every error code, check, outcome and message', () => {
    const messages = sources('utils/checks').flatMap(file => [...readFileSync(join(root, file), 'utf8').matchAll(/(?:finding\('[\w-]+', (?:'\w+'|label\.checked \? 'stop' : 'query'), |message: |\? |: )'((?:licence|product|rate|missing|late)(?:-[\w-]+)?)'/g)].map(([, m = '']) => `checks.messages.${m}`))
    expect(messages.length).toBeGreaterThan(15)
    const keys = [...Object.keys(ERROR_STATUS).map(code => `errors.${code}`), ...CHECKS.map(check => `checks.names.${check}`), ...messages]
    expect([...new Set(keys)].filter(key => typeof at(key) !== 'string')).toEqual([])
    expect(OUTCOMES).toHaveLength(3)
  })
})
