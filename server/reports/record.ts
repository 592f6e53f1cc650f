import type { Column, Content, TDocumentDefinitions } from 'pdfmake/interfaces'
import type { RecordFinding, RecordModel, RecordSection } from '#shared/reports/record-model'
import { INK, INK_2, MARGIN, QUERY, RULE, STOP, caps, hanging, rowsOf, sheetOf, tableOf, textWidth } from '#server/reports/register'

const COLOUR: Record<RecordFinding['outcome'], string> = { stop: STOP, query: QUERY, note: INK_2 }

/** The kind of bar says it again, without colour: solid for a stop, dashed for a query, dotted for a note. */
const bar = (outcome: RecordFinding['outcome']): Column => ({
  width: 8, canvas: [{ type: 'line', x1: 2, y1: 2, x2: 2, y2: 26, lineWidth: outcome === 'stop' ? 3 : 2, lineColor: COLOUR[outcome], ...(outcome === 'stop' ? {} : { dash: outcome === 'query' ? { length: 5, space: 3 } : { length: 1, space: 2 } }) }],
})

const finding = ({ outcome, word, lines: [sentence = '', ...rest] }: RecordFinding): Content => ({
  unbreakable: true, margin: [0, 2, 0, 4],
  columns: [bar(outcome), { width: '*', stack: [{ text: [{ text: `${word}  `, bold: true, color: COLOUR[outcome] }, sentence] }, ...rest.map(text => ({ text, color: INK_2 }))] }],
})

function sectionBody(section: RecordSection): Content {
  switch (section.kind) {
    case 'rows': return rowsOf(section.rows)
    case 'table': return tableOf(section.table)
    case 'findings': return { stack: section.findings.map(finding) }
    case 'history': return {
      stack: section.steps.map(step => ({
        unbreakable: true, margin: [0, 2, 0, 3],
        columns: [{ width: 105, text: step.at, color: INK_2 }, { width: '*', stack: [{ text: step.who }, ...step.differences.map(text => ({ text, margin: [0, 1, 0, 0] as [number, number, number, number] }))] }],
      })),
    }
  }
}

function sectionOf(section: RecordSection): Content {
  // the head of a section never stands alone at the foot of a page
  const few = (section.kind === 'rows' && section.rows.length < 8) || (section.kind === 'table' && section.table.rows.length < 5)
  return { unbreakable: few, margin: [0, 9, 0, 0], stack: [{ text: section.title, fontSize: 12, bold: true, margin: [0, 0, 0, 2], headlineLevel: 1 } as Content, sectionBody(section)] }
}

function keyFacts({ key, standing }: RecordModel): Content {
  return {
    margin: [0, 8, 0, 0],
    table: {
      widths: key.map(() => '*'),
      body: [key.map(({ label, value, beside }) => ({
        stack: [caps(label), { text: value, fontSize: 15, bold: true, ...(standing.struck ? { decoration: 'lineThrough', decorationColor: MARGIN } : {}) }, { text: beside, color: INK_2 }],
      }))],
    },
    layout: { hLineWidth: () => 1.4, hLineColor: () => INK, vLineWidth: () => 0, paddingLeft: () => 0, paddingRight: () => 10, paddingTop: () => 4, paddingBottom: () => 5 },
  }
}

/** The record of one entry as a document for pdfmake; a fresh one each time, since pdfmake changes what it is given. */
export function recordDocument(model: RecordModel): TDocumentDefinitions {
  const width = textWidth(model.paper)
  const standing: Content = { text: model.standing.word, margin: [0, 5, 0, 0], bold: !model.standing.plain, ...(model.standing.struck ? { color: STOP, fontSize: 11.5 } : {}) }
  return sheetOf({
    paper: model.paper, language: model.language, title: `${model.title} ${model.reference}`, subject: model.place, author: model.key[0]?.beside ?? '', createdAt: model.createdAt, fontSize: 9.75,
    foot: model.foot, page: model.page, running: `${model.reference} · ${model.place}`,
    content: [
      hanging(model.reference, model.hash),
      caps(model.title),
      { text: model.place, fontSize: 22, bold: true, lineHeight: 1.05, ...(model.standing.struck ? { decoration: 'lineThrough', decorationColor: MARGIN } : {}) },
      { text: model.when, color: INK_2, fontSize: 11 },
      standing,
      keyFacts(model),
      ...model.sections.map(sectionOf),
      { margin: [0, 12, 0, 0], canvas: [{ type: 'line', x1: 0, y1: 0, x2: width, y2: 0, lineWidth: 0.5, lineColor: RULE }] },
      { unbreakable: true, margin: [0, 5, 0, 0], stack: model.cautions.map(text => ({ text, color: INK_2, margin: [0, 0, 0, 3] as [number, number, number, number] })) },
    ],
  })
}
