import type { Actor } from '#shared/access/abilities'
import { branchesFor, can, entryScope } from '#shared/access/abilities'
import type { TodayList } from '#shared/api/contract/daybook'
import { plusDays } from '#shared/time/days'
import { localDay } from '#shared/time/zoned'
import type { EntryHeadRow } from '#shared/records/rows'
import type { Outcome } from '#shared/checks/finding'
import { readDaybook } from '#server/services/daybook'
import type { FirmFile } from '#server/services/house'
import { placesDue } from '#server/database/firm/repositories/kit-visits'
import * as lists from '#server/database/firm/repositories/today'

const SHOWN = 10
const DUE_WITHIN_DAYS = 14
const LICENCE_WITHIN_DAYS = 90

type Item = TodayList['items'][number]
const list = (name: TodayList['list'], items: Item[], count = items.length): TodayList => ({ list: name, count, items: items.slice(0, SHOWN) })
const RANKED: Record<number, Outcome> = { 1: 'note', 2: 'query', 3: 'stop' }
const entryItem = (head: EntryHeadRow): Item => ({ to: `/daybook/${head.root}`, title: head.place_name, detail: head.product_name ?? head.method_text, on: head.local_day, outcome: RANKED[head.finding_rank] ?? null })

/** What is due, owed and amiss for whoever asks; each item leads to where it is mended. Empty lists are left out. */
export async function readToday(file: FirmFile, actor: Actor, now: Date): Promise<{ lists: TodayList[] }> {
  const made = [...forApplicator(file, actor, now), ...forOffice(file, actor, now)]
  const recent = await readDaybook(file, actor, { sort: '-finishedAt', limit: SHOWN })
  const items = recent.rows.map((row): Item => ({ to: row.kind === 'entry' ? `/daybook/${row.root}` : `/visits/${row.root}`, title: row.place.name, detail: row.lines[0]?.name ?? row.method, on: row.localDay, outcome: null }))
  return { lists: [...made, list('recent', items)].filter(l => l.count > 0) }
}

function forApplicator(file: FirmFile, actor: Actor, now: Date): TodayList[] {
  if (!can(actor, 'visit.sign') || actor.subject.kind !== 'person') return []
  const seen = branchesFor(actor, 'visit.sign')
  const due = placesDue(file.reader, seen, plusDays(now.toISOString().slice(0, 10), DUE_WITHIN_DAYS))
  const names = lists.placeNames(file.reader, due.map(d => d.placeId))
  const word = lists.owedBy(file.reader, actor.subject.id)
  return [
    list('my-word', word.map(entryItem)),
    list('due', due.map(({ placeId, on }) => ({ to: `/visits/new?place=${placeId}`, title: names.get(placeId)?.name ?? '', detail: names.get(placeId)?.address ?? null, on, outcome: null }))),
  ]
}

function forOffice(file: FirmFile, actor: Actor, now: Date): TodayList[] {
  const scope = entryScope(actor)
  if (!can(actor, 'notice.send') || (scope.branches !== 'all' && scope.branches.length === 0)) return []
  const { branches } = scope
  const day = localDay(now.toISOString(), lists.officeZone(file.reader))
  const notices = lists.noticesWaiting(file.reader, branches)
  const notice = (n: lists.WaitingNotice): Item => ({ to: `/notices/${n.id}`, title: n.party_name, detail: n.subject, on: n.planned_at.slice(0, 10), outcome: null })
  const licences = lists.licencesEnding(file.reader, day, plusDays(day, LICENCE_WITHIN_DAYS))
  const heads = (name: TodayList['list'], found: lists.Counted<EntryHeadRow>) => list(name, found.rows.map(entryItem), found.count)
  return [
    heads('without-word', lists.findingsWithoutWord(file.reader, branches)),
    heads('owed', lists.confirmationsOwed(file.reader, branches)),
    heads('late', lists.lateSince(file.reader, branches, plusDays(day, -30))),
    list('notices-failed', notices.failed.rows.map(notice), notices.failed.count),
    list('notices-waiting', notices.waiting.rows.map(notice), notices.waiting.count),
    list('licences', licences.map(l => ({ to: `/people/${l.person_id}`, title: l.name, detail: `${l.region} ${l.number}`, on: l.expires, outcome: l.expires < day ? 'stop' : 'query' }))),
    heads('as-read', lists.writtenAsRead(file.reader, branches)),
  ]
}
