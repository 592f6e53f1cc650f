import type { Draft } from '#shared/records/draft'
import { isIndoors, isTaken } from '#shared/records/draft'
import { isQuantity } from '#shared/records/draft-figures'

/** The order of the form's groups and which of them are answered: what "next" opens. */
export function useVisitSteps(draft: Draft, open: Ref<string | null>) {
  const steps = computed(() => [
    'place', ...draft.treatments.flatMap((_, n) => [`t${n}.what`, `t${n}.much`]), ...(draft.treatments.length ? ['weather'] : draft.nothing || open.value === 'nothing' ? ['nothing'] : []), 'people', 'times',
  ])
  function isAnswered(step: string): boolean {
    const [group = '', part] = step.split('.')
    const treatment = /^t\d+$/.test(group) ? draft.treatments[Number(group.slice(1))] : undefined
    if (treatment) {
      if (part === 'what') return (treatment.lines.length > 0 || treatment.mixId !== null) && treatment.method !== null
      return treatment.areas.length > 0 && treatment.areas.every(a => isQuantity(a.size)) && (treatment.mixId ? isQuantity(treatment.drawn) : treatment.lines.every(l => l.counted !== null || isQuantity(l.amount)))
    }
    switch (step) {
      case 'place': return draft.place !== null && (draft.treatments.length > 0 || draft.nothing !== null)
      case 'nothing': return draft.nothing !== null
      case 'weather': return draft.noWeather !== null || draft.weather.some(isTaken) || draft.treatments.every(isIndoors)
      case 'people': return draft.people.filter(p => p.responsible).length === 1
      case 'times': return Boolean(draft.arrived?.at && draft.left?.at)
      default: return true
    }
  }
  /** Opens the first group behind the open one that is not answered yet, else the first at all; folds everything when all are. */
  function next(): void {
    const base = open.value?.replace(/\.keep$/, '.much') ?? ''
    const at = steps.value.indexOf(base)
    const ahead = steps.value.slice(at + 1).find(step => !isAnswered(step))
    open.value = ahead ?? steps.value.find(step => step !== base && !isAnswered(step)) ?? null
  }
  return { steps, isAnswered, next }
}
