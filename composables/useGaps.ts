/** Why something is not ready for signing, in words. */
export function useGaps() {
  const { t } = useI18n()
  const words: Record<string, string> = {
    place: t('visit.gaps.place'), arrived: t('visit.gaps.arrived'), left: t('visit.gaps.left'), responsible: t('visit.gaps.responsible'), nothing: t('visit.gaps.nothing'), product: t('visit.gaps.product'), method: t('visit.gaps.method'), unreadable: t('visit.gaps.unreadable'),
  }
  return (code: string): string => words[code] ?? code
}
