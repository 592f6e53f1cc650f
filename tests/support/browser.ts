import { readFileSync } from 'node:fs'
import { createRequire } from 'node:module'
import type { AxeResults } from 'axe-core'
import type { Browser, BrowserContextOptions, Page } from 'playwright-core'
import { chromium } from 'playwright-core'
import type { TestServer } from './server'

const ARGS = ['--no-sandbox', '--disable-gpu', '--disable-quic', '--no-first-run', '--disable-background-networking', '--disable-component-update', '--disable-sync']
export const PHONE = { width: 390, height: 844 }
export const DESK = { width: 1440, height: 900 }

let launched: Promise<Browser> | undefined
/** One Chromium for all browser tests; it ends with the process. */
const theBrowser = (): Promise<Browser> => launched ??= chromium.launch({ executablePath: process.env.CHROMIUM ?? '/usr/bin/chromium', args: ARGS })
  .catch((error: Error) => { throw new Error(`Chromium did not start: install Debian’s package \`chromium\`, or name another by CHROMIUM.\n${error.message}`) })

export interface PageOptions extends BrowserContextOptions {
  /** What the console may say (a refused request is an error there); everything else fails the test. */
  expected?: RegExp
}

/**
 * A page in a context of its own, for as long as `work` runs.
 * @throws afterwards when the console, the page or the content policy complained.
 */
export async function withPage<T>(server: TestServer, { expected, ...options }: PageOptions, work: (page: Page) => Promise<T>): Promise<T> {
  const context = await (await theBrowser()).newContext({ baseURL: server.url, viewport: PHONE, locale: 'en-US', timezoneId: 'America/New_York', ...options })
  const noise: string[] = []
  await context.exposeFunction('reportViolation', (what: string) => noise.push(`content policy: ${what}`))
  await context.addInitScript(() => {
    const report = (window as unknown as { reportViolation: (what: string) => void }).reportViolation
    document.addEventListener('securitypolicyviolation', event => report(`${event.violatedDirective} ${event.blockedURI} ${event.sample}`))
  })
  const page = await context.newPage()
  page.on('console', (message) => { if (['error', 'warning'].includes(message.type())) noise.push(`console: ${message.text()}`) })
  page.on('pageerror', error => noise.push(`page: ${error.message}`))
  try {
    const result = await work(page)
    const unexpected = noise.filter(line => !expected?.test(line))
    if (unexpected.length > 0) throw new Error(`the browser complained:\n${unexpected.join('\n')}`)
    return result
  }
  finally {
    await context.close()
  }
}

/** Waits until the page is alive: before that, a press does what the bare form does. */
export const alive = (page: Page): Promise<unknown> => page.waitForFunction(() => (window as unknown as { useNuxtApp?: () => { isHydrating: boolean } }).useNuxtApp?.().isHydrating === false)

/** What axe finds wrong with the page as it stands, by WCAG 2.2 AA: rule and elements. */
export async function accessibilityFaults(page: Page): Promise<string[]> {
  await page.evaluate(readFileSync(createRequire(import.meta.url).resolve('axe-core/axe.min.js'), 'utf8'))
  const { violations } = await page.evaluate(() => (window as unknown as { axe: { run: (options: object) => Promise<AxeResults> } }).axe.run({ runOnly: ['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa', 'best-practice'] }))
  return violations.map(fault => `${fault.id}: ${fault.nodes.map(node => node.target.join(' ')).join(', ')}`)
}
