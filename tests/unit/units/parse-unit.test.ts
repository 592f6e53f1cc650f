import { describe, expect, it } from 'vitest'
import { parseUnit } from '#shared/units/parse-unit'
import { UNIT_CODES } from '#shared/units/units'

describe('parseUnit', () => {
  it.each(UNIT_CODES)('reads the code %s', (code) => {
    expect(parseUnit(code)).toEqual({ ok: true, unit: code })
  })

  it.each([
    ['fl oz', 'fl_oz'], ['Fl. Oz.', 'fl_oz'], ['fluid ounces', 'fl_oz'], ['oz wt', 'oz_wt'], ['dry oz', 'oz_wt'], ['Pounds', 'lb'], ['lbs.', 'lb'], ['GALLONS', 'gal'],
    ['ml', 'mL'], ['cc', 'mL'], ['litre', 'L'], ['1,000 sq ft', '1000_sq_ft'], ['sq. ft.', 'sq_ft'], ['ft²', 'sq_ft'], ['Acres', 'acre'], ['°F', 'deg_F'], ['km/h', 'km_h'], ['knots', 'kn'], ['%', 'pct'], [' quart ', 'qt'],
  ])('reads %j', (text, unit) => {
    expect(parseUnit(text)).toEqual({ ok: true, unit })
  })

  it.each(['oz', 'Ounce', 'ounces', 'OZ.'])('asks which ounce %j is', (text) => {
    expect(parseUnit(text)).toEqual({ ok: false, reason: 'ambiguous-ounce' })
  })

  it.each(['imp_gal', 'imperial gallon', 'Imp. gal', 'UK pint'])('refuses the imperial measure %j', (text) => {
    expect(parseUnit(text)).toEqual({ ok: false, reason: 'imperial-measure' })
  })

  it.each(['', 'c', 'M', 'T', 'gr', 'furlong', '__proto__', 'constructor'])('does not know %j', (text) => {
    expect(parseUnit(text)).toEqual({ ok: false, reason: 'unknown-unit' })
  })
})
