import { readFileSync } from 'node:fs'
import { createRequire } from 'node:module'
import { DemoMailbox, demoTransport } from '#server/mail/demo-mailbox'
import { drawReport, useFonts } from '#server/reports/draw'
import { newId } from '#server/services/house'
import type { FirmFile } from '#server/services/house'
import { releaseNotice, tellOnPaper } from '#server/services/release-notices'
import { sendNextNotice } from '#server/services/send-notices'
import { actorIn } from './carry-out'
import type { PlanWorld } from './carry-out'
import type { FirmPlan } from './plan'

const DAY = 86_400_000
/** Days for which notices still wait for the office, and how many of those before it let go at the end of the plan: each takes a moment to draw. */
const WAITING_DAYS = 4
const TOLD = 10
const SECONDS_EACH = 20_000

interface Telling { file: FirmFile, world: PlanWorld, plan: FirmPlan, dataDir: string }
interface Waiting { id: string, planned_at: string, channel: 'mail' | 'paper' }
export interface NoticesMade { settled: number, told: number, waiting: number }

/** What became of the notices that the visits planned: the oldest settled, some told through the program's own services, the latest still waiting. */
export async function dealWithNotices(telling: Telling): Promise<NoticesMade> {
  const { file, world, plan } = telling
  world.set(plan.until)
  const old = file.raw.prepare<[string], Waiting>('select id, planned_at, channel from notice where state = \'planned\' and planned_at < ? order by planned_at, id').all(new Date(plan.until - WAITING_DAYS * DAY).toISOString())
  const told = old.splice(-TOLD)
  settle(telling, old)
  await tell(telling, told)
  const { waiting } = file.raw.prepare('select count(*) waiting from notice where state = \'planned\'').get() as { waiting: number }
  return { settled: old.length, told: told.length, waiting }
}

/**
 * The demonstration's own past: nobody was mailed in those eighteen months, and drawing some six thousand pages would take minutes. So every notice
 * but the last ones is written down as handed over with the remark "demonstration", without paper and without a leaf, and nothing of them waits
 * to be sent. No service does this: it is no part of the program.
 */
function settle({ file: { raw }, world }: Telling, old: readonly Waiting[]): void {
  raw.transaction(() => {
    const event = raw.prepare('insert into notice_event (id, notice_id, at, what, by_person, detail) values (?, ?, ?, \'handed-over\', null, \'demonstration\')')
    const unsent = raw.prepare('delete from outbox where notice_id = ?')
    const state = raw.prepare('update notice set state = \'handed-over\' where id = ?')
    for (const { id, planned_at } of old) {
      event.run(newId(world), id, planned_at)
      unsent.run(id)
      state.run(id)
    }
  }).immediate()
}

function loadFonts(): void {
  const { resolve } = createRequire(import.meta.url)
  const font = (name: string) => readFileSync(resolve(`source-sans/TTF/SourceSans3-${name}.ttf`))
  useFonts({ regular: font('Regular'), semibold: font('Semibold'), italic: font('It') })
}

/** The office lets the last of them go: by mail, over SMTP into the demonstration's own mailbox, where there is an address; else on paper. */
async function tell({ file, world, plan, dataDir }: Telling, notices: readonly Waiting[]): Promise<void> {
  if (notices.length === 0) return
  loadFonts()
  const releasing = { file, world, actor: actorIn(file, plan.book, plan.office) }
  let mails = 0
  const transport = await demoTransport(new DemoMailbox(dataDir), () => `${world.now().toISOString().replace(/\D/g, '')}-${plan.slug}-${++mails}`)
  try {
    for (const [n, { id, channel }] of notices.entries()) {
      world.set(plan.until + n * SECONDS_EACH)
      if (channel === 'paper') {
        await tellOnPaper(releasing, id, 'handed-over', drawReport)
        continue
      }
      releaseNotice(releasing, id)
      await sendNextNotice({ file, world, transport, draw: drawReport })
    }
  }
  finally {
    await transport.close()
  }
}
