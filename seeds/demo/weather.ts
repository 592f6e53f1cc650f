import type { EntryFacts } from '#shared/records/entry'
import { WIND_FROM } from '#shared/records/entry'
import type { Dice } from '../builders/random'
import type { BranchKey } from './people'

/** Middle of the day in °F, January to December: rough figures from memory, enough to look like the place. */
const USUAL: Record<BranchKey, number[]> = {
  NY: [31, 34, 44, 57, 68, 77, 82, 80, 72, 59, 47, 36],
  CA: [54, 60, 65, 71, 79, 86, 92, 91, 87, 77, 63, 54],
  TX: [61, 65, 72, 79, 86, 92, 96, 97, 91, 82, 71, 62],
}
const SKIES = ['clear', 'clear', 'clear', 'part-cloud', 'part-cloud', 'overcast'] as const

/** One reading at the start of outdoor work; now and then it was calm, the wind was not read, or nothing was taken. */
export function weatherAt(dice: Dice, region: BranchKey, at: string): Pick<EntryFacts, 'weather' | 'noWeather'> {
  if (dice.chance(0.015)) return { weather: [], noWeather: 'not-taken' }
  const month = Number(at.slice(5, 7)) - 1
  const temperature = { value: String((USUAL[region][month] ?? 60) + dice.between(-8, 7)), unit: 'deg_F' as const }
  const blown = { speed: { value: String(dice.between(1, 9)), unit: 'mph' as const }, from: dice.pick(WIND_FROM) }
  const wind = dice.chance(0.09) ? { calm: true as const } : dice.chance(0.02) ? null : blown
  return { weather: [{ at, where: 'site', temperature, wind, humidity: dice.chance(0.3) ? String(dice.between(25, 85)) : null, sky: dice.pick(SKIES), source: 'observed' }], noWeather: null }
}
