import words from '../../i18n/locales/en/catalogues.json'
import type { AreaCode, Carrier, EquipmentKind, Method, NothingReason, Prevention, Protective, SiteKind, Target } from '#shared/catalogues/codes'
import type { Coded } from '#shared/records/shapes'

const { catalogues } = words
const code = <C extends string>(list: Record<C, string>) => (key: C): Coded => ({ code: key, text: list[key] })

/** A code with its words as the form shows them. */
export const coded = {
  method: code<Method>(catalogues.methods), area: code<AreaCode>(catalogues.areas), target: code<Target>(catalogues.targets), equipment: code<EquipmentKind>(catalogues.equipmentKinds),
  protective: code<Protective>(catalogues.protective), prevention: code<Prevention>(catalogues.prevention), site: code<SiteKind>(catalogues.siteKinds), nothing: code<NothingReason>(catalogues.nothingReasons), carrier: code<Carrier>(catalogues.carriers),
}
