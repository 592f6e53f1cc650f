import workerUrl from '#server/workers/pdf.worker?worker-file'
import type { DemoMailbox } from '#server/mail/demo-mailbox'
import type { MailTransport } from '#server/mail/transport'
import type { House } from '#server/services/house'
import { Jobs } from '#server/services/jobs'
import { PdfWorker } from '#server/services/pdf-worker'

interface AtWork { jobs: Jobs, pdf: PdfWorker, transport: Promise<MailTransport>, mailbox: DemoMailbox | null }
let atWork: AtWork | null = null

export interface JobsConfig { house: House, transport: Promise<MailTransport>, accountFrom: string, mailbox: DemoMailbox | null }

/** Starts this process's jobs (called once, by the server's plugin). */
export function startJobs({ house, transport, accountFrom, mailbox }: JobsConfig): void {
  const pdf = new PdfWorker(workerUrl)
  // eslint-disable-next-line no-console -- the operator's log is where an unexpected fault belongs
  const jobs = new Jobs({ house, transport, pdf, accountFrom, log: error => console.error(error) })
  atWork = { jobs, pdf, transport, mailbox }
  jobs.start()
}

export function theJobs(): AtWork {
  if (!atWork) throw new Error('no jobs are running')
  return atWork
}

/** The step under way first, then the way out, then the drawing thread. */
export async function stopJobs(): Promise<void> {
  if (!atWork) return
  await atWork.jobs.stop()
  await (await atWork.transport).close()
  await atWork.pdf.close()
  atWork = null
}
