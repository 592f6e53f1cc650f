import type { PARTY_ROLES, PLACE_KINDS } from '#shared/books/shapes'
import type { SiteKind } from '#shared/catalogues/codes'
import type { TownPlan } from '../demo/places'
import type { BookRows } from './books'
import { coded } from './coded'
import type { MakeId } from './ids'

export interface MadePlace { id: string, name: string, site: SiteKind, county: string }

export interface PlaceSpec {
  branch: { id: string, region: string, zone: string }, town: TownPlan, kind: (typeof PLACE_KINDS)[number], name: string, street: string, site: SiteKind
  parent?: MadePlace, remark?: string | null
  /** How far from the town's middle, in thousandths of a degree. */
  off?: [north: number, east: number]
}

export function addPlace(rows: BookRows, makeId: MakeId, { branch, town, kind, name, street, site, parent, remark = null, off = [0, 0] }: PlaceSpec): MadePlace {
  const id = makeId()
  const { code, text } = coded.site(site)
  rows.place.push({
    id, parent_id: parent?.id ?? null, branch_id: branch.id, kind, name, address: `${street}, ${town.town}, ${branch.region} ${town.zip}`, town: town.town, county: town.county, region: branch.region, country: 'US', zone: branch.zone,
    lat: Math.round((town.lat + off[0] / 1000) * 1e4) / 1e4, lon: Math.round((town.lon + off[1] / 1000) * 1e4) / 1e4, site_code: code, site_text: text, remark, retired_on: null,
  })
  return { id, name, site, county: town.county }
}

export interface PartySpec { name: string, email: string | null, phone?: string | null, language?: 'en' | 'es' }

export function addParty(rows: BookRows, makeId: MakeId, { name, email, phone = null, language = 'en' }: PartySpec): string {
  const id = makeId()
  rows.party.push({ id, name, email, phone, language })
  return id
}

export function addPartyRole(rows: BookRows, makeId: MakeId, partyId: string, placeId: string, role: (typeof PARTY_ROLES)[number], since: string): void {
  rows.party_role.push({ id: makeId(), party_id: partyId, place_id: placeId, role, from_day: since, to_day: null })
}
