import { plusDays } from '#shared/time/days'
import { checkRegistrationNumber } from '#shared/registration/number'
import { splitRateUnit } from '#shared/units/rate'
import type { BranchKey } from '../demo/people'
import type { ProductPlan, UsePlan } from '../demo/products'
import type { BookRows } from './books'
import { coded } from './coded'
import type { MakeId } from './ids'

export interface LabelSpan { id: string, from: string, to: string | null, reentry: ProductPlan['reentry'], protective: ProductPlan['protective'] }

/** The registration's number as one state writes it: its own for a special local need, else the federal one. */
const basicOf = ({ kind, number }: ProductPlan): string | null => {
  const checked = checkRegistrationNumber({ kind, number, state: kind === 'special-local-need' ? number?.slice(0, 2) ?? null : null })
  if (!checked.ok) throw new Error(`${number ?? ''}: ${checked.reason}`)
  return checked.basic
}

export interface ProductSpan { since: string, day: string, states: readonly BranchKey[], endedIn: (state: BranchKey) => string | null }

/** Adds a product with its registrations and label versions. @returns its id and the versions by time. */
export function addProduct(rows: BookRows, makeId: MakeId, plan: ProductPlan, span: ProductSpan): { id: string, labels: LabelSpan[] } {
  const id = makeId()
  const { since, day } = span
  rows.product.push({ id, name: plan.name, kind: plan.kind, number: plan.number, number_region: plan.kind === 'special-local-need' ? plan.number?.slice(0, 2) ?? null : null, number_basic: basicOf(plan), registrant: 'Demonstration registrant (invented)', form: plan.form, signal_word: plan.signal, restricted_use: plan.restricted ? 1 : 0, demo: 1, retired_on: null })
  plan.ingredients.forEach(([name, percent], n) => rows.product_ingredient.push({ product_id: id, n, name, percent }))
  for (const region of plan.states ?? span.states) rows.product_registration.push({ id: makeId(), product_id: id, region, number: null, from_day: since, to_day: span.endedIn(region) })
  const changed = plan.newer ? plusDays(day, -plan.newer.days) : null
  const labels = [addLabel(rows, makeId, plan, { productId: id, from: since, to: changed ? plusDays(changed, -1) : null, uses: plan.uses })]
  if (plan.newer && changed) {
    const { max, words } = plan.newer
    labels.push(addLabel(rows, makeId, plan, { productId: id, from: changed, to: null, uses: plan.uses.map(use => use.limit ? { ...use, limit: { ...use.limit, max, words } } : use) }))
  }
  return { id, labels }
}

function addLabel(rows: BookRows, makeId: MakeId, plan: ProductPlan, { productId, from, to, uses }: { productId: string, from: string, to: string | null, uses: UsePlan[] }): LabelSpan {
  const id = makeId()
  rows.label_version.push({
    id, product_id: productId, label_date: plusDays(from, -30), from_day: from, to_day: to, checked: plan.unchecked ? 0 : 1, reentry: JSON.stringify(plan.reentry),
    protective: JSON.stringify(plan.protective.map(coded.protective)), cautions: plan.cautions, recorded_at: `${plusDays(from, -3)}T16:00:00.000Z`,
  })
  uses.forEach((use, n) => {
    const useId = makeId()
    rows.label_use.push({ id: useId, label_version_id: id, n, sites: JSON.stringify(use.sites ?? []), targets: JSON.stringify(use.targets ?? []), methods: JSON.stringify(use.methods) })
    if (!use.limit) return
    const { unit, per } = splitRateUnit(use.limit.unit)
    rows.label_limit.push({ id: makeId(), label_use_id: useId, n: 0, of_what: 'product', unit, per: per ?? 'nothing', over_time: 'application', min: use.limit.min, max: use.limit.max, where_used: null, words: use.limit.words })
  })
  return { id, from, to, reentry: plan.reentry, protective: plan.protective }
}
