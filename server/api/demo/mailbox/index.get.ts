import { listMails } from '#server/services/demo-mail'
import { theJobs } from '#server/services/the-jobs'

export default defineRoute('GET /api/demo/mailbox', async () => ({ mails: await listMails(theJobs().mailbox) }))
