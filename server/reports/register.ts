import type { Content, ContentCanvas, ContentTable, CustomTableLayout, TDocumentDefinitions } from 'pdfmake/interfaces'
import { markStrokes } from '#shared/ledger/mark'

/** The register's tokens on paper: the light sheet of the screen. */
export const INK = '#16232B'
export const INK_2 = '#4A5A63'
export const RULE = '#D8D2C4'
export const MARGIN = '#B5483A'
export const STOP = '#A3211B'
export const QUERY = '#8A5A00'

const PAGE = { LETTER: { width: 612, height: 792 }, A4: { width: 595.28, height: 841.89 } }
/** Left of the text stands the margin with its hairline pair; references and marks hang in it. */
export const LEFT = 106
const RIGHT = 46
const TOP = 46
const BOTTOM = 50
const PAIR = 84

/** Word of a head or a row: small capitals, as on screen. */
export const caps = (text: string): Content => ({ text, fontFeatures: ['smcp', 'c2sc', 'lnum'], characterSpacing: 0.5, bold: true, color: INK_2, fontSize: 10.5 })

/** The mark as upright strokes, one to four steps high, from the first 32 bits of the hash. */
const mark = (hash: string, scale: number): ContentCanvas => ({
  canvas: markStrokes(hash).map((height, i) => ({ type: 'rect', x: i * 3 * scale, y: (4 - height) * 3 * scale, w: 2 * scale, h: height * 3 * scale, color: INK })),
})

/** A reference with its mark, hanging in the margin beside what follows. */
export const hanging = (reference: string, hash: string): Content => {
  const [day = '', short = ''] = reference.split('-')
  // nothing of its own height: the text beside it starts on the same line
  return {
    relativePosition: { x: 18 - LEFT, y: 1 },
    stack: [
      { columns: [{ width: PAIR - 26, alignment: 'right', fontSize: 8.5, color: INK, text: [`${day}-\n`, { text: short, bold: true }], lineHeight: 1.1 }] },
      { ...mark(hash, 1), margin: [11, 2, 0, 0] },
    ],
  }
}

const ruled = (first: number, inner: number): CustomTableLayout => ({
  hLineWidth: (i, node) => i === 0 ? first : i === node.table.headerRows ? 1.2 : i === node.table.body.length ? 0.5 : inner,
  hLineColor: (i, node) => i === node.table.headerRows && i > 0 ? INK : RULE,
  vLineWidth: () => 0,
  paddingLeft: () => 0,
  paddingRight: () => 9,
  paddingTop: i => i === 0 ? 1.5 : 2.5,
  paddingBottom: () => 2,
})

export const stackOf = (lines: readonly string[], strong = false): Content => ({ stack: lines.map((text, n) => ({ text, bold: strong && n === 0 })) })

/** A row of more lines may go on overleaf, or it would leave half a page white. */
const WHOLE = 8

/** Word and value, ruled. */
export const rowsOf = (rows: readonly { label: string, lines: string[] }[], labelWidth = 96): Content => ({
  table: { widths: [labelWidth, '*'], dontBreakRows: rows.every(row => row.lines.length <= WHOLE), body: rows.map(row => [caps(row.label), stackOf(row.lines)]) }, layout: ruled(0.5, 0.5),
})

/** A ruled table: a heavier rule under the head, hairlines between rows. */
export function tableOf({ heads, widths, rows }: { heads: string[], widths: number[], rows: string[][][] }): ContentTable {
  const body = rows.map(row => row.map((cell, n) => stackOf(cell, n === 0)))
  return { table: { headerRows: 1, dontBreakRows: true, keepWithHeaderRows: 1, widths: widths.map(w => `${w}%`), body: [heads.map(caps), ...body] }, layout: ruled(0, 0.5) }
}

export interface Sheet {
  paper: 'LETTER' | 'A4'
  language: string
  title: string
  subject: string
  author: string
  createdAt: string
  fontSize: number
  foot: string
  page: string
  running: string
  content: Content[]
}

/** A sheet of the register: hairline pair down every page, running head from the second page on, page x of y. */
export function sheetOf({ paper, language, title, subject, author, createdAt, fontSize, foot, page, running, content }: Sheet): TDocumentDefinitions {
  const { height } = PAGE[paper]
  const line = (x: number) => ({ type: 'line' as const, x1: x, y1: 0, x2: x, y2: height, lineWidth: 0.5, lineColor: MARGIN })
  return {
    pageSize: paper, pageMargins: [LEFT, TOP, RIGHT, BOTTOM], language, version: '1.7',
    info: { title, subject, author, creator: 'Tankside', producer: 'Tankside', creationDate: new Date(createdAt), modDate: new Date(createdAt) },
    defaultStyle: { font: 'Sans', fontSize, color: INK, lineHeight: 1.12 },
    background: () => ({ canvas: [line(PAIR), line(PAIR + 3.5)] }),
    header: current => current === 1 ? null : { text: running, margin: [LEFT, 24, RIGHT, 0], fontSize: 9, color: INK_2 },
    footer: (current, count) => ({
      margin: [LEFT, 18, RIGHT, 0], fontSize: 9, color: INK_2,
      columns: [{ text: foot, width: '*' }, { text: page.replace('{page}', String(current)).replace('{pages}', String(count)), width: 'auto', alignment: 'right' }],
    }),
    content,
  } as TDocumentDefinitions & { language: string }
}
export const textWidth = (paper: Sheet['paper']): number => PAGE[paper].width - LEFT - RIGHT
