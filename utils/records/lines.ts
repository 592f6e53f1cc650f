import { decimalsOf, div, mul, toDecimal } from '#shared/units/decimal'
import { toRational } from '#shared/units/quantity'
import type { Quantity } from '#shared/units/quantity'
import type { EntryFacts, EntryLine } from '#shared/records/entry'
import type { EntrySnapshot, SnapshotLine } from '#shared/records/snapshot'

/** A product of an entry with its amount: as noted, or (`share`) its part of the mix, shown with one digit more than the mix's. */
export interface LineInUse { shot: SnapshotLine, line: EntryLine | null, amount: Quantity | null, share: boolean }

/** The products of an entry, whether it names them or draws from a mix: amount of each = the mix's amount × drawn ÷ finished, exact, then rounded once. */
export function linesInUse(facts: Pick<EntryFacts, 'lines' | 'drawn'>, snapshot: Pick<EntrySnapshot, 'lines' | 'mix'>): LineInUse[] {
  const { mix } = snapshot
  if (!mix) return facts.lines.flatMap((line, n) => snapshot.lines[n] ? [{ shot: snapshot.lines[n], line, amount: line.amount, share: false }] : [])
  return mix.lines.map(({ product, label, amount }) => {
    const drawn = facts.drawn ? mul(toRational(amount), div(toRational(facts.drawn, mix.finished.unit), toRational(mix.finished))) : null
    return { shot: { product, label }, line: null, share: true, amount: drawn ? { value: toDecimal(drawn, decimalsOf(amount.value) + 1), unit: amount.unit } : null }
  })
}
