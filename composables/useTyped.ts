import { fieldId } from '~/composables/useFieldId'

/** The text of a field; what was typed or filled in before the page came alive is kept. */
export function useTyped(path: string, initial = '') {
  const value = ref(initial)
  if (import.meta.client && useNuxtApp().isHydrating) {
    const field = document.getElementById(fieldId(path))
    if (field instanceof HTMLInputElement && field.value !== '') value.value = field.value
  }
  return value
}
