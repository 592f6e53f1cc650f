import type { InjectionKey } from 'vue'
import type { Kit } from '#shared/books/kit'
import type { Finding } from '#shared/checks/finding'
import { assess } from '#shared/checks/assess'
import { uuidv7 } from '#shared/ledger/ids'
import type { Draft, DraftTreatment } from '#shared/records/draft'
import { factsOf } from '#shared/records/draft-submission'
import { referId } from '#shared/records/shapes'
import type { Books } from '#shared/records/snapshot'
import { NotInBook, snapshotEntry } from '#shared/records/snapshot'
import { inZone, localDay } from '#shared/time/zoned'

/** An id of version 7, made on the device. */
export const newRecordId = (): string => uuidv7(Date.now(), crypto.getRandomValues(new Uint8Array(10)))

/** What the groups of the form share: the draft that they write on, the kit, which group is open. */
export interface VisitForm {
  draft: Draft
  kit: Ref<Kit>
  books: Ref<Books>
  open: Ref<string | null>
  /** Opens the group that comes after, or the first that has nothing yet. */
  next: () => void
  now: () => string
  findings: (treatment: DraftTreatment) => Finding[]
  error: (path: string) => string | undefined
}

const KEY: InjectionKey<VisitForm> = Symbol('visit form')
export const provideVisitForm = (form: VisitForm) => provide(KEY, form)
export function useVisitForm(): VisitForm {
  const form = inject(KEY)
  if (!form) throw new Error('a group of the visit form stands outside it')
  return form
}

/** The clock, as whole seconds on the place's clock. */
export const clockIn = (zone: string): string => inZone(new Date().toISOString(), zone)

/** The five checks on one treatment as it stands, on the device. A reference that the kit does not know (a kit from before) leaves them undone. */
export function findingsOf(draft: Draft, treatment: DraftTreatment, books: Books): Finding[] {
  if (!draft.branchId || !draft.place) return []
  const now = clockIn(draft.zone)
  const facts = factsOf(draft, treatment, { books, now, language: 'en' })
  const day = localDay(facts.finishedAt, facts.zone)
  try {
    return assess({ facts, words: { deviceNow: now }, snapshot: snapshotEntry(facts, books, day), day, receivedAt: null })
  }
  catch (error) {
    if (error instanceof NotInBook) return []
    throw error
  }
}

export const placeOf = (draft: Draft, books: Books) => {
  const id = referId(draft.place)
  return id ? books.place(id) : undefined
}
