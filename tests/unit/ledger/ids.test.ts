import fc from 'fast-check'
import { validate, version } from 'uuid'
import { describe, expect, it } from 'vitest'
import { Uuid7Schema, parseReference, reference, uuidTime, uuidv7 } from '#shared/ledger/ids'
import { markStrokes } from '#shared/ledger/mark'

const ms = fc.integer({ min: 0, max: 2 ** 48 - 1 })
const random = fc.uint8Array({ minLength: 10, maxLength: 10 })
const days = fc.date({ min: new Date('2000-01-01'), max: new Date('2099-12-31'), noInvalidDate: true }).map(date => date.toISOString().slice(0, 10))

describe('uuidv7', () => {
  it('is a version 7 UUID to an independent library, and carries its time', () => {
    fc.assert(fc.property(ms, random, (time, bytes) => {
      const id = uuidv7(time, bytes)
      expect(validate(id) && version(id)).toBe(7)
      expect(Uuid7Schema.parse(id)).toBe(id)
      expect(uuidTime(id)).toBe(time)
    }))
  })

  it('sorts by time as text', () => {
    fc.assert(fc.property(ms, ms, random, (a, b, bytes) => {
      fc.pre(a < b)
      expect(uuidv7(a, bytes) < uuidv7(b, bytes)).toBe(true)
    }))
  })

  it.each([[-1, 10], [2 ** 48, 10], [1.5, 10], [0, 9], [0, 16]])('refuses time %s with %i random bytes', (time, length) => {
    expect(() => uuidv7(time, new Uint8Array(length))).toThrow(RangeError)
  })
})

describe('reference', () => {
  it.each([
    ['2026-05-14', '019e2f00-0000-7000-8000-000000000000', '260514-000000'],
    ['2026-05-14', '019e2f00-0000-7000-8000-0000ffffffff', '260514-ZZZZZZ'],
    ['2026-05-14', '019e2f00-0000-7000-8000-000000000021', '260514-000011'],
    ['2026-05-14', '019e2f00-0000-7000-8000-000000000020', '260514-000010'],
  ])('%s and %s', (day, id, text) => {
    expect(reference(day, id)).toBe(text)
  })

  it('survives lower case, a lost dash, and letters read for digits', () => {
    fc.assert(fc.property(days, ms, random, (day, time, bytes) => {
      const text = reference(day, uuidv7(time, bytes))
      const misread = text.toLowerCase().replaceAll('0', 'o').replaceAll('1', 'l').replace('-', ' ')
      expect(parseReference(text)).toBe(text)
      expect(parseReference(misread)).toBe(text)
    }))
  })

  it.each(['', '260514', '260514-7KQ4M', '260514-7KQ4M22', '261314-7KQ4M2', '260532-7KQ4M2', '260514-7KQ4MU', 'ladybird'])('does not take %j', (text) => {
    expect(parseReference(text)).toBeNull()
  })

  it('reads the form people see', () => {
    expect(parseReference(' 260514–7kq4m2 ')).toBe('260514-7KQ4M2')
  })
})

describe('mark', () => {
  it.each([
    ['00000000', Array(16).fill(1)], ['ffffffff', Array(16).fill(4)], ['1b1b1b1bffff', [1, 2, 3, 4, 1, 2, 3, 4, 1, 2, 3, 4, 1, 2, 3, 4]], ['c0000001', [4, ...Array(14).fill(1), 2]],
  ])('of %s', (hash, strokes) => {
    expect(markStrokes(hash)).toEqual(strokes)
  })

  it.each(['', '1234567', 'ABCDEF01'])('refuses %j', (hash) => {
    expect(() => markStrokes(hash)).toThrow(RangeError)
  })
})
