/** A record in ready words, section by section, as the paper shows it. */
export interface RecordRow { label: string, lines: string[] }
export interface RecordTable {
  heads: string[]
  /** Share of the width by column. */
  widths: number[]
  /** A cell is its lines; the first of a row's first cell is set strong. */
  rows: string[][][]
}
export interface RecordFinding { outcome: 'stop' | 'query' | 'note', word: string, lines: string[] }
export type RecordSection = { title: string, lines?: string[] } & (
  { kind: 'rows', rows: RecordRow[] } | { kind: 'table', table: RecordTable } | { kind: 'findings', findings: RecordFinding[] } | { kind: 'history', steps: { at: string, who: string, differences: string[] }[] }
)
export interface RecordModel {
  language: string
  paper: 'LETTER' | 'A4'
  /** When what it shows was complete: also the file's own date, so that the same record gives the same bytes. */
  createdAt: string
  title: string
  reference: string
  hash: string
  place: string
  when: string
  standing: { word: string, struck: boolean, plain: boolean }
  /** What is looked for first, in large type: who is responsible, on which licence. */
  key: { label: string, value: string, beside: string }[]
  sections: RecordSection[]
  cautions: string[]
  foot: string
  /** `page {page} of {pages}`, filled in while drawing. */
  page: string
}
/** Paper is letter size where it is the country's usual size, A4 everywhere else (ISO 216 and its exceptions: common knowledge, no source). */
export const paperOf = (country: string): RecordModel['paper'] => ['US', 'CA', 'MX'].includes(country) ? 'LETTER' : 'A4'
