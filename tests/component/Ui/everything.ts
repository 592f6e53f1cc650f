import { defineComponent, ref } from 'vue'
import LedgerFinding from '~/components/Ledger/Finding.vue'
import LedgerReference from '~/components/Ledger/Reference.vue'
import LedgerStanding from '~/components/Ledger/Standing.vue'
import LedgerTable from '~/components/Ledger/Table.vue'
import UiBusy from '~/components/Ui/Busy.vue'
import UiButton from '~/components/Ui/Button.vue'
import UiChoice from '~/components/Ui/Choice.vue'
import UiDate from '~/components/Ui/Date.vue'
import UiDefinition from '~/components/Ui/Definition.vue'
import UiDialog from '~/components/Ui/Dialog.vue'
import UiEmpty from '~/components/Ui/Empty.vue'
import UiErrorSummary from '~/components/Ui/ErrorSummary.vue'
import UiFailed from '~/components/Ui/Failed.vue'
import UiField from '~/components/Ui/Field.vue'
import UiInput from '~/components/Ui/Input.vue'
import UiPage from '~/components/Ui/Page.vue'
import UiQuantity from '~/components/Ui/Quantity.vue'
import UiSelect from '~/components/Ui/Select.vue'
import UiTextarea from '~/components/Ui/Textarea.vue'
import UiTick from '~/components/Ui/Tick.vue'
import UiTime from '~/components/Ui/Time.vue'

/** One page that holds every base component, as pages put them together. */
export const Everything = defineComponent({
  components: {
    LedgerFinding, LedgerReference, LedgerStanding, LedgerTable, UiBusy, UiButton, UiChoice, UiDate, UiDefinition, UiDialog, UiEmpty,
    UiErrorSummary, UiFailed, UiField, UiInput, UiPage, UiQuantity, UiSelect, UiTextarea, UiTick, UiTime,
  },
  setup: () => ({
    text: ref(''), day: ref('2026-05-14'), time: ref('09:12'), tick: ref(false), choice: ref<string | null>(null), amount: ref({ value: '1,116', unit: 'gal' }),
    open: ref(false), sort: ref('-finishedAt'),
    columns: [{ id: 'finishedAt', label: 'Finished', sortable: true }, { id: 'amount', label: 'Amount', numeric: true }],
    rows: [{ id: 'a', hash: '8f3a61c4' }, { id: 'b', hash: '21d0b97e' }],
    rowKey: (row: { id: string }) => row.id, struck: (row: { id: string }) => row.id === 'b',
    issues: [{ path: 'area.size', message: 'The area has no size' }],
    options: [{ value: 'a', label: '0.15 low' }, { value: 'b', label: '0.30' }],
    facts: [{ id: 'product', label: 'Product', value: 'Sillgard 6.4 CS' }],
  }),
  template: `
    <main><UiPage title="Daybook" subtitle="As it stands" :back="{ to: '/', label: 'Today' }">
      <template #margin><LedgerReference reference="260514-7KQ4M2" hash="8f3a61c4" /></template>
      <template #actions><UiButton kind="filled" to="/">New visit</UiButton></template>
      <UiErrorSummary :issues="issues" />
      <LedgerTable v-model:sort="sort" caption="Entries" :columns="columns" :rows="rows" :row-key="rowKey" :struck="struck">
        <template #margin="{ row }"><LedgerReference :reference="row.id" :hash="row.hash" to="/" /></template>
        <template #cell-finishedAt>May 14</template>
        <template #cell-amount><LedgerStanding status="amended" confirmation="owed" /><LedgerFinding outcome="stop">late</LedgerFinding></template>
        <template #total><td role="cell">2 entries</td><td role="cell" /></template>
      </LedgerTable>
      <UiField v-slot="f" label="Area" path="area.size" hint="As measured" error="The area has no size"><UiInput v-bind="f" v-model="text" /></UiField>
      <UiField v-slot="f" label="Finished spray" group><UiQuantity v-bind="f" v-model="amount" label="Finished spray" :units="['gal', 'L']" step="0.5" /></UiField>
      <UiField v-slot="f" label="Rate" group error="Choose one"><UiChoice v-bind="f" v-model="choice" :options="options" /></UiField>
      <UiField v-slot="f" label="Range" optional><UiSelect v-bind="f" v-model="text" blank="Any" :options="options" /></UiField>
      <UiField v-slot="f" label="Day"><UiDate v-bind="f" v-model="day" /></UiField>
      <UiField v-slot="f" label="Time"><UiTime v-bind="f" v-model="time" /></UiField>
      <UiField v-slot="f" label="Note"><UiTextarea v-bind="f" v-model="text" /></UiField>
      <UiTick v-model="tick">As written here</UiTick>
      <UiButton kind="lined" busy>Sign</UiButton>
      <UiDefinition :rows="facts" />
      <UiFailed what="The Daybook could not be fetched" :status="500" />
      <UiEmpty>Entries stand here.</UiEmpty>
      <UiBusy />
      <UiDialog v-model:open="open" title="Strike this entry?">Why?</UiDialog>
    </UiPage></main>`,
})
