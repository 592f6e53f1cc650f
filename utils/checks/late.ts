import type { Check } from '#shared/checks/finding'
import { finding } from '#shared/checks/finding'
import { minutesBetween } from '#shared/time/zoned'

/** The house's own measure until rule packs exist: on record within 24 elapsed hours of finishing. */
export const LATE_AFTER_HOURS = 24

/** Was the entry received more than 24 hours after finishing? Elapsed time, whatever the clocks did. On the device, judged by its own clock. */
export const late: Check = ({ facts, words, receivedAt }) => {
  const minutes = minutesBetween(facts.finishedAt, receivedAt ?? words.deviceNow)
  if (minutes <= LATE_AFTER_HOURS * 60) return []
  const hours = String(Math.floor(minutes / 60))
  return [finding('late', 'note', 'late', { params: { hours }, value: hours, limit: String(LATE_AFTER_HOURS), unit: 'h' })]
}
