import type { Check } from '#shared/checks/finding'
import { finding } from '#shared/checks/finding'
import { linesInUse } from '#shared/records/lines'

/**
 * What a record of an application commonly must have, wherever the place is (the list that federal and most state texts share:
 * product, number, amount, area, target, method, weather outdoors). Until rule packs say what a jurisdiction asks for, a gap is a query.
 */
export const requiredFields: Check = ({ facts, snapshot }) => {
  const gaps: { message: string, params?: Record<string, string>, line?: number }[] = []
  linesInUse(facts, snapshot).forEach(({ shot, amount }, line) => {
    const params = { product: shot.product.name }
    if (!amount) gaps.push({ message: 'missing-amount', params, line })
    if (!shot.product.number && ['registered', 'distributor', 'special-local-need', 'state-only'].includes(shot.product.kind)) gaps.push({ message: 'missing-number', params, line })
  })
  if (facts.targets.length === 0) gaps.push({ message: 'missing-target' })
  if (facts.areas.length === 0) gaps.push({ message: 'missing-area' })
  if (facts.areas.some(area => area.size === null)) gaps.push({ message: 'missing-area-size' })
  if (facts.weather.length === 0 && facts.noWeather !== 'indoors') gaps.push({ message: 'missing-weather' })
  if (facts.noWeather === 'indoors' && facts.areas.some(area => area.setting === 'outdoors')) gaps.push({ message: 'missing-weather-outdoors' })
  if (facts.weather.length > 0 && facts.weather.every(reading => reading.wind === null)) gaps.push({ message: 'missing-wind' })
  if ('read' in facts.place && !facts.place.read.address) gaps.push({ message: 'missing-address' })
  return gaps.map(gap => finding('required-fields', 'query', gap.message, { params: gap.params ?? {}, line: gap.line ?? null }))
}
