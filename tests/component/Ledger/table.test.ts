import { mountSuspended } from '@nuxt/test-utils/runtime'
import { describe, expect, it } from 'vitest'
import LedgerTable from '~/components/Ledger/Table.vue'

const columns = [{ id: 'finishedAt', label: 'Finished', sortable: true, fallingFirst: true }, { id: 'place', label: 'Place', sortable: true }, { id: 'amount', label: 'Amount', numeric: true }]
const mount = (sort?: string) => mountSuspended(LedgerTable, {
  props: { caption: 'Entries', columns, rows: [{ id: 'a' }], rowKey: (row: unknown) => JSON.stringify(row), sort },
})

describe('LedgerTable', () => {
  it('says how it is sorted, to the eye and to the ear', async () => {
    const table = await mount('-finishedAt')
    const heads = table.findAll('th')
    expect(heads.map(head => head.attributes('aria-sort'))).toEqual(['descending', undefined, undefined])
    expect(heads[0]?.text()).toContain('↓')
  })

  it.each([['-finishedAt', 0, 'finishedAt'], ['finishedAt', 0, '-finishedAt'], [undefined, 0, '-finishedAt'], ['-finishedAt', 1, 'place'], ['place', 1, '-place']] as const)('from %s, head %d asks for %s', async (sort, head, next) => {
    const table = await mount(sort)
    await table.findAll('th button')[head]?.trigger('click')
    expect(table.emitted('update:sort')).toEqual([[next]])
  })

  it('offers no button where a column does not sort', async () => {
    expect((await mount()).findAll('th button')).toHaveLength(2)
  })
})
