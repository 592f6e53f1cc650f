import type { Actor } from '#shared/access/abilities'
import { branchesFor } from '#shared/access/abilities'
import { AppError } from '#shared/errors'
import { sha256, toHex } from '#shared/ledger/hash'
import { NoticeStopped } from '#shared/notices/notice'
import { noticesIn } from '#server/database/firm/repositories/notices'
import type { NoticeListRow } from '#server/database/firm/repositories/notices'
import { outboxIn } from '#server/database/firm/repositories/outbox'
import type { Report } from '#server/reports/draw'
import type { FirmFile, World } from '#server/services/house'
import { findNotice, modelOf, noticeReport } from '#server/services/notices'
import { addNoticeEvent, appendNoticeLeaf } from '#server/services/send-notices'

export interface Releasing { file: FirmFile, actor: Actor, world: World }

function mine({ file, actor }: Releasing, id: string): NoticeListRow {
  const notice = findNotice(file, actor, id)
  const branches = branchesFor(actor, 'notice.send')
  if (branches !== 'all' && !branches.includes(notice.branch_id)) throw new AppError('not-allowed')
  return notice
}

/** What can't be made can't be let go. @throws AppError notice-stopped */
function mustBeMade(file: FirmFile, notice: NoticeListRow) {
  try {
    return modelOf(file, notice)
  }
  catch (error) {
    if (error instanceof NoticeStopped) throw new AppError('notice-stopped', [], { reason: error.reason })
    throw error
  }
}

/** Lets a notice that waits go by mail. @throws AppError notice-settled where it does not wait. */
export function releaseNotice(releasing: Releasing, id: string): void {
  const { file, actor, world } = releasing
  mustBeMade(file, mine(releasing, id))
  file.raw.transaction(() => {
    const at = world.now().toISOString()
    if (!outboxIn(file.raw).release(id, at)) throw new AppError('notice-settled')
    noticesIn(file.raw).release(id, actor.subject.id, at)
    addNoticeEvent(file, world, id, 'released', actor.subject.id)
  }).immediate()
}

/** Tries a notice again that was given up; the same bytes where it was composed. */
export function retryNotice(releasing: Releasing, id: string): void {
  const { file, actor, world } = releasing
  mine(releasing, id)
  file.raw.transaction(() => {
    if (!outboxIn(file.raw).retry(id, world.now().toISOString())) throw new AppError('notice-settled')
    noticesIn(file.raw).setState(id, 'planned')
    addNoticeEvent(file, world, id, 'tried-again', actor.subject.id)
  }).immediate()
}

/** The paper went out: its bytes are kept, and the first time a leaf says so. A notice that waited to be mailed no longer does. */
export async function tellOnPaper(releasing: Releasing, id: string, channel: 'printed' | 'handed-over', draw: (report: Report) => Promise<Uint8Array>): Promise<void> {
  const { file, actor, world } = releasing
  const notice = mine(releasing, id)
  const pdf = await draw(noticeReport(notice, mustBeMade(file, notice)))
  file.raw.transaction(() => {
    const at = world.now().toISOString()
    noticesIn(file.raw).release(id, actor.subject.id, at)
    noticesIn(file.raw).keepPaper({ notice_id: id, pdf, content_hash: toHex(sha256(pdf)), at })
    const contentHash = noticesIn(file.raw).paper(id)?.content_hash ?? ''
    appendNoticeLeaf(file, world, { ...notice, released_by: notice.released_by ?? actor.subject.id }, { channel, contentHash, messageId: null }, { person: actor.subject.id, name: actor.name })
    if (notice.state === 'planned' || notice.state === 'failed' || notice.state === 'printed') noticesIn(file.raw).setState(id, channel)
    addNoticeEvent(file, world, id, channel, actor.subject.id, contentHash)
  }).immediate()
}
