import type { Acknowledgement, Amendment, EntrySubmission, Strike } from '#shared/records/entry'
import type { MixSubmission, VisitSubmission } from '#shared/records/visit'

interface Event { at: number, who: string }
export type VisitEvent = Event & { kind: 'visit', submission: VisitSubmission }

/** What happens, and when the server receives it. */
export type PlannedEvent =
  | VisitEvent
  | Event & { kind: 'mix', submission: MixSubmission }
  | Event & { kind: 'amend', amendment: Amendment }
  | Event & { kind: 'strike', strike: Strike }
  | Event & { kind: 'acknowledge', acknowledgement: Acknowledgement }

export const visitsIn = (events: readonly PlannedEvent[]): VisitEvent[] => events.filter((event): event is VisitEvent => event.kind === 'visit')
export const entriesIn = (events: readonly PlannedEvent[]): EntrySubmission[] => visitsIn(events).flatMap(event => event.submission.entries)
