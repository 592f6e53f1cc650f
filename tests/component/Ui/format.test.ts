import { mountSuspended } from '@nuxt/test-utils/runtime'
import { describe, expect, it } from 'vitest'
import { defineComponent, h } from 'vue'
import { RATE_PERS, RATE_UNITS } from '#shared/units/rate'
import { UNIT_CODES } from '#shared/units/units'

async function formats() {
  let made: ReturnType<typeof useFormat> | undefined
  await mountSuspended(defineComponent({ setup: () => { made = useFormat(); return () => h('i') } }))
  if (!made) throw new Error('setup did not run')
  return made
}

describe('useFormat', () => {
  it('keeps the digits it was given, and groups thousands', async () => {
    const { number, percent, quantity } = await formats()
    expect([number('6018'), number('1.20'), number('123456789012345678.90'), percent('9.7'), percent('0.015')])
      .toEqual(['6,018', '1.20', '123,456,789,012,345,678.90', '9.7%', '0.015%'])
    expect([{ value: '0.90', unit: 'fl_oz' }, { value: '1', unit: 'acre' }, { value: '1.0', unit: 'acre' }, { value: '14', unit: 'placement' }, { value: '50', unit: 'pct' }].map(quantity))
      .toEqual(['0.90\u00A0fl oz', '1\u00A0acre', '1.0\u00A0acres', '14\u00A0placements', '50%'])
  })

  it('shows what is no plain decimal as it stands', async () => {
    expect((await formats()).number('about 3')).toBe('about 3')
  })

  it('writes times on the clock of the place', async () => {
    const { time, dateTime, date, day, dayLong } = await formats()
    expect(time('2026-05-04T08:45:00-05:00', 'America/Chicago')).toBe('8:45\u00A0am')
    expect(dateTime('2026-05-05T02:30:00Z', 'America/Los_Angeles')).toBe('May 4, 2026, 7:30\u00A0pm')
    expect(date('2026-05-05T02:30:00Z', 'America/Los_Angeles')).toBe('May 4, 2026')
    expect([day('2026-05-14'), dayLong('2026-05-14')]).toEqual(['May 14, 2026', 'Thursday, May 14, 2026'])
  })

  it('has words for every unit of the catalogue, and for every rate', async () => {
    const { unitWord } = await formats()
    const words = [...UNIT_CODES, ...RATE_PERS].map(code => unitWord(code))
    expect(words.filter(word => word.includes('common.') || word.includes('_') || word.includes('|'))).toEqual([])
    expect(RATE_UNITS.map(code => unitWord(code)).filter(word => /common\.|[_/|]/.test(word))).toEqual([])
    expect([unitWord('fl_oz/1000_sq_ft'), unitWord('pt/100_gal'), unitWord('g/linear_ft'), unitWord('lb/acre')])
      .toEqual(['fl oz per 1,000 sq ft', 'pt per 100 gal', 'g per linear ft', 'lb per acre'])
  })
})
