import type { Content, TDocumentDefinitions } from 'pdfmake/interfaces'
import type { NoticeModel } from '#shared/notices/model'
import { paperOf } from '#shared/reports/record-model'
import { INK, INK_2, caps, hanging, rowsOf, sheetOf } from '#server/reports/register'

/** Twelve points: the paper is read at a kitchen table. */
const SIZE = 12

const treatment = ({ reference, hash, heading, rows }: NoticeModel['treatments'][number]): Content => ({
  margin: [0, 10, 0, 0], stack: [hanging(reference, hash), { text: heading, bold: true, fontSize: 13, margin: [0, 0, 0, 2] }, rowsOf(rows, 88)],
})

/** One treatment and the visit's own rows are one table; after several, the visit's rows stand apart. */
function treatments({ treatments: all, rows }: NoticeModel): Content[] {
  const [only] = all
  if (all.length === 1 && only) return [treatment({ ...only, rows: [...only.rows, ...rows] })]
  return [...all.map(treatment), { margin: [0, 10, 0, 0], stack: [rowsOf(rows, 88)] }]
}

/** The notice as a document for pdfmake. @param page `page {page} of {pages}` in the notice's language */
export function noticeDocument(model: NoticeModel, { createdAt, page }: { createdAt: string, page: string }): TDocumentDefinitions {
  return sheetOf({
    paper: paperOf(model.country), language: model.language, title: model.subject, subject: model.title, author: model.firm.name, createdAt, fontSize: SIZE,
    foot: model.firm.name, page, running: model.subject,
    content: [
      caps(model.title),
      { text: model.place, fontSize: 24, bold: true, lineHeight: 1.05 },
      ...(model.address ? [{ text: model.address, color: INK_2 }] : []),
      { text: model.when, color: INK_2 },
      ...model.leads.map((text, n): Content => ({ text, fontSize: 17, bold: true, lineHeight: 1.08, margin: [0, n === 0 ? 9 : 4, 0, 0] })),
      { margin: [0, 8, 0, 0], stack: model.told.map(text => ({ text })) },
      ...treatments(model),
      {
        unbreakable: true, margin: [0, 12, 0, 0],
        table: { widths: ['*'], body: [[{ stack: [{ text: model.emergency.heading, bold: true }, ...model.emergency.lines.map(text => ({ text }))] }]] },
        layout: { hLineWidth: () => 1.6, hLineColor: () => INK, vLineWidth: () => 0, paddingLeft: () => 0, paddingRight: () => 0, paddingTop: () => 6, paddingBottom: () => 6 },
      },
      { unbreakable: true, margin: [0, 9, 0, 0], stack: [{ text: model.cautions.join(' '), color: INK_2 }, { text: `${model.firm.name} · ${model.firm.line}`, color: INK_2, margin: [0, 6, 0, 0] }] },
    ],
  })
}
