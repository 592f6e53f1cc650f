import pdfmake from 'pdfmake'
import type { NoticeModel } from '#shared/notices/model'
import type { RecordModel } from '#shared/reports/record-model'
import { noticeDocument } from '#server/reports/notice'
import { recordDocument } from '#server/reports/record'

/** What can be drawn. */
export type Report =
  | { kind: 'record', model: RecordModel }
  | { kind: 'notice', model: NoticeModel, createdAt: string, page: string }

export interface FontFiles { regular: Uint8Array, semibold: Uint8Array, italic: Uint8Array }

// @types/pdfmake knows the browser's half of the library only
const library = pdfmake as typeof pdfmake & { virtualfs: { writeFileSync: (name: string, bytes: Uint8Array) => void } }

/** Puts the fonts into pdfmake's own file system, so that it needs to read nothing: neither a file nor an address that a text might name. */
export function useFonts({ regular, semibold, italic }: FontFiles): void {
  library.virtualfs.writeFileSync('regular.ttf', regular)
  library.virtualfs.writeFileSync('semibold.ttf', semibold)
  library.virtualfs.writeFileSync('italic.ttf', italic)
  library.setFonts({ Sans: { normal: 'regular.ttf', bold: 'semibold.ttf', italics: 'italic.ttf', bolditalics: 'semibold.ttf' } })
  library.setUrlAccessPolicy(() => false)
  library.setLocalAccessPolicy(() => false)
}

/** The same report gives the same bytes. `useFonts` first. */
export async function drawReport(report: Report): Promise<Uint8Array> {
  const document = report.kind === 'record' ? recordDocument(report.model) : noticeDocument(report.model, report)
  return new Uint8Array(await library.createPdf(document).getBuffer())
}
