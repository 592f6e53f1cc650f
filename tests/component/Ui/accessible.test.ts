import { mountSuspended } from '@nuxt/test-utils/runtime'
import axe from 'axe-core'
import { describe, expect, it } from 'vitest'
import { Everything } from './everything'

describe('the base components together', () => {
  // colours are computed in assets/css/sheets.ts and tested there: happy-dom draws nothing
  it('give axe nothing to say', async () => {
    const page = await mountSuspended(Everything, { attachTo: document.body })
    const { violations, passes } = await axe.run(page.element, { rules: { 'color-contrast': { enabled: false } } })
    expect(violations.map(v => `${v.id}: ${v.nodes.map(n => n.html).join(' ')}`)).toEqual([])
    expect(passes.length).toBeGreaterThan(15)
    page.unmount()
  })

  it('wire label, hint and error to the field, and link the summary to it', async () => {
    const page = await mountSuspended(Everything, { attachTo: document.body })
    const field = page.get('#field-area-size')
    expect(field.attributes('aria-describedby')).toBe('field-area-size-hint field-area-size-error')
    expect(field.attributes('aria-invalid')).toBe('true')
    expect(page.get('label[for="field-area-size"]').text()).toBe('Area')
    await page.get('.summary a').trigger('click')
    expect(document.activeElement?.id).toBe('field-area-size')
    page.unmount()
  })

  it('carry no style attribute, which the content policy forbids', async () => {
    const page = await mountSuspended(Everything)
    expect(page.html()).not.toMatch(/ style="[^"]/)
  })
})
