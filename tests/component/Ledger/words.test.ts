import { mountSuspended } from '@nuxt/test-utils/runtime'
import { describe, expect, it } from 'vitest'
import LedgerFinding from '~/components/Ledger/Finding.vue'
import LedgerStanding from '~/components/Ledger/Standing.vue'

describe('LedgerFinding', () => {
  it.each([['stop', 'Stop'], ['query', 'Query'], ['note', 'Note']] as const)('a %s says its word', async (outcome, word) => {
    const finding = await mountSuspended(LedgerFinding, { props: { outcome }, slots: { default: () => 'wind near the limit' } })
    expect(finding.text()).toBe(`${word} wind near the limit`)
    expect(finding.classes()).toContain(`finding-${outcome}`)
  })
})

describe('LedgerStanding', () => {
  it.each([
    ['on-record', 'none-owed', 'On record'], ['amended', 'owed', 'Amended author’s word owed'], ['amended', 'disputed', 'Amended author disputes it'],
    ['amended', 'confirmed', 'Amended author confirmed'], ['struck', 'cannot-be-had', 'Struck author’s word can’t be had'],
  ] as const)('%s, %s', async (status, confirmation, words) => {
    const standing = await mountSuspended(LedgerStanding, { props: { status, confirmation } })
    expect(standing.text().replace(/(On record|Amended|Struck)(?=\S)/, '$1 ')).toBe(words)
  })
})
