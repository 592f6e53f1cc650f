import { drawNotice } from '#server/services/paper'
import { theJobs } from '#server/services/the-jobs'

export default defineRoute('GET /api/notices/:id/notice.pdf', async ({ event, file, actor, params }) => {
  const { bytes, name } = await drawNotice(file, actor, params.id, report => theJobs().pdf.draw(report))
  return sendPdf(event, bytes, name)
})
