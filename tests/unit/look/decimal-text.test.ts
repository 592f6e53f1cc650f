import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { readDecimal, stepDecimal } from '~/composables/useDecimalText'

describe('readDecimal', () => {
  it.each([
    ['1.20', '1.20'], ['1,20', '1.20'], ['0,9', '0.9'], ['.5', '0.5'], [',5', '0.5'], ['3.', '3'], ['007', '7'], ['0.125', '0.125'], ['0,125', '0.125'],
    ['1116', '1116'], ['1,116.5', '1116.5'], ['1.116,50', '1116.50'], ['1,234,567', '1234567'], ['12 000', '12000'], ['1.116', '1.116'], ['-4.5', '-4.5'], ['−4', '-4'],
  ])('reads %s as %s', (typed, value) => {
    expect(readDecimal(typed, ',')).toEqual({ kind: 'value', value })
  })

  it('asks where a thousand and one and a bit look alike', () => {
    expect(readDecimal('1,116', ',')).toEqual({ kind: 'ambiguous', thousands: '1116', decimal: '1.116' })
    expect(readDecimal('1.116', '.')).toEqual({ kind: 'ambiguous', thousands: '1116', decimal: '1.116' })
  })

  it('takes blank for blank, not for zero', () => {
    expect(readDecimal('  ', ',')).toEqual({ kind: 'blank' })
  })

  it.each(['abc', '1.2.3', '1e3', '.', '-', '--2', '12,34,5', '1,2.3,4', '½'])('does not guess at %s', (typed) => {
    expect(readDecimal(typed, ',')).toEqual({ kind: 'unreadable' })
  })

  it('keeps every digit of a plain decimal', () => {
    fc.assert(fc.property(fc.nat(), fc.stringMatching(/^[0-9]{1,8}$/), (whole, fraction) => {
      expect(readDecimal(`${whole}.${fraction}`, ',')).toEqual({ kind: 'value', value: `${whole}.${fraction}` })
    }))
  })
})

describe('stepDecimal', () => {
  it.each([
    ['2.5', '0.5', 1, '3.0'], ['3.0', '0.5', -1, '2.5'], ['0', '0.5', -1, '0.0'], ['1.20', '0.1', 1, '1.30'], ['9', '1', 1, '10'], ['0.1', '0.2', 1, '0.3'],
  ] as const)('%s by %s in direction %d is %s', (value, step, sign, next) => {
    expect(stepDecimal(value, step, sign)).toBe(next)
  })
})
