import type { ErrorAnswer } from '#shared/api/contract/define'
import type { VisitReceipt } from '#shared/api/contract/visits'
import { ApiError } from '~/composables/useApi'

const isErrorAnswer = (data: unknown): data is ErrorAnswer => typeof data === 'object' && data !== null && 'code' in data && 'issues' in data

/** Sends frozen bytes exactly as they were signed: `useApi` would write the JSON anew. @throws ApiError */
export function useSendVisit() {
  const { t } = useI18n()
  return async (frozen: string): Promise<VisitReceipt> => {
    const answer = await fetch('/api/visits', { method: 'POST', headers: { 'content-type': 'application/json' }, body: frozen })
      .catch(() => { throw new ApiError(undefined, { code: 'offline', message: t('errors.offline'), issues: [], detail: null }) })
    const data: unknown = await answer.json().catch(() => null)
    if (answer.ok) return data as VisitReceipt
    throw new ApiError(answer.status, isErrorAnswer(data) ? data : { code: 'broken', message: t('errors.broken'), issues: [], detail: null })
  }
}
