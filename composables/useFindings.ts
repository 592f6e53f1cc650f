import type { Finding } from '#shared/checks/finding'

type Said = (given: Record<string, string>) => string

/** The sentence of a finding, with its figures as the country writes them. */
export function useFindings() {
  const { t } = useI18n()
  const format = useFormat()

  const sentences: Record<string, Said> = {
    'licence-none': given => t('checks.messages.licence-none', given),
    'licence-other-state': given => t('checks.messages.licence-other-state', given),
    'licence-expired': given => t('checks.messages.licence-expired', given),
    'licence-not-yet': given => t('checks.messages.licence-not-yet', given),
    'product-as-read': given => t('checks.messages.product-as-read', given),
    'product-not-registered': given => t('checks.messages.product-not-registered', given),
    'rate-above': given => t('checks.messages.rate-above', given),
    'rate-below': given => t('checks.messages.rate-below', given),
    'rate-not-checked': given => t('checks.messages.rate-not-checked', given),
    'rate-not-checked-no-label': given => t('checks.messages.rate-not-checked-no-label', given),
    'rate-not-checked-no-use': given => t('checks.messages.rate-not-checked-no-use', given),
    'missing-amount': given => t('checks.messages.missing-amount', given),
    'missing-number': given => t('checks.messages.missing-number', given),
    'missing-target': given => t('checks.messages.missing-target', given),
    'missing-area': given => t('checks.messages.missing-area', given),
    'missing-area-size': given => t('checks.messages.missing-area-size', given),
    'missing-weather': given => t('checks.messages.missing-weather', given),
    'missing-weather-outdoors': given => t('checks.messages.missing-weather-outdoors', given),
    'missing-wind': given => t('checks.messages.missing-wind', given),
    'missing-address': given => t('checks.messages.missing-address', given),
    'late': given => t('checks.messages.late', given),
  }
  const names: Record<Finding['check'], string> = {
    'licence-in-force': t('checks.names.licence-in-force'), 'product-registered': t('checks.names.product-registered'), 'rate-in-range': t('checks.names.rate-in-range'),
    'required-fields': t('checks.names.required-fields'), 'late': t('checks.names.late'),
  }
  const asWritten = (value: string) => /^\d{4}-\d{2}-\d{2}$/.test(value) ? format.day(value) : format.number(value)

  function sentence({ message, params, value, limit, unit }: Finding): string {
    const given = { ...params, value: value === null ? '' : asWritten(value), limit: limit === null ? '' : asWritten(limit), unit: unit === null ? '' : format.unitWord(unit) }
    return sentences[message]?.(given) ?? message
  }

  /** What a finding rests on: the label's own words, a rule with how sure we are of it, or the firm's own measure. */
  function basis({ basis: on }: Finding): string {
    if (on.kind === 'label') return t('checks.basis.label', { date: format.day(on.labelDate), words: on.words })
    return on.kind === 'rule' ? t('checks.basis.rule', { citation: on.citation, certainty: on.certainty }) : t('checks.basis.house')
  }
  return { names, sentence, basis }
}
