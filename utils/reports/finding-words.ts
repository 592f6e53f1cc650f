import type { Finding } from '#shared/checks/finding'
import { unitWords } from '#shared/reports/unit-words'
import type { Writing } from '#shared/reports/writing'

type Given = Record<string, string>

/** The sentence of a finding and the name of its check, with figures as the country writes them. */
export function findingWords({ words, day, number }: Writing) {
  const unit = unitWords(words)
  const sentences: Record<string, (given: Given) => string> = {
    'licence-none': given => words('checks.messages.licence-none', given),
    'licence-other-state': given => words('checks.messages.licence-other-state', given),
    'licence-expired': given => words('checks.messages.licence-expired', given),
    'licence-not-yet': given => words('checks.messages.licence-not-yet', given),
    'product-as-read': given => words('checks.messages.product-as-read', given),
    'product-not-registered': given => words('checks.messages.product-not-registered', given),
    'rate-above': given => words('checks.messages.rate-above', given),
    'rate-below': given => words('checks.messages.rate-below', given),
    'rate-not-checked': given => words('checks.messages.rate-not-checked', given),
    'rate-not-checked-no-label': given => words('checks.messages.rate-not-checked-no-label', given),
    'rate-not-checked-no-use': given => words('checks.messages.rate-not-checked-no-use', given),
    'missing-amount': given => words('checks.messages.missing-amount', given),
    'missing-number': given => words('checks.messages.missing-number', given),
    'missing-target': given => words('checks.messages.missing-target', given),
    'missing-area': given => words('checks.messages.missing-area', given),
    'missing-area-size': given => words('checks.messages.missing-area-size', given),
    'missing-weather': given => words('checks.messages.missing-weather', given),
    'missing-weather-outdoors': given => words('checks.messages.missing-weather-outdoors', given),
    'missing-wind': given => words('checks.messages.missing-wind', given),
    'missing-address': given => words('checks.messages.missing-address', given),
    'late': given => words('checks.messages.late', given),
  }
  const names: Record<Finding['check'], string> = {
    'licence-in-force': words('checks.names.licence-in-force'),
    'product-registered': words('checks.names.product-registered'),
    'rate-in-range': words('checks.names.rate-in-range'),
    'required-fields': words('checks.names.required-fields'),
    'late': words('checks.names.late'),
  }
  const asWritten = (value: string) => /^\d{4}-\d{2}-\d{2}$/.test(value) ? day(value) : number(value)
  const sentence = ({ message, params, value, limit, unit: code }: Finding): string =>
    sentences[message]?.({ ...params, value: value === null ? '' : asWritten(value), limit: limit === null ? '' : asWritten(limit), unit: code === null ? '' : unit(code) }) ?? message
  return { names, sentence }
}
