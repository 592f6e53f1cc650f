import type { Leaf } from '#shared/records/body'
import { differences } from '#shared/records/difference'
import { differenceWords } from '#shared/reports/difference-words'
import type { Writing } from '#shared/reports/writing'

export type Version = Leaf<'application' | 'amendment'>
export const isVersion = (leaf: Leaf): leaf is Version => leaf.kind === 'application' || leaf.kind === 'amendment'

export interface HistoryStep { at: string, who: string, differences: string[] }

/** What happened to an entry, leaf by leaf, each change with its reason and its differences in words. */
export function historySteps(leaves: readonly Leaf[], write: Writing): HistoryStep[] {
  const say = differenceWords(write)
  const zone = leaves.find(isVersion)?.body.facts.zone ?? 'UTC'
  let before: Version | null = null
  return leaves.map((leaf) => {
    const step: HistoryStep = { at: write.dateTime(leaf.receivedAt, zone), who: stepWords(leaf, write), differences: [] }
    if (isVersion(leaf)) {
      if (before) step.differences = differences(before.body, leaf.body).map(say)
      before = leaf
    }
    return step
  })
}

function stepWords(leaf: Leaf, { words }: Writing): string {
  const { body } = leaf
  const who = 'person' in body.by ? body.by.name : body.by.job
  switch (body.kind) {
    case 'amendment': return words('paper.record.history.amended', { who, reason: body.amends.reason })
    case 'strike': return words('paper.record.history.struck', { who, reason: body.facts.reason })
    case 'acknowledgement': {
      const because = body.facts.because ?? ''
      return { 'confirmed': words('paper.record.history.confirmed', { who }), 'disputed': words('paper.record.history.disputed', { who, because }), 'cannot-be-had': words('paper.record.history.cannotBeHad', { who, because }) }[body.facts.says]
    }
    default: return words('paper.record.history.signed', { who })
  }
}
