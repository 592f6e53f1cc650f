import { mailFile } from '#server/services/demo-mail'
import { theJobs } from '#server/services/the-jobs'

export default defineRoute('GET /api/demo/mailbox/:id/files/:n', async ({ event, params }) => {
  const { bytes, name, type } = await mailFile(theJobs().mailbox, params.id, Number(params.n))
  // PDFs are shown in place; nothing else of a mail is opened by us
  return type === 'application/pdf' ? sendPdf(event, bytes, name) : sendFile(event, bytes, 'application/octet-stream', name)
})
