import { describe, expect, it } from 'vitest'
import { Uuid7Schema, uuidTime, uuidv7 } from '#shared/ledger/ids'

const PUBLISHED = '017F22E2-79B0-7CC3-98C4-DC0C0C07398F'

describe('RFC 9562, appendix A.6', () => {
  it('reads the published time, whatever the case', () => {
    expect(new Date(uuidTime(PUBLISHED)).toISOString()).toBe('2022-02-22T19:22:22.000Z')
    expect(uuidTime(PUBLISHED.toLowerCase())).toBe(1_645_557_742_000)
  })

  it('writes the published id from its time and random bits', () => {
    const random = Uint8Array.from([0x0c, 0xc3, 0x18, 0xc4, 0xdc, 0x0c, 0x0c, 0x07, 0x39, 0x8f])
    expect(uuidv7(1_645_557_742_000, random)).toBe(PUBLISHED.toLowerCase())
  })

  it.each([
    ['version 4', '017f22e2-79b0-4cc3-98c4-dc0c0c07398f'], ['variant 0', '017f22e2-79b0-7cc3-08c4-dc0c0c07398f'],
    ['truncated', '017f22e2-79b0-7cc3-98c4-dc0c0c07398'], ['upper case', PUBLISHED],
  ])('records refuse %s', (_what, id) => {
    expect(Uuid7Schema.safeParse(id).success).toBe(false)
  })

  it('records take the published id in lower case', () => {
    expect(Uuid7Schema.parse(PUBLISHED.toLowerCase())).toBe(PUBLISHED.toLowerCase())
  })
})
