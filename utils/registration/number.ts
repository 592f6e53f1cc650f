import { z } from 'zod'

export const PRODUCT_KINDS = [
  'registered', 'distributor', 'special-local-need', 'emergency-exemption', 'experimental', 'minimum-risk', 'adjuvant', 'device', 'state-only',
] as const
export const ProductKindSchema = z.enum(PRODUCT_KINDS)
export type ProductKind = z.infer<typeof ProductKindSchema>

export const REGISTRATION_REFUSALS = [
  'missing', 'must-be-empty', 'missing-hyphen', 'leading-zero', 'establishment-number', 'file-symbol', 'letters', 'characters', 'too-long',
  'distributor-needs-three-groups', 'registered-takes-two-or-three', 'sln-form', 'sln-state', 'state-needed',
] as const
export type RegistrationRefusal = (typeof REGISTRATION_REFUSALS)[number]

/** `number` as the label prints it, null for a kind that has none; `basic` is `company-product`, on which restricted status is compared. */
export type RegistrationCheck =
  | { ok: true; number: string | null; basic: string | null }
  | { ok: false; reason: RegistrationRefusal; params: Readonly<Record<string, string>> }

/** `state` is the two-letter state that the number is for; a state-only number needs it. */
export type RegistrationInput = { kind: ProductKind; number: string | null; state?: string | null }

/**
 * Whether a product of that kind has a number of its own: exempt 25(b) products (40 CFR 152.25(f)) and devices have none, and only
 * some states number adjuvants. A device's establishment number is another field.
 */
export const NUMBER_NEED: Record<ProductKind, 'required' | 'optional' | 'none'> = {
  registered: 'required', distributor: 'required', 'special-local-need': 'required', 'emergency-exemption': 'required', experimental: 'required',
  'minimum-risk': 'none', adjuvant: 'optional', device: 'none', 'state-only': 'required',
}

const LABEL_PREFIX = /^EPA\s*(REG(ISTRATION|\.)?|SLN)\s*(NO\.?|NUMBER|#)?\s*:?\s*/
const ESTABLISHMENT_PREFIX = /^(EPA\s*)?EST(ABLISHMENT|\.)?\s*(NO\.?|NUMBER|#)?\s*:?\s*\d/
// The form of an establishment number and of a special local need are from memory; both are common in print.
const ESTABLISHMENT = /^\d+-[A-Z]{2,3}-\d+$/
const SPECIAL_LOCAL_NEED = /^([A-Z]{2})-\d{6}$/
// The letters of REGULATION stand for 1 to 9 and 0 while a product is not yet registered (EPA Label Review Manual, chapter 14).
const FILE_SYMBOL = /^\d+-[REGULATION]+$/
// California's revision letters behind a federal number (cdpr.ca.gov/docs/label/epadef.htm; two letters from memory).
const CALIFORNIA_REVISION = /^(\d+(?:-\d+){1,2})-[A-Z]{2}$/
// California's text gives the company up to 7 digits and the product up to 5; EPA's own service is narrower.
const GROUP_LENGTHS = [7, 5, 7] as const
const STATE_NUMBER_LENGTH = 24

/**
 * Checks a registration number as typed or copied from a label. Outer space, a printed prefix ("EPA Reg. No."), letter case and long
 * dashes are forgiven; nothing else is corrected. Rules: EPA Label Review Manual, chapter 14; 40 CFR 152.25(f).
 */
export function checkRegistrationNumber(input: RegistrationInput): RegistrationCheck {
  const typed = (input.number ?? '').trim().toUpperCase().replace(/[‐-―−]/g, '-')
  const need = NUMBER_NEED[input.kind]
  if (typed === '') return need === 'required' ? refuse('missing') : { ok: true, number: null, basic: null }
  if (need === 'none') return refuse('must-be-empty', { kind: input.kind })
  if (ESTABLISHMENT_PREFIX.test(typed)) return refuse('establishment-number', { number: typed })
  const number = typed.replace(LABEL_PREFIX, '')
  switch (input.kind) {
    case 'registered':
    case 'distributor':
      return checkFederal(input.kind, number, input.state)
    case 'special-local-need':
      return checkSpecialLocalNeed(number, input.state)
    case 'state-only':
      return input.state ? checkIssuedElsewhere(number) : refuse('state-needed')
    default:
      return checkIssuedElsewhere(number)
  }
}

function checkFederal(kind: 'registered' | 'distributor', number: string, state: string | null | undefined): RegistrationCheck {
  const bare = state === 'CA' ? number.replace(CALIFORNIA_REVISION, '$1') : number
  if (ESTABLISHMENT.test(bare)) return refuse('establishment-number', { number })
  if (FILE_SYMBOL.test(bare)) return refuse('file-symbol', { number })
  if (/[A-Z]/.test(bare)) return refuse('letters', { number })
  if (/^\d+$/.test(bare)) return refuse('missing-hyphen', { number })
  if (!/^\d+(-\d+)+$/.test(bare)) return refuse('characters', { number })
  const groups = bare.split('-')
  if (kind === 'distributor' && groups.length !== 3) return refuse('distributor-needs-three-groups', { number, groups: String(groups.length) })
  if (groups.length > 3) return refuse('registered-takes-two-or-three', { number, groups: String(groups.length) })
  const padded = groups.find(group => group.startsWith('0'))
  if (padded !== undefined) return refuse('leading-zero', { number, group: padded })
  for (const [i, max] of GROUP_LENGTHS.entries()) {
    const group = groups[i] ?? ''
    if (group.length > max) return refuse('too-long', { number, group, max: String(max) })
  }
  return { ok: true, number, basic: groups.slice(0, 2).join('-') }
}

function checkSpecialLocalNeed(number: string, state: string | null | undefined): RegistrationCheck {
  const issuer = SPECIAL_LOCAL_NEED.exec(number)?.[1]
  if (issuer === undefined) return refuse('sln-form', { number })
  if (state && state !== issuer) return refuse('sln-state', { number, issuer, state })
  return { ok: true, number, basic: null }
}

/** Numbers of exemptions, permits and states follow no one published form: only what no number has is refused. */
function checkIssuedElsewhere(number: string): RegistrationCheck {
  if (!/^[A-Z0-9]+([-/][A-Z0-9]+)*$/.test(number) || !/\d/.test(number)) return refuse('characters', { number })
  if (number.length > STATE_NUMBER_LENGTH) return refuse('too-long', { number, group: number, max: String(STATE_NUMBER_LENGTH) })
  const groups = /^([1-9]\d{0,6}-[1-9]\d{0,4})(-[1-9]\d{0,6})?$/.exec(number)
  return { ok: true, number, basic: groups?.[1] ?? null }
}

const refuse = (reason: RegistrationRefusal, params: Record<string, string> = {}): RegistrationCheck => ({ ok: false, reason, params })
