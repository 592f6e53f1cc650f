import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { NUMBER_NEED, PRODUCT_KINDS, REGISTRATION_REFUSALS, checkRegistrationNumber } from '#shared/registration/number'
import type { ProductKind, RegistrationRefusal } from '#shared/registration/number'

// Rules: EPA Label Review Manual, chapter 14 (numbers, file symbols); cdpr.ca.gov/docs/label/epadef.htm (lengths, distributor, revision letters);
// epa.gov pest label training, module 2 (establishment number); 40 CFR 152.25(f) (exempt products). Company numbers here are invented.
type Good = [kind: ProductKind, typed: string | null, number: string | null, basic: string | null, state?: string]
type Bad = [kind: ProductKind, typed: string | null, reason: RegistrationRefusal, state?: string]

const GOOD: Good[] = [
  ['registered', '990001-12', '990001-12', '990001-12'],
  ['registered', '990001-12-990002', '990001-12-990002', '990001-12'],
  ['registered', '9900001-12345', '9900001-12345', '9900001-12345'],
  ['registered', ' EPA Reg. No. 990001-12 ', '990001-12', '990001-12'],
  ['registered', 'EPA Registration No. 990001-12', '990001-12', '990001-12'],
  ['registered', '990001–12', '990001-12', '990001-12'],
  ['registered', '990001-12-AA', '990001-12-AA', '990001-12', 'CA'],
  ['distributor', '990001-12-990002', '990001-12-990002', '990001-12'],
  ['distributor', '990001-12-990002-ZA', '990001-12-990002-ZA', '990001-12', 'CA'],
  ['special-local-need', 'TX-260004', 'TX-260004', null],
  ['special-local-need', 'EPA SLN No. tx-260004', 'TX-260004', null, 'TX'],
  ['emergency-exemption', '26-TX-03', '26-TX-03', null],
  ['emergency-exemption', '990001-12', '990001-12', '990001-12'],
  ['experimental', '990001-EUP-7', '990001-EUP-7', null],
  ['minimum-risk', '', null, null],
  ['minimum-risk', null, null, null],
  ['device', '  ', null, null],
  ['adjuvant', null, null, null],
  ['adjuvant', '990001-50003', '990001-50003', '990001-50003', 'CA'],
  ['state-only', '9900001-50012', '9900001-50012', '9900001-50012', 'CA'],
]

const BAD: Bad[] = [
  ['registered', '', 'missing'],
  ['registered', null, 'missing'],
  ['registered', '99000112', 'missing-hyphen'],
  ['registered', '0990001-12', 'leading-zero'],
  ['registered', '990001-012', 'leading-zero'],
  ['registered', '990001-0', 'leading-zero'],
  ['distributor', '990001-12-0990002', 'leading-zero'],
  ['registered', '990001-TX-001', 'establishment-number'],
  ['registered', 'EPA Est. No. 990001-TX-001', 'establishment-number'],
  ['registered', 'EPA Est. 990001-12', 'establishment-number'],
  ['registered', '990001-EGN', 'file-symbol'],
  ['registered', '990001-RO', 'file-symbol'],
  ['registered', '990001-XY', 'letters'],
  ['registered', 'EXEMPT', 'letters'],
  ['registered', '990001-12-AA', 'letters'],
  ['registered', '990001-12-AA', 'letters', 'TX'],
  ['registered', '99000112-1', 'too-long'],
  ['registered', '990001-123456', 'too-long'],
  ['registered', '990001-12-99000211', 'too-long'],
  ['registered', '990001-12-3-4', 'registered-takes-two-or-three'],
  ['registered', '990001-', 'characters'],
  ['registered', '990001 12', 'characters'],
  ['registered', '990001/12', 'characters'],
  ['distributor', '990001-12', 'distributor-needs-three-groups'],
  ['distributor', '990001-12-3-4', 'distributor-needs-three-groups'],
  ['special-local-need', '990001-12', 'sln-form'],
  ['special-local-need', 'TX-26004', 'sln-form'],
  ['special-local-need', 'TX-260004', 'sln-state', 'NY'],
  ['minimum-risk', '990001-12', 'must-be-empty'],
  ['minimum-risk', 'exempt', 'must-be-empty'],
  ['device', '990001-TX-001', 'must-be-empty'],
  ['state-only', '9900001-50012', 'state-needed'],
  ['state-only', '', 'missing', 'CA'],
  ['experimental', 'permit', 'characters'],
  ['emergency-exemption', '1'.repeat(25), 'too-long'],
]

describe('registration numbers', () => {
  it.each(GOOD)('%s takes %j', (kind, typed, number, basic, state) => {
    expect(checkRegistrationNumber({ kind, number: typed, state })).toEqual({ ok: true, number, basic })
  })

  it.each(BAD)('%s refuses %j: %s', (kind, typed, reason, state) => {
    expect(checkRegistrationNumber({ kind, number: typed, state })).toMatchObject({ ok: false, reason })
  })

  it('each reason for refusing has a row above', () => {
    expect(new Set(BAD.map(([, , reason]) => reason))).toEqual(new Set(REGISTRATION_REFUSALS))
  })

  it('a taken number is taken again unchanged', () => {
    for (const [kind, , number, basic, state] of GOOD) {
      expect(checkRegistrationNumber({ kind, number, state })).toEqual({ ok: true, number, basic })
    }
  })

  it('any text gets an answer, and none is taken for a kind that has no number', () => {
    fc.assert(fc.property(fc.constantFrom(...PRODUCT_KINDS), fc.string({ unit: 'binary', maxLength: 40 }), (kind, number) => {
      const check = checkRegistrationNumber({ kind, number })
      if (check.ok && check.number !== null) expect(NUMBER_NEED[kind]).not.toBe('none')
      if (check.ok && check.number === null) expect(number.trim()).toBe('')
    }))
  })
})
