import type { PARTY_ROLES, PLACE_KINDS, FORMS } from '#shared/books/shapes'
import type { ProductKind, RegistrationRefusal } from '#shared/registration/number'

/** The words of the books' own lists. */
export function useBookWords() {
  const { t } = useI18n()
  const placeKinds: Record<(typeof PLACE_KINDS)[number], string> = {
    property: t('books.places.kinds.property'), building: t('books.places.kinds.building'), unit: t('books.places.kinds.unit'), room: t('books.places.kinds.room'), farm: t('books.places.kinds.farm'), field: t('books.places.kinds.field'), block: t('books.places.kinds.block'),
  }
  const partyRoles: Record<(typeof PARTY_ROLES)[number], string> = {
    payer: t('books.places.roles.payer'), owner: t('books.places.roles.owner'), manager: t('books.places.roles.manager'), occupant: t('books.places.roles.occupant'), operator: t('books.places.roles.operator'), neighbour: t('books.places.roles.neighbour'), notice: t('books.places.roles.notice'),
  }
  const productKinds: Record<ProductKind, string> = {
    'registered': t('books.shelf.kinds.registered'), 'distributor': t('books.shelf.kinds.distributor'), 'special-local-need': t('books.shelf.kinds.special-local-need'), 'emergency-exemption': t('books.shelf.kinds.emergency-exemption'),
    'experimental': t('books.shelf.kinds.experimental'), 'minimum-risk': t('books.shelf.kinds.minimum-risk'), 'adjuvant': t('books.shelf.kinds.adjuvant'), 'device': t('books.shelf.kinds.device'), 'state-only': t('books.shelf.kinds.state-only'),
  }
  const forms: Record<(typeof FORMS)[number], string> = {
    'concentrate': t('books.shelf.forms.concentrate'), 'ready-to-use': t('books.shelf.forms.ready-to-use'), 'bait': t('books.shelf.forms.bait'), 'dust': t('books.shelf.forms.dust'), 'granule': t('books.shelf.forms.granule'), 'aerosol': t('books.shelf.forms.aerosol'), 'fumigant': t('books.shelf.forms.fumigant'), 'device': t('books.shelf.forms.device'),
  }
  const refusals: Record<RegistrationRefusal, string> = {
    'missing': t('books.number.missing'), 'must-be-empty': t('books.number.must-be-empty'), 'missing-hyphen': t('books.number.missing-hyphen'), 'leading-zero': t('books.number.leading-zero'), 'establishment-number': t('books.number.establishment-number'),
    'file-symbol': t('books.number.file-symbol'), 'letters': t('books.number.letters'), 'characters': t('books.number.characters'), 'too-long': t('books.number.too-long'), 'distributor-needs-three-groups': t('books.number.distributor-needs-three-groups'),
    'registered-takes-two-or-three': t('books.number.registered-takes-two-or-three'), 'sln-form': t('books.number.sln-form'), 'sln-state': t('books.number.sln-state'), 'state-needed': t('books.number.state-needed'),
  }
  return { placeKinds, partyRoles, productKinds, forms, refusals }
}
