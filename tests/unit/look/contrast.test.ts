import { describe, expect, it } from 'vitest'
import type { SheetName, Token } from '~/assets/css/sheets'
import { SHEETS } from '~/assets/css/sheets'

// WCAG 2.2, "relative luminance" and "contrast ratio" (https://www.w3.org/TR/WCAG22/#dfn-relative-luminance, #dfn-contrast-ratio)
function luminance(hex: string): number {
  const [r = 0, g = 0, b = 0] = [1, 3, 5].map((at) => {
    const c = Number.parseInt(hex.slice(at, at + 2), 16) / 255
    return c <= 0.04045 ? c / 12.92 : ((c + 0.055) / 1.055) ** 2.4
  })
  return 0.2126 * r + 0.7152 * g + 0.0722 * b
}
function ratio(a: string, b: string): number {
  const [light = 0, dark = 0] = [luminance(a), luminance(b)].sort((x, y) => y - x)
  return (light + 0.05) / (dark + 0.05)
}

// WCAG 2.2 success criteria 1.4.3 (AA text, 4.5), 1.4.6 (AAA text, 7) and 1.4.11 (parts of controls and graphics, 3)
const PAIRS: [Token, Token, number][] = [
  ['ink', 'sheet', 7], ['ink', 'paper', 7],
  ['ink-2', 'sheet', 4.5], ['ink-2', 'paper', 4.5],
  ['act', 'sheet', 4.5], ['act', 'paper', 4.5], ['on-act', 'act', 4.5],
  ['query', 'sheet', 4.5], ['stop', 'sheet', 4.5], ['good', 'sheet', 4.5],
  ['query', 'paper', 4.5], ['stop', 'paper', 4.5], ['good', 'paper', 4.5],
  ['margin', 'paper', 3], ['margin', 'sheet', 3],
]

describe('the formula', () => {
  it('gives the published extremes', () => {
    expect(ratio('#000000', '#FFFFFF')).toBeCloseTo(21, 10)
    expect(ratio('#777777', '#FFFFFF')).toBeLessThan(4.5) // WebAIM's often quoted grey: 4.48
    expect(ratio('#767676', '#FFFFFF')).toBeGreaterThan(4.5)
  })
})

describe.each(Object.keys(SHEETS) as SheetName[])('the %s sheet', (name) => {
  it.each(PAIRS)('%s on %s is at least %d to 1', (text, ground, least) => {
    expect(ratio(SHEETS[name][text], SHEETS[name][ground])).toBeGreaterThanOrEqual(least)
  })
})

describe('the sun sheet', () => {
  it.each(['ink', 'ink-2', 'act', 'query', 'stop', 'good', 'margin'] as const)('%s reaches 7 to 1', (text) => {
    expect(ratio(SHEETS.sun[text], SHEETS.sun.sheet)).toBeGreaterThanOrEqual(7)
  })
})
