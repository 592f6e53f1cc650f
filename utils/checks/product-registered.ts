import type { Check } from '#shared/checks/finding'
import { finding } from '#shared/checks/finding'
import { linesInUse } from '#shared/records/lines'
import type { ProductKind } from '#shared/registration/number'

/** Kinds that a state registers. What is exempt (25(b)), a device or an adjuvant is registered in some states only: until rule packs say where, that is not judged. */
const REGISTERED_BY_STATES: readonly ProductKind[] = ['registered', 'distributor', 'special-local-need', 'state-only']

/** Was each product registered in the place's state on that day? The snapshot holds only registrations in force on it. */
export const productRegistered: Check = ({ facts, snapshot }) => linesInUse(facts, snapshot).flatMap(({ shot: { product } }, line) => {
  const params = { product: product.name, region: snapshot.place.region }
  if (product.id === null) return [finding('product-registered', 'query', 'product-as-read', { params, line })]
  if (!REGISTERED_BY_STATES.includes(product.kind)) return []
  if (product.registrations.some(r => r.region === snapshot.place.region)) return []
  return [finding('product-registered', 'stop', 'product-not-registered', { params, line, value: product.number })]
})
