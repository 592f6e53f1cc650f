import type { NoticeLine } from '#shared/api/contract/notices'

/** How a notice stands and what happened to it, in words. */
export function useNoticeWords() {
  const { t } = useI18n()
  const states: Record<NoticeLine['state'], string> = {
    'planned': t('notices.states.planned'), 'sent': t('notices.states.sent'), 'delivered': t('notices.states.delivered'), 'bounced': t('notices.states.bounced'), 'failed': t('notices.states.failed'),
    'printed': t('notices.states.printed'), 'handed-over': t('notices.states.handed-over'), 'read': t('notices.states.read'),
  }
  const events: Record<string, string> = {
    'planned': t('notices.events.planned'), 'released': t('notices.events.released'), 'composed': t('notices.events.composed'), 'sent': t('notices.events.sent'),
    'sent-perhaps-twice': t('notices.events.sent-perhaps-twice'), 'unanswered': t('notices.events.unanswered'), 'not-taken': t('notices.events.not-taken'), 'failed': t('notices.events.failed'),
    'tried-again': t('notices.events.tried-again'), 'printed': t('notices.events.printed'), 'handed-over': t('notices.events.handed-over'),
  }

  function state(notice: Pick<NoticeLine, 'state' | 'waiting' | 'trouble'>): string {
    if (notice.waiting) return t('notices.states.waiting')
    if (notice.state === 'planned') return notice.trouble ? t('notices.states.again') : t('notices.states.underWay')
    return states[notice.state]
  }
  function event({ what, by }: { what: string, by: string | null }): string {
    const said = events[what] ?? what
    return by ? t('notices.events.by', { what: said, who: by }) : said
  }
  return { state, event }
}
