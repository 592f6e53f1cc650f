import { describe, expect, it } from 'vitest'
import { words } from '#server/words/words'
import { ERROR_STATUS } from '#shared/errors'

describe('words', () => {
  it('finds a sentence by its path and fills in what it names', () => {
    expect(words('errors.not-found')).toBe('There is nothing here that you may see. Check the address, or go back to the list.')
    expect(words('errors.issues.too-long', { maximum: 160 })).toBe('This is longer than 160 characters. Shorten it.')
  })

  it.each(Object.keys(ERROR_STATUS))('has a sentence for the refusal %s', (code) => {
    expect(words(`errors.${code}`)).not.toBe(`errors.${code}`)
  })
})
