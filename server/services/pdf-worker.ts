import { Worker } from 'node:worker_threads'
import type { Report } from '#server/reports/draw'

interface Waiting { resolve: (bytes: Uint8Array) => void, reject: (error: Error) => void }
type Message = { job: number, bytes: Uint8Array } | { job: number, error: string }

/** Draws reports in one thread of its own, kept warm, so that no request waits for a page to be set. */
export class PdfWorker {
  private worker: Worker | null = null
  private readonly waiting = new Map<number, Waiting>()
  private jobs = 0

  /** @param url of the worker's file, as `?worker-file` gives it. */
  constructor(private readonly url: string) {}

  draw(report: Report): Promise<Uint8Array> {
    const worker = this.worker ??= this.start()
    const job = ++this.jobs
    return new Promise((resolve, reject) => {
      this.waiting.set(job, { resolve, reject })
      worker.ref()
      worker.postMessage({ job, report })
    })
  }

  private start(): Worker {
    const worker = new Worker(new URL(this.url), { resourceLimits: { maxOldGenerationSizeMb: 512 } })
    worker.on('message', (message: Message) => {
      const waiting = this.waiting.get(message.job)
      this.waiting.delete(message.job)
      if (this.waiting.size === 0) worker.unref()
      if ('bytes' in message) waiting?.resolve(message.bytes)
      else waiting?.reject(new Error(`a report was not drawn: ${message.error}`))
    })
    worker.on('error', error => this.lost(worker, error instanceof Error ? error : new Error(String(error))))
    worker.on('exit', () => this.lost(worker, new Error('the drawing thread ended')))
    return worker
  }

  /** All that waited is told; the next report starts a new thread. */
  private lost(worker: Worker, error: Error): void {
    if (this.worker !== worker) return
    this.worker = null
    for (const { reject } of this.waiting.values()) reject(error)
    this.waiting.clear()
  }

  async close(): Promise<void> {
    await this.worker?.terminate()
  }
}
