import { mountSuspended } from '@nuxt/test-utils/runtime'
import { describe, expect, it } from 'vitest'
import UiQuantity from '~/components/Ui/Quantity.vue'

const mount = (value = '', more: { step?: string } = {}) =>
  mountSuspended(UiQuantity, { props: { modelValue: { value, unit: 'gal' }, units: ['gal'], label: 'Finished spray', ...more } })
type Mounted = Awaited<ReturnType<typeof mount>>
const lastOf = (field: Mounted) => field.emitted('update:modelValue')?.at(-1)?.[0]

describe('UiQuantity', () => {
  it.each([['1.20', '1.20'], ['1,20', '1.20'], ['0,9', '0.9'], ['.5', '0.5']])('keeps the digits of %s', async (typed, value) => {
    const field = await mount()
    await field.get('input').setValue(typed)
    expect(lastOf(field)).toEqual({ value, unit: 'gal' })
    expect(field.get('input').element.value).toBe(typed)
  })

  it('is not filled in by itself', async () => {
    const field = await mount()
    expect(field.get('input').element.value).toBe('')
    expect(lastOf(field)).toBeUndefined()
  })

  it('shows a value that comes from outside with its digits', async () => {
    const field = await mount('2.5')
    await field.setProps({ modelValue: { value: '3.00', unit: 'gal' } })
    expect(field.get('input').element.value).toBe('3.00')
  })

  it('asks which is meant where a thousand and one and a bit look alike, and hands on neither until told', async () => {
    const field = await mount()
    await field.get('input').setValue('1,116')
    expect(lastOf(field)).toEqual({ value: '1,116', unit: 'gal' })
    const [thousands, decimal] = field.findAll('.finding button')
    expect([thousands?.text(), decimal?.text()]).toEqual(['1116', '1.116'])
    await thousands?.trigger('click')
    expect(lastOf(field)).toEqual({ value: '1116', unit: 'gal' })
    expect(field.find('.finding').exists()).toBe(false)
  })

  it('hands on what it cannot read as typed, for the schema to refuse', async () => {
    const field = await mount()
    await field.get('input').setValue('abc')
    expect(lastOf(field)).toEqual({ value: 'abc', unit: 'gal' })
  })

  it('steps exactly, by buttons that say what they change', async () => {
    const field = await mount('0.1', { step: '0.2' })
    await field.get('[aria-label="More: Finished spray"]').trigger('click')
    expect(lastOf(field)).toEqual({ value: '0.3', unit: 'gal' })
    expect(field.get('input').attributes('inputmode')).toBe('decimal')
  })
})
