import { describe, expect, it } from 'vitest'
import { weakness } from '#shared/access/passwords'

describe('a new password', () => {
  it.each([
    ['four quiet barn owls', null],
    ['7KQ4M2-wexford-1971', null],
    ['tankside-demo', null],
    ['elf zeichen', 'password-short'],
    ['🐝🐝🐝🐝🐝🐝', 'password-short'],
    ['maren@alder-wick.example', 'password-is-address'],
    ['Maren@Alder-Wick.Example', 'password-is-address'],
    ['marenmaren123', 'password-is-address'],
    ['aaaaaaaaaaaaaaa', 'password-common'],
    ['abcdabcdabcdab', 'password-common'],
    ['Password2026!', 'password-common'],
    ['123456789012', 'password-common'],
    ['qwerty123456', 'password-common'],
  ])('%s: %s', (password, expected) => {
    expect(weakness(password, 'maren@alder-wick.example')).toBe(expected)
  })
})
