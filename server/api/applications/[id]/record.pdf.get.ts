import { drawRecord } from '#server/services/paper'
import { theJobs } from '#server/services/the-jobs'

export default defineRoute('GET /api/applications/:id/record.pdf', async ({ event, file, actor, params }) => {
  const { bytes, name } = await drawRecord(file, actor, params.id, report => theJobs().pdf.draw(report))
  return sendPdf(event, bytes, name)
})
