import type { Actor } from '#shared/access/abilities'
import { toHex } from '#shared/ledger/hash'
import type { EntrySubmission } from '#shared/records/entry'
import { submissionHash } from '#shared/records/projection'
import type { VisitSubmission } from '#shared/records/visit'
import { acknowledge, amendEntry, strikeEntry } from '#server/services/change-entry'
import type { FirmFile, World } from '#server/services/house'
import { judgeEntry, signMix, signVisit } from '#server/services/sign-visit'
import type { Signing } from '#server/services/sign-visit'
import { personOf } from './book'
import type { Book } from './book'
import type { PlannedEvent } from './events'
import type { FirmPlan } from './plan'

/** The clock stands where the plan sets it; randomness is the plan's, so that ids and salts come out the same. Never outside a demonstration. */
export interface PlanWorld extends World { set: (at: number) => void }

export function planWorld(at: number, random: World['random']): PlanWorld {
  let now = at
  return { now: () => new Date(now), random, set: (to) => { now = to } }
}

/** So many events share one commit: each alone would wait for the disk thousands of times. Services' own transactions nest as savepoints. */
const AT_ONCE = 200

export function actorIn(file: FirmFile, book: Book, key: string): Actor {
  const { id, name, plan } = personOf(book, key)
  return { accountId: id, membershipId: id, firmId: file.id, firmSlug: file.slug, name, subject: { kind: 'person', id }, roles: plan.roles.map(({ role, branch }) => ({ role, branchId: branch ? book.branches[branch]?.id ?? null : null })) }
}

/** The findings that were on the screen at signing: the same checks, on the books as they are. */
function withSeen(file: FirmFile, entry: EntrySubmission): EntrySubmission {
  const { findings } = judgeEntry(file, entry, entry.words.deviceNow, 'facts')
  return { ...entry, words: { ...entry.words, seen: findings.map(({ check, message, outcome, line }) => ({ check, message, outcome, line })) } }
}

function readyToSign(file: FirmFile, submission: VisitSubmission): VisitSubmission {
  const entries = submission.entries.map(entry => withSeen(file, entry))
  const { facts, words } = submission.visit
  return { ...submission, entries, visit: { words, facts: { ...facts, entries: entries.map(entry => ({ id: entry.facts.id, hash: toHex(submissionHash(entry)) })) } } }
}

function carryOutOne(signing: Signing, event: PlannedEvent): void {
  switch (event.kind) {
    case 'visit': return void signVisit(signing, readyToSign(signing.file, event.submission))
    case 'mix': return void signMix(signing, event.submission)
    case 'amend': return void amendEntry(signing, event.amendment.amends.root, { ...event.amendment, ...withSeen(signing.file, event.amendment) })
    case 'strike': return void strikeEntry(signing, event.strike.facts.root, event.strike)
    case 'acknowledge': return void acknowledge(signing, event.acknowledgement.facts.root, event.acknowledgement)
  }
}

/** Everything of a plan through the services that the program's routes call, in the order in which it was received. */
export function carryOut(file: FirmFile, world: PlanWorld, { book, events }: FirmPlan, progress: (done: number, of: number) => void = () => undefined): void {
  const actors = new Map([...book.people.keys()].map(key => [key, actorIn(file, book, key)]))
  for (let from = 0; from < events.length; from += AT_ONCE) {
    file.raw.transaction(() => {
      for (const event of events.slice(from, from + AT_ONCE)) {
        const actor = actors.get(event.who)
        if (!actor) throw new Error(`nobody is called ${event.who}`)
        // a signing takes a moment: seconds are not all zero in a real ledger either
        world.set(event.at + 4000)
        carryOutOne({ file, actor, world }, event)
      }
    }).immediate()
    progress(Math.min(from + AT_ONCE, events.length), events.length)
  }
}
