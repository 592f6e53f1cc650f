import { pipeline } from 'node:stream/promises'
import { exportCsv } from '#server/services/export-csv'

export default defineRoute('GET /api/applications/export.csv', async ({ event, file, actor, query, now }) => {
  setResponseHeaders(event, { 'content-type': 'text/csv; charset=utf-8; header=present', 'content-disposition': `attachment; filename="daybook-${file.slug}-${now.toISOString().slice(0, 10)}.csv"` })
  await pipeline(exportCsv(file, actor, query), event.node.res).catch((error: NodeJS.ErrnoException) => {
    if (error.code !== 'ERR_STREAM_PREMATURE_CLOSE') throw error
  })
})
