import type { Acknowledgement, EntrySubmission } from '#shared/records/entry'
import { plusMinutes } from '#shared/time/zoned'
import type { Maker } from '../builders/visit'
import type { PlannedEvent, VisitEvent } from './events'

const HOUR = 60
const OFFICER = 'officer'
const OWN_REASONS = ['Read the tank gauge again: half a gallon more.', 'Typed the amount for the wrong stop.', 'Area measured again with the wheel.', 'Wind was read, not entered.']
const OFFICER_REASONS = ['Area does not match the plan of the building: 120 sq ft less.', 'Size as measured at the last visit.', 'Customer’s plan shows a smaller bed.']

interface Change { event: VisitEvent, entry: EntrySubmission, who: string, reason: string, after: number }

/** A correction of the area, or of the note taken at the place: the figures of products stay what they were. */
function amended({ makeId }: Maker, { event, entry, who, reason, after }: Change): Extract<PlannedEvent, { kind: 'amend' }> {
  const { zone } = entry.facts
  const deviceNow = plusMinutes(entry.words.deviceNow, after * HOUR, zone)
  const at = Date.parse(deviceNow)
  const areas = entry.facts.areas.map(area => area.size?.unit === 'sq_ft' ? { ...area, size: { ...area.size, value: String(Math.max(10, Math.round(Number(area.size.value) * 0.9))) } } : area)
  const { id: root } = entry.facts
  return { kind: 'amend', at: Math.max(at, event.at + 60_000), who, amendment: {
    facts: { ...entry.facts, id: makeId(at), areas: areas.length > 0 ? areas : entry.facts.areas, advice: 'Keep mulch a hand’s width away from the wall.' },
    words: { ...entry.words, seen: [], deviceNow, given: { ...entry.words.given, areas: 'entered' } }, amends: { root, head: root, reason },
  } }
}

function answer({ makeId }: Maker, change: Extract<PlannedEvent, { kind: 'amend' }>, who: string, says: Acknowledgement['facts']['says'], because: string | null): PlannedEvent {
  const { amends, facts } = change.amendment
  const deviceNow = plusMinutes(change.amendment.words.deviceNow, 5 * HOUR, facts.zone)
  const at = Date.parse(deviceNow)
  return { kind: 'acknowledge', at, who, acknowledgement: { facts: { v: 1, id: makeId(at), root: amends.root, head: facts.id, says, because }, words: { deviceNow } } }
}

/** The rate of a product per area depends on the area: only entries whose rate does not are corrected here. */
const byVolume = (event: VisitEvent) => event.submission.entries.find(entry => entry.facts.mixId === null && entry.words.explanation === null && entry.facts.lines.every(line => line.rate?.unit.endsWith('/gal')))

/**
 * Corrections: now and then by the author; by the officer, whose word is then owed by the author and given (confirmed, once disputed)
 * or still open; one entry struck. `before`: instant after which nothing may happen.
 */
export function changes(maker: Maker, routine: readonly VisitEvent[], before: number): PlannedEvent[] {
  const { dice, makeId } = maker
  const open = routine.flatMap((event) => {
    const entry = byVolume(event)
    return entry && event.at + 40 * 3_600_000 < before ? [{ event, entry }] : []
  }).sort((a, b) => a.event.at - b.event.at)
  const events: PlannedEvent[] = []
  const recent = open.splice(-9)
  for (const { event, entry } of open) {
    if (dice.chance(0.015)) events.push(amended(maker, { event, entry, who: event.who, reason: dice.pick(OWN_REASONS), after: dice.between(1, 20) }))
    else if (dice.chance(0.005)) {
      const change = amended(maker, { event, entry, who: OFFICER, reason: dice.pick(OFFICER_REASONS), after: dice.between(3, 30) })
      events.push(change, answer(maker, change, event.who, 'confirmed', null))
    }
  }
  recent.forEach(({ event, entry }, n) => {
    if (n === 0) events.push(amended(maker, { event, entry, who: event.who, reason: OWN_REASONS[0] ?? '', after: 2 }))
    if (n >= 2 && n <= 6) {
      const change = amended(maker, { event, entry, who: OFFICER, reason: OFFICER_REASONS[n % 3] ?? '', after: 4 })
      events.push(change)
      if (n === 2) events.push(answer(maker, change, event.who, 'confirmed', null))
      if (n === 3) events.push(answer(maker, change, event.who, 'disputed', 'I measured it with the wheel, all four sides. The plan leaves out the porch.'))
    }
    if (n === 8) {
      const deviceNow = plusMinutes(entry.words.deviceNow, 90, entry.facts.zone)
      const at = Date.parse(deviceNow)
      events.push({ kind: 'strike', at, who: event.who, strike: { facts: { v: 1, id: makeId(at), root: entry.facts.id, head: entry.facts.id, reason: 'Entered twice: the same work is on record from the other phone.' }, words: { deviceNow } } })
    }
  })
  return events
}
