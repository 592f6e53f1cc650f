import type { EntrySnapshot, SnapshotLine } from '#shared/records/snapshot'
import type { Writing } from '#shared/reports/writing'

type Product = SnapshotLine['product']

/** `EPA Reg. No. 990014-27`, or what stands in its place for products that have none. Null when it was not noted. */
export function numberWords({ kind, number, numberRegion }: Product, { words }: Writing): string | null {
  const none = {
    'minimum-risk': () => words('paper.number.minimumRisk'),
    'adjuvant': () => words('paper.number.adjuvant'),
    'device': () => words('paper.number.device'),
  } as Partial<Record<Product['kind'], () => string>>
  if (!number) return none[kind]?.() ?? null
  const given = { number, region: numberRegion ?? '' }
  const some: Partial<Record<Product['kind'], () => string>> = {
    'special-local-need': () => words('paper.number.specialLocalNeed', given),
    'emergency-exemption': () => words('paper.number.emergencyExemption', given),
    'experimental': () => words('paper.number.experimental', given),
    'state-only': () => words('paper.number.stateOnly', given),
    'adjuvant': () => words('paper.number.adjuvantNumber', given),
    'device': () => words('paper.number.deviceNumber', given),
  }
  return some[kind]?.() ?? words('paper.number.epa', given)
}

export const ingredientWords = ({ ingredients }: Product, { percent }: Writing): string => ingredients.map(i => `${i.name} ${percent(i.percent)}`).join(', ')

/** Invented goods of a demonstration say so wherever they are named. */
export const productName = (product: Product, { words }: Writing): string => product.demo ? words('paper.demoProduct', { name: product.name }) : product.name

export const signalWords = (product: Product, { words }: Writing): string | null => product.signalWord === 'none' ? null : words('paper.signalWord', { word: product.signalWord })

/** `Certified applicator C5-81172 (NY)` */
export const licenceWords = (licence: NonNullable<EntrySnapshot['people'][number]['licence']>, { words }: Writing): string =>
  words('paper.licence', { className: licence.className, number: licence.number, region: licence.region })
