import type { EntryFacts } from '#shared/records/entry'
import { localDay, plusMinutes } from '#shared/time/zoned'
import type { Writing } from '#shared/reports/writing'

type Kept = Pick<EntryFacts, 'reentry' | 'finishedAt' | 'zone' | 'areas'>
interface Condition { key: string, alone: string, named: (areas: string) => string, areas: string[] }

const MINUTE = 60_000

/** The end that a label's hours give, counted from the finish and never earlier than they run out: up to the next whole minute. */
export function keepOffUntil(finishedAt: string, hours: string, zone: string): string {
  const wholeMinute = Math.ceil(new Date(finishedAt).getTime() / MINUTE) * MINUTE
  return plusMinutes(new Date(wholeMinute).toISOString(), Math.ceil(Number(hours) * 60), zone)
}

function conditionOf({ reentry, finishedAt, zone, areas }: Kept, write: Writing): Condition {
  const { words } = write
  const at = { key: reentry.until, areas: areas.map(a => a.place.text) }
  switch (reentry.until) {
    case 'dry': return { ...at, alone: words('notices.keepOff.dry'), named: areas => words('notices.keepOff.dryAt', { areas }) }
    case 'dusts-settled': return { ...at, alone: words('notices.keepOff.dusts'), named: areas => words('notices.keepOff.dustsAt', { areas }) }
    case 'ventilated': return { ...at, alone: words('notices.keepOff.ventilated'), named: areas => words('notices.keepOff.ventilatedAt', { areas }) }
    case 'none-stated': return { ...at, alone: words('notices.keepOff.none'), named: areas => words('notices.keepOff.noneAt', { areas }) }
    case 'label': return { ...at, key: `label ${reentry.words}`, alone: words('notices.keepOff.label', { words: reentry.words }), named: areas => words('notices.keepOff.labelAt', { areas, words: reentry.words }) }
    case 'hours': {
      const until = keepOffUntil(finishedAt, reentry.hours, zone)
      const given = { time: write.timeZoned(until, zone), day: write.dayLong(localDay(until, zone)), hours: write.number(reentry.hours) }
      return { ...at, key: `hours ${until}`, alone: words('notices.keepOff.hours', given), named: areas => words('notices.keepOff.hoursAt', { ...given, areas }) }
    }
  }
}

/** One sentence for each condition of the labels, in their own terms; areas are named where conditions differ. No end is ever made up. */
export function keepOffSentences(entries: readonly Kept[], write: Writing): string[] {
  const conditions = new Map<string, Condition>()
  for (const entry of entries) {
    const fresh = conditionOf(entry, write)
    const known = conditions.get(fresh.key)
    conditions.set(fresh.key, known ? { ...known, areas: [...known.areas, ...fresh.areas] } : fresh)
  }
  const all = [...conditions.values()]
  const [only] = all
  if (all.length === 1 && only) return [only.alone]
  return all.map(({ areas, named, alone }) => areas.length > 0 ? named(write.list([...new Set(areas)])) : alone)
}
