import { ApiError } from '~/composables/useApi'

/** Sends a form: busy while under way, what was refused by field and as a whole; what was typed stays where it is. */
export function useSubmit() {
  const busy = ref(false)
  const refused = shallowRef<ApiError | null>(null)

  async function submit(work: () => Promise<void>): Promise<void> {
    if (busy.value) return
    busy.value = true
    refused.value = null
    try {
      await work()
    }
    catch (error) {
      if (!(error instanceof ApiError)) throw error
      refused.value = error
    }
    finally {
      busy.value = false
    }
  }

  const issues = computed(() => refused.value?.issues ?? [])
  const issue = (path: string) => refused.value?.issue(path)
  return { busy, refused, issues, issue, submit }
}
