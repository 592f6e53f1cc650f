import type { Role } from '#shared/books/shapes'
import type { EquipmentKind } from '#shared/catalogues/codes'

export type BranchKey = 'NY' | 'CA' | 'TX'

/** Branches, people and numbers are invented; counties and zones are geography. Class names as each state calls them are from memory. */
export const BRANCHES: Record<BranchKey, { name: string, address: string, phone: string, county: string, zone: string, registration: { number: string, kind: string } }> = {
  NY: { name: 'Albany', address: '40 Tannery Row, Ellory, NY 12205', phone: '518 555 0142', county: 'Albany', zone: 'America/New_York', registration: { number: '09914', kind: 'Pesticide business registration' } },
  CA: { name: 'Sacramento', address: '1180 Levee Street, Marrow Bend, CA 95814', phone: '916 555 0118', county: 'Sacramento', zone: 'America/Los_Angeles', registration: { number: 'PR 99118', kind: 'Principal registration, branch 2' } },
  TX: { name: 'Austin', address: '77 Cedar Cut Road, Pale Creek, TX 78701', phone: '512 555 0177', county: 'Travis', zone: 'America/Chicago', registration: { number: '0990177', kind: 'Structural pest control business license' } },
}

export interface PersonPlan {
  key: string, name: string, roles: { role: Exclude<Role, 'customer'>, branch: BranchKey | null }[]
  /** `days`: it ends so many days after the day the demonstration is made. */
  licences: { region: BranchKey, number: string, className: string, categories: string[], days: number }[]
  /** Works in the field; `under`: always under this person's supervision. `share`: of the working days. */
  field?: { branch: BranchKey, under?: string, share: number }
  account?: string
}

const at = (role: 'officer' | 'applicator', ...branches: BranchKey[]) => branches.map(branch => ({ role, branch }))
const NY_APPLICATOR = 'Certified commercial applicator'
const CA_FIELD = 'Field representative, branch 2'
const TX_CERTIFIED = 'Certified applicator, structural'

export const PEOPLE: PersonPlan[] = [
  { key: 'owner', name: 'Rowan Alder', roles: [{ role: 'owner', branch: null }], account: 'owner@alder-wick.example', licences: [{ region: 'NY', number: 'C5-990102', className: NY_APPLICATOR, categories: ['3A', '7A'], days: 620 }] },
  { key: 'officer', name: 'Maren Okafor', roles: at('officer', 'NY', 'CA', 'TX'), account: 'officer@alder-wick.example', licences: [] },
  { key: 'officer-ca', name: 'Noor Aldana', roles: at('officer', 'CA'), licences: [{ region: 'CA', number: 'OPR 99021', className: 'Operator, branch 2', categories: ['2', '3'], days: 410 }] },
  { key: 'officer-tx', name: 'Hattie Coyle', roles: at('officer', 'TX'), licences: [{ region: 'TX', number: '0991207', className: TX_CERTIFIED, categories: ['Pest', 'Lawn and ornamental'], days: 300 }] },
  { key: 'tomas', name: 'Tomás Nguyễn', roles: at('applicator', 'NY'), account: 'applicator@alder-wick.example', field: { branch: 'NY', share: 0.92 }, licences: [{ region: 'NY', number: 'C5-990117', className: NY_APPLICATOR, categories: ['3A', '7A'], days: 505 }] },
  { key: 'della', name: 'Della Prewitt', roles: at('applicator', 'NY'), field: { branch: 'NY', share: 0.9 }, licences: [{ region: 'NY', number: 'C5-990131', className: NY_APPLICATOR, categories: ['7A', '8'], days: 38 }] },
  { key: 'jonah', name: 'Jonah Teague', roles: at('applicator', 'NY'), account: 'technician@alder-wick.example', field: { branch: 'NY', under: 'tomas', share: 0.6 }, licences: [] },
  { key: 'ansel', name: 'Ansel Brack', roles: at('applicator', 'NY'), account: 'owner@second-firm.example', field: { branch: 'NY', share: 0.25 }, licences: [{ region: 'NY', number: 'C5-990158', className: NY_APPLICATOR, categories: ['3A'], days: 700 }] },
  { key: 'priya', name: 'Priya Sandoval', roles: at('applicator', 'CA'), field: { branch: 'CA', share: 0.92 }, licences: [{ region: 'CA', number: 'FR 99310', className: CA_FIELD, categories: ['2'], days: 455 }] },
  { key: 'wes', name: 'Wes Harlan', roles: at('applicator', 'CA'), field: { branch: 'CA', share: 0.9 }, licences: [{ region: 'CA', number: 'QAL 99127', className: 'Qualified applicator license', categories: ['A', 'B', 'D'], days: 365 }] },
  { key: 'lucia', name: 'Lucía Ferrer', roles: at('applicator', 'CA'), field: { branch: 'CA', share: 0.88 }, licences: [{ region: 'CA', number: 'FR 99344', className: CA_FIELD, categories: ['2', '3'], days: 240 }] },
  { key: 'cody', name: 'Cody Marsh', roles: at('applicator', 'TX'), field: { branch: 'TX', share: 0.92 }, licences: [{ region: 'TX', number: '0991311', className: TX_CERTIFIED, categories: ['Pest', 'Lawn and ornamental'], days: 330 }] },
  { key: 'bea', name: 'Bea Thornquist', roles: at('applicator', 'TX'), field: { branch: 'TX', share: 0.9 }, licences: [{ region: 'TX', number: '0991342', className: 'Commercial applicator, agricultural', categories: ['1A', '3A'], days: 520 }] },
  { key: 'rafael', name: 'Rafael Ibarra', roles: at('applicator', 'TX'), field: { branch: 'TX', under: 'cody', share: 0.88 }, licences: [{ region: 'TX', number: '0991377', className: 'Technician', categories: ['Pest'], days: 190 }] },
]

export const EQUIPMENT: { kind: EquipmentKind, name: string }[] = [
  { kind: 'backpack-sprayer', name: 'Backpack 1' }, { kind: 'backpack-sprayer', name: 'Backpack 2' }, { kind: 'power-sprayer', name: 'Truck tank 1' }, { kind: 'hand-sprayer', name: 'Hand can 1' }, { kind: 'spreader', name: 'Spreader 1' },
  { kind: 'bait-gun', name: 'Bait gun 1' }, { kind: 'hand-duster', name: 'Duster 1' }, { kind: 'boom-sprayer', name: 'Boom 1' }, { kind: 'mist-blower', name: 'Mist blower 1' },
]
