import type { HeldVisit } from '~/composables/useDeviceBook'
import type { Draft } from '#shared/records/draft'

/** Plain copies: IndexedDB takes no reactive objects. */
const plain = <T>(value: T): T => JSON.parse(JSON.stringify(value)) as T

/** Visits of one person in one firm that are not on record yet: written through to the device on every change. */
export const useDraftsStore = defineStore('drafts', () => {
  const who = ref('')
  const held = ref<HeldVisit[]>([])
  const currentId = ref<string | null>(null)
  const current = computed(() => held.value.find(visit => visit.id === currentId.value) ?? null)
  const unsaved = new Set<string>()
  let frame = 0

  async function load(person: string): Promise<void> {
    if (who.value === person) return
    held.value = []
    currentId.value = null
    who.value = person
    held.value = await (await useDeviceBook()).getAllFromIndex('visits', 'who', person)
  }

  /** Writes what changed; each is one transaction that the browser ends even when the page goes. */
  async function flush(): Promise<void> {
    cancelAnimationFrame(frame)
    const rows = held.value.filter(visit => unsaved.has(visit.id)).map(plain)
    unsaved.clear()
    const device = await useDeviceBook()
    await Promise.all(rows.map(row => device.put('visits', row)))
  }
  function touched(id: string): void {
    const visit = held.value.find(one => one.id === id)
    if (visit) visit.changedAt = new Date().toISOString()
    unsaved.add(id)
    cancelAnimationFrame(frame)
    frame = requestAnimationFrame(() => void flush())
  }

  function begin(draft: Draft): void {
    held.value.push({ who: who.value, id: draft.id, state: 'open', draft, frozen: null, changedAt: draft.begunAt })
    currentId.value = draft.id
  }
  /** From here on the visit is these bytes. */
  async function freeze(id: string, frozen: string): Promise<void> {
    const visit = held.value.find(one => one.id === id)
    if (!visit) return
    Object.assign(visit, { state: 'signed', frozen })
    unsaved.add(id)
    await flush()
  }
  /** Nothing of it went on record: it may be written on. */
  async function reopen(id: string): Promise<void> {
    const visit = held.value.find(one => one.id === id)
    if (!visit) return
    Object.assign(visit, { state: 'open', frozen: null })
    unsaved.add(id)
    await flush()
  }
  async function forget(id: string): Promise<void> {
    held.value = held.value.filter(visit => visit.id !== id)
    unsaved.delete(id)
    if (currentId.value === id) currentId.value = null
    await (await useDeviceBook()).delete('visits', [who.value, id])
  }
  return { who, held, currentId, current, load, flush, touched, begin, freeze, reopen, forget }
})
