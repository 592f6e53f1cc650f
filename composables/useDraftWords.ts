import type { Draft, DraftReading, DraftTreatment } from '#shared/records/draft'
import { isIndoors, isTaken } from '#shared/records/draft'
import { amountByCount, isQuantity, quantityOr } from '#shared/records/draft-figures'
import { protectiveOf, reentryOf } from '#shared/records/draft-label'
import type { Refer } from '#shared/records/shapes'
import type { Books } from '#shared/records/snapshot'

/** The folded lines of the form: what was answered, as an answer. Empty text: nothing yet. */
export function useDraftWords(books: Ref<Books>) {
  const { t } = useI18n()
  const format = useFormat()
  const words = useCatalogues()
  const list = (parts: (string | null | undefined | false)[]) => parts.filter(Boolean).join(' · ')

  const named = (refer: Refer | null, known: (id: string) => { name: string } | undefined): string => !refer ? '' : 'read' in refer ? refer.read.name : known(refer.id)?.name ?? ''
  const productOf = (line: DraftTreatment['lines'][number]) => {
    const label = line.labelVersionId ? books.value.label(line.labelVersionId) : undefined
    return label ? books.value.product(label.productId) : line.product && 'id' in line.product ? books.value.product(line.product.id) : undefined
  }
  const productName = (line: DraftTreatment['lines'][number]): string => productOf(line)?.name ?? named(line.product, () => undefined)

  const products = (treatment: DraftTreatment): string => treatment.mixId
    ? t('visit.what.fromTank', { products: (books.value.mix(treatment.mixId)?.lines ?? []).map(line => line.product.name).join(' + ') })
    : treatment.lines.map(productName).join(' + ')
  const what = (treatment: DraftTreatment): string => list([
    treatment.lines.map(line => productOf(line)?.number).filter(Boolean).join(', '), treatment.targets.map(target => target.text.toLowerCase()).join(', '), treatment.method?.text.toLowerCase(),
    named(treatment.equipment, books.value.equipment),
  ])
  function much(treatment: DraftTreatment): string {
    const amounts = treatment.lines.map(line => amountByCount(line) ?? quantityOr(line.amount)).map(amount => amount && format.quantity(amount))
    return list([
      treatment.mixId && isQuantity(treatment.drawn) && t('visit.much.drawn', { amount: format.quantity(treatment.drawn) }),
      isQuantity(treatment.finished) && t('visit.much.finishedShort', { amount: format.quantity(treatment.finished) }),
      amounts.some(Boolean) && t('visit.much.productShort', { amount: amounts.filter(Boolean).join(' + ') }),
      treatment.areas.map(area => isQuantity(area.size) ? `${area.place.text} ${format.quantity(area.size)}` : area.place.text).join(', '),
    ])
  }
  const reading = (r: DraftReading): string => words.reading({
    temperature: quantityOr(r.temperature), humidity: r.humidity || null, sky: r.sky,
    wind: r.wind === 'calm' ? { calm: true } : r.wind === 'blowing' && isQuantity(r.speed) ? { speed: { value: r.speed.value, unit: r.speed.unit }, from: (r.from ?? null) as never } : null,
  })
  function weather(draft: Draft): string {
    if (draft.noWeather) return words.noWeather[draft.noWeather] ?? ''
    const taken = draft.weather.filter(isTaken)
    if (taken.length > 0) return taken.map(reading).join('; ')
    return draft.treatments.length > 0 && draft.treatments.every(isIndoors) ? words.noWeather.indoors ?? '' : ''
  }
  const keepOff = (treatment: DraftTreatment): string => words.reentry(reentryOf(treatment, books.value))
  const worn = (treatment: DraftTreatment): string => protectiveOf(treatment, books.value).map(one => one.text).join(', ')
  const people = (draft: Draft): string => draft.people.map(p => named(p.person, books.value.person)).join(', ')
  const times = (draft: Draft): string => list([
    draft.arrived?.at && t('visit.times.arrivedAt', { time: format.time(draft.arrived.at, draft.zone) }), draft.left?.at && t('visit.times.leftAt', { time: format.time(draft.left.at, draft.zone) }),
  ])
  return { named, productOf, productName, products, what, much, reading, weather, keepOff, worn, people, times }
}
