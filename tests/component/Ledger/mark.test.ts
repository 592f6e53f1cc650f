import { mountSuspended } from '@nuxt/test-utils/runtime'
import { describe, expect, it } from 'vitest'
import LedgerMark from '~/components/Ledger/Mark.vue'

/** Two bits a stroke, most significant first, heights 1 to 4: worked by hand from the hexadecimal digits. */
const HEIGHTS = { '00000000': '1111111111111111', 'ffffffff': '4444444444444444', '1b1b1b1b': '1234123412341234', '8f3a61c4': '3144143323124121' }

describe('LedgerMark', () => {
  it.each(Object.entries(HEIGHTS))('draws %s as strokes of %s', async (hash, heights) => {
    const mark = await mountSuspended(LedgerMark, { props: { hash: hash + 'f'.repeat(56) } })
    const drawn = mark.findAll('rect').map(stroke => Number(stroke.attributes('height')) / 3)
    expect(drawn.join('')).toBe(heights)
    expect(mark.attributes('role')).toBe('img')
    expect(mark.attributes('aria-label')).toBe(`mark ${hash}`)
    expect(mark.html()).not.toContain('style=')
  })

  it('draws nothing where there is no hash yet', async () => {
    expect((await mountSuspended(LedgerMark, { props: { hash: '' } })).find('svg').exists()).toBe(false)
  })
})
