import type { Kit } from '#shared/books/kit'
import { kitBooks } from '#shared/records/kit-books'

/** What the entry form works from: the kit kept on this device at once, the server's as soon as it answers. */
export const useKitStore = defineStore('kit', () => {
  const kit = shallowRef<Kit | null>(null)
  const failed = ref(false)
  const books = computed(() => kit.value && kitBooks(kit.value))

  async function load(who: string, fetch: () => Promise<Kit>): Promise<void> {
    const device = await useDeviceBook()
    kit.value = await device.get('kits', who) ?? null
    const refreshed = refresh(who, fetch)
    if (!kit.value) await refreshed
  }
  async function refresh(who: string, fetch: () => Promise<Kit>): Promise<void> {
    failed.value = false
    try {
      const fresh = await fetch()
      kit.value = fresh
      await (await useDeviceBook()).put('kits', fresh, who)
    }
    catch (error) {
      // no signal: the kept kit goes on serving; the page says how old it is
      failed.value = true
      if (!(error instanceof Error && error.name === 'ApiError')) throw error
    }
  }
  return { kit, books, failed, load, refresh }
})
