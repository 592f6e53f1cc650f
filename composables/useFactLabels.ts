import type { FactLabel } from '#shared/records/difference'

/** The words before each fact of a record; where there are several of one kind, numbered. */
export function useFactLabels() {
  const { t } = useI18n()
  const labels: Record<FactLabel, string> = {
    place: t('entry.labels.place'), branch: t('entry.labels.branch'), startedAt: t('entry.labels.startedAt'), finishedAt: t('entry.labels.finishedAt'), zone: t('entry.labels.zone'), method: t('entry.labels.method'),
    equipment: t('entry.labels.equipment'), targets: t('entry.labels.targets'), mix: t('entry.labels.mix'), drawn: t('entry.labels.drawn'), finished: t('entry.labels.finished'), product: t('entry.labels.product'),
    labelVersion: t('entry.labels.labelVersion'), rate: t('entry.labels.rate'), amount: t('entry.labels.amount'), counted: t('entry.labels.counted'), lot: t('entry.labels.lot'), area: t('entry.labels.area'),
    setting: t('entry.labels.setting'), size: t('entry.labels.size'), how: t('entry.labels.how'), weather: t('entry.labels.weather'), noWeather: t('entry.labels.noWeather'), person: t('entry.labels.person'),
    did: t('entry.labels.did'), licence: t('entry.labels.licence'), responsible: t('entry.labels.responsible'), reentry: t('entry.labels.reentry'), protective: t('entry.labels.protective'),
    prevention: t('entry.labels.prevention'), advice: t('entry.labels.advice'),
  }
  return (label: FactLabel, n: number | null = null): string => n === null || n === 1 ? labels[label] : t('entry.numbered', { label: labels[label], n })
}
