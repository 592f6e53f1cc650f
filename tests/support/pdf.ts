import { execFileSync } from 'node:child_process'
import { readFileSync, writeFileSync, mkdtempSync, rmSync } from 'node:fs'
import { createRequire } from 'node:module'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import type { Report } from '#server/reports/draw'
import { drawReport, useFonts } from '#server/reports/draw'

const { resolve } = createRequire(import.meta.url)
const font = (name: string) => readFileSync(resolve(`source-sans/TTF/SourceSans3-${name}.ttf`))
let ready = false

/** Draws as the worker does, with the same fonts. */
export function draw(report: Report): Promise<Uint8Array> {
  if (!ready) useFonts({ regular: font('Regular'), semibold: font('Semibold'), italic: font('It') })
  ready = true
  return drawReport(report)
}

function withFile<T>(bytes: Uint8Array, work: (path: string) => T): T {
  const base = mkdtempSync(join(tmpdir(), 'tankside-pdf-'))
  try {
    const path = join(base, 'file.pdf')
    writeFileSync(path, bytes)
    return work(path)
  }
  finally {
    rmSync(base, { recursive: true })
  }
}

/** The words of a PDF as poppler's pdftotext reads them, in the order of the page, spaces and breaks folded. */
export const pdfText = (bytes: Uint8Array): string => withFile(bytes, path => execFileSync('pdftotext', ['-layout', path, '-'], { encoding: 'utf8' })).replace(/\s+/g, ' ')
/** Number of pages, as poppler's pdfinfo counts them. */
export const pdfPages = (bytes: Uint8Array): number => Number(/^Pages:\s+(\d+)/m.exec(withFile(bytes, path => execFileSync('pdfinfo', [path], { encoding: 'utf8' })))?.[1])
