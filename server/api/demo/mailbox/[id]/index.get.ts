import { showMail } from '#server/services/demo-mail'
import { theJobs } from '#server/services/the-jobs'

export default defineRoute('GET /api/demo/mailbox/:id', ({ params }) => showMail(theJobs().mailbox, params.id))
