import type { Check, CheckContext, CheckName, Finding } from '#shared/checks/finding'
import { RANK } from '#shared/checks/finding'
import { late } from '#shared/checks/late'
import { licenceInForce } from '#shared/checks/licence-in-force'
import { productRegistered } from '#shared/checks/product-registered'
import { rateInRange } from '#shared/checks/rate-in-range'
import { requiredFields } from '#shared/checks/required-fields'
import type { EntryWords } from '#shared/records/entry'

const BY_NAME: Record<CheckName, Check> = {
  'licence-in-force': licenceInForce,
  'product-registered': productRegistered,
  'rate-in-range': rateInRange,
  'required-fields': requiredFields,
  'late': late,
}

/** All findings on one entry, heaviest first. The same on a device and on the server; order of evaluation does not matter. */
export function assess(context: CheckContext): Finding[] {
  return Object.values(BY_NAME).flatMap(check => check(context)).sort((a, b) => RANK[b.outcome] - RANK[a.outcome])
}

/** Marks which findings were on the screen at signing; what was not seen goes to the officer, not against the applicator. */
export function markSeen(findings: Finding[], seen: EntryWords['seen']): Finding[] {
  return findings.map(f => ({ ...f, seen: seen.some(s => s.check === f.check && s.message === f.message && s.line === f.line) }))
}
