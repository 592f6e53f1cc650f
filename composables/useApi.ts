import type { ErrorAnswer } from '#shared/api/contract/define'
import type { AnswerOf, BodyInputOf, ParamsInputOf, QueryInputOf, RouteKey } from '#shared/api/contract/index'
import { FetchError } from 'ofetch'

/** A refusal as the server worded it, or that there was no answer at all (`status` undefined, code `offline`). */
export class ApiError extends Error {
  constructor(readonly status: number | undefined, readonly answer: ErrorAnswer) {
    super(answer.message)
    this.name = 'ApiError'
  }

  get code() { return this.answer.code }
  get issues() { return this.answer.issues }
  get detail() { return this.answer.detail }
  /** What is said of one field. */
  issue(path: string): string | undefined { return this.answer.issues.find(issue => issue.path === path)?.message }
}

/** The parts of a request that its contract names, and no others. */
type Part<Name extends string, T> = [T] extends [undefined] ? { [K in Name]?: undefined } : { [K in Name]: T }
type Sent<K extends RouteKey> = Part<'params', ParamsInputOf<K>> & Part<'query', QueryInputOf<K>> & Part<'body', BodyInputOf<K>>
type Rest<K extends RouteKey> = Record<string, never> extends Sent<K> ? [sent?: Sent<K>] : [sent: Sent<K>]

const isErrorAnswer = (data: unknown): data is ErrorAnswer => typeof data === 'object' && data !== null && 'code' in data && 'issues' in data

/**
 * Asks one of our own routes, typed by the contract table: `await api('POST /api/session', { body: { email, password } })`.
 * While a page is drawn on the server, the browser's cookie goes along. @throws ApiError
 */
export function useApi() {
  const request = useRequestFetch() as (path: string, options: object) => Promise<unknown>
  const { $i18n } = useNuxtApp()

  return async function api<K extends RouteKey>(key: K, ...[sent]: Rest<K>): Promise<AnswerOf<K>> {
    const { params, query, body } = (sent ?? {}) as { params?: Record<string, string>, query?: object, body?: object }
    const [method = 'GET', pattern = ''] = key.split(' ')
    const path = pattern.replace(/:(\w+)/g, (_, name: string) => encodeURIComponent(params?.[name] ?? ''))
    try {
      return await request(path, { method, query, body, retry: 0 }) as AnswerOf<K>
    }
    catch (error) {
      if (!(error instanceof FetchError)) throw error
      if (isErrorAnswer(error.data)) throw new ApiError(error.status, error.data)
      const code = error.status === undefined ? 'offline' : 'broken'
      throw new ApiError(error.status, { code, message: code === 'offline' ? $i18n.t('errors.offline') : $i18n.t('errors.broken'), issues: [], detail: null })
    }
  }
}
