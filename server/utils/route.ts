import type { IncomingMessage } from 'node:http'
import type { EventHandler, H3Event } from 'h3'
import type { z } from 'zod'
import { ZodError } from 'zod'
import type { Actor } from '#shared/access/abilities'
import { can } from '#shared/access/abilities'
import type { BodyOf, ParamsOf, QueryOf, RouteKey } from '#shared/api/contract/index'
import { CONTRACT } from '#shared/api/contract/index'
import type { Contract, ErrorAnswer } from '#shared/api/contract/define'
import type { Issue } from '#shared/errors'
import { AppError } from '#shared/errors'
import { issuesOf } from '#shared/api/issues'
import type { FirmFile, House } from '#server/services/house'
import type { SignedIn } from '#server/services/sessions'
import { theHouse } from '#server/services/the-house'
import { words } from '#server/words/words'

const DEFAULT_LIMIT = 65_536

/** What a handler is given. `actor` and `file` are there on every route whose contract names an ability. */
export interface Call<K extends RouteKey> {
  event: H3Event
  house: House
  now: Date
  params: ParamsOf<K>
  query: QueryOf<K>
  body: BodyOf<K>
  /** @throws AppError 401 where nobody is signed in. */
  session: SignedIn
  /** @throws AppError 403 where nobody with a firm is signed in. */
  actor: Actor
  file: FirmFile
}

/** An answer with a status of its own. */
export class Answer<T> {
  constructor(readonly status: number, readonly value: T) {}
}
export const answer = <T>(status: number, value: T) => new Answer(status, value)

/**
 * Every route is made by this: origin, session, ability, then params, query and body by the contract, then one call.
 * Whoever may not call learns nothing about the shape of what is sent.
 */
export function defineRoute<K extends RouteKey, R>(key: K, handle: (call: Call<K>) => R | Promise<R>): EventHandler {
  const contract: Contract = CONTRACT[key]
  return defineEventHandler(async (event) => {
    try {
      checkOrigin(event)
      const actor = authorise(event, contract)
      const call = {
        event, house: theHouse(), now: theHouse().world.now(),
        params: parse(contract.params, getRouterParams(event, { decode: true }), ''),
        query: parse(contract.query, getQuery(event), ''),
        body: contract.body ? parse(contract.body, await readJson(event, contract.bodyLimit ?? DEFAULT_LIMIT), '') : undefined,
        get session() {
          if (!event.context.signedIn) throw new AppError('no-session')
          return event.context.signedIn
        },
        get actor() {
          if (!actor) throw new AppError('not-allowed')
          return actor
        },
        get file() {
          const file = theHouse().openOrClosed(this.actor.firmSlug)
          if (!file) throw new AppError('firm-closed')
          return file
        },
      } as Call<K>
      const result = await handle(call)
      if (result instanceof Answer) {
        setResponseStatus(event, result.status)
        return result.value
      }
      return result
    }
    catch (error) {
      return refuse(event, error)
    }
  })
}

function authorise(event: H3Event, contract: Contract): Actor | null {
  const signedIn = event.context.signedIn
  if (contract.ability === 'public') return signedIn?.actor ?? null
  if (contract.ability === 'demo') {
    if (!event.context.demo) throw new AppError('not-found')
    return signedIn?.actor ?? null
  }
  if (!signedIn) throw new AppError('no-session')
  if (contract.ability === 'signed-in') return signedIn.actor
  if (!signedIn.actor) throw closedOrNotAllowed(signedIn)
  if (!can(signedIn.actor, contract.ability)) throw new AppError('not-allowed')
  return signedIn.actor
}

/** Nobody has a standing in a firm whose file failed its checks: that is not the caller's fault, and says so. */
function closedOrNotAllowed(signedIn: SignedIn): AppError {
  return new AppError(signedIn.firmClosed ? 'firm-closed' : 'not-allowed')
}

/** Unsafe methods come from our own pages (or from a program that sends neither header, which a browser never does across sites). */
function checkOrigin(event: H3Event): void {
  if (event.method === 'GET' || event.method === 'HEAD') return
  const site = getRequestHeader(event, 'sec-fetch-site')
  if (site && site !== 'same-origin' && site !== 'none') throw new AppError('cross-site')
  const origin = getRequestHeader(event, 'origin')
  // 'null' (a sandboxed frame, a file) is no origin of ours
  if (origin && origin !== useRuntimeConfig(event).publicUrl && (!URL.canParse(origin) || new URL(origin).host !== getRequestHost(event))) throw new AppError('cross-site')
}

function parse(schema: z.ZodType | undefined, value: unknown, path: string): unknown {
  if (!schema) return undefined
  const result = schema.safeParse(value)
  if (!result.success) throw new AppError('malformed', issuesOf(result.error, path))
  return result.data
}

async function readJson(event: H3Event, limit: number): Promise<unknown> {
  const type = getRequestHeader(event, 'content-type') ?? ''
  if (!/^application\/json\b/i.test(type)) throw new AppError('wrong-kind')
  const bytes = await readBytes(event.node.req, limit)
  if (!bytes) throw new AppError('too-large', [{ path: '', code: 'too-large', params: { limit } }])
  try {
    return JSON.parse(new TextDecoder('utf-8', { fatal: true }).decode(bytes))
  }
  catch {
    throw new AppError('malformed', [{ path: '', code: 'not-json' }])
  }
}

/** Null when there is more than the limit, whatever Content-Length says. The rest is read off and forgotten, so that the answer still arrives. */
async function readBytes(stream: IncomingMessage, limit: number): Promise<Buffer | null> {
  const chunks: Buffer[] = []
  let size = 0
  for await (const chunk of stream.iterator({ destroyOnReturn: false })) {
    size += (chunk as Buffer).length
    if (size > limit) {
      stream.resume()
      return null
    }
    chunks.push(chunk as Buffer)
  }
  return Buffer.concat(chunks)
}

const sentence = (issue: Issue) => ({ path: issue.path, code: issue.code, message: words(`errors.issues.${issue.code}`, issue.params) })

/** Turns what a handler threw into the answer; what nobody expected is logged and says nothing of its inside. */
function refuse(event: H3Event, error: unknown): ErrorAnswer {
  if (error instanceof AppError) {
    setResponseStatus(event, error.status)
    if (typeof error.detail?.retryAfter === 'number') setResponseHeader(event, 'retry-after', error.detail.retryAfter)
    return { code: error.code, message: words(`errors.${error.code}`), issues: error.issues.map(sentence), detail: error.detail }
  }
  if (error instanceof ZodError) {
    setResponseStatus(event, 400)
    return { code: 'malformed', message: words('errors.malformed'), issues: issuesOf(error, '').map(sentence), detail: null }
  }
  // eslint-disable-next-line no-console -- the operator's log is where an unexpected fault belongs
  console.error(error)
  setResponseStatus(event, 500)
  return { code: 'broken', message: words('errors.broken'), issues: [], detail: null }
}
