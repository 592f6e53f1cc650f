import { expect, it } from 'vitest'
import { samePath } from '#shared/access/next'

it.each([
  ['/daybook', '/daybook'],
  ['/daybook?q=990001-4#x', '/daybook?q=990001-4#x'],
  ['//elsewhere.example', '/'],
  ['/\\elsewhere.example', '/'],
  ['/a\\b', '/'],
  ['/\t/elsewhere.example', '/'],
  ['https://elsewhere.example', '/'],
  ['javascript:alert(1)', '/'],
  ['daybook', '/'],
  ['', '/'],
  [['/daybook', '/shelf'], '/'],
  [undefined, '/'],
])('after signing in, %o leads to %s', (next, path) => {
  expect(samePath(next)).toBe(path)
})
