import { readFileSync } from 'node:fs'
import { parentPort } from 'node:worker_threads'
import regular from 'source-sans/TTF/SourceSans3-Regular.ttf?asset-file'
import semibold from 'source-sans/TTF/SourceSans3-Semibold.ttf?asset-file'
import italic from 'source-sans/TTF/SourceSans3-It.ttf?asset-file'
import { drawReport, useFonts } from '#server/reports/draw'
import type { Report } from '#server/reports/draw'

const read = (url: string) => readFileSync(new URL(url))
useFonts({ regular: read(regular), semibold: read(semibold), italic: read(italic) })

parentPort?.on('message', ({ job, report }: { job: number, report: Report }) => {
  drawReport(report).then(
    bytes => parentPort?.postMessage({ job, bytes }, [bytes.buffer as ArrayBuffer]),
    (error: unknown) => parentPort?.postMessage({ job, error: error instanceof Error ? error.message : String(error) }),
  )
})
