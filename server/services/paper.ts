import type { Actor } from '#shared/access/abilities'
import { entryScope, fieldClass } from '#shared/access/abilities'
import { AppError } from '#shared/errors'
import { NoticeStopped } from '#shared/notices/notice'
import { recordModel } from '#shared/reports/record'
import { mayReadEntry } from '#server/database/firm/repositories/heads'
import { leavesOf } from '#server/database/firm/repositories/leaves'
import type { Report } from '#server/reports/draw'
import type { FirmFile } from '#server/services/house'
import { findNotice, modelOf, noticeFileName, noticeReport } from '#server/services/notices'
import { words } from '#server/words/words'

type Draw = (report: Report) => Promise<Uint8Array>
interface Paper { bytes: Uint8Array, name: string }

/** An entry with its history, for somebody who may see it. @throws AppError not-found */
export async function drawRecord(file: FirmFile, actor: Actor, root: string, draw: Draw): Promise<Paper> {
  const leaves = leavesOf(file.raw, root)
  if (leaves[0]?.kind !== 'application' || !mayReadEntry(file.raw, root, entryScope(actor))) throw new AppError('not-found')
  const model = recordModel(leaves, words, fieldClass(actor) === 'firm')
  return { bytes: await draw({ kind: 'record', model }), name: words('paper.record.file', { reference: model.reference }) }
}

/** A notice as it will look on paper. @throws AppError not-found, notice-stopped */
export async function drawNotice(file: FirmFile, actor: Actor, id: string, draw: Draw): Promise<Paper> {
  const notice = findNotice(file, actor, id)
  try {
    const model = modelOf(file, notice)
    return { bytes: await draw(noticeReport(notice, model)), name: noticeFileName(model) }
  }
  catch (error) {
    if (error instanceof NoticeStopped) throw new AppError('notice-stopped', [], { reason: error.reason })
    throw error
  }
}
