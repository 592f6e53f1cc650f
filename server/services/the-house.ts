import { randomBytes } from 'node:crypto'
import { House } from '#server/services/house'
import type { HouseSettings, World } from '#server/services/house'

let house: House | null = null

export const realWorld: World = { now: () => new Date(), random: size => new Uint8Array(randomBytes(size)) }

/** Opens this process's house (called once, by the server's plugin). */
export function openHouse(settings: HouseSettings): House {
  house = new House(settings, realWorld)
  return house
}

export function theHouse(): House {
  if (!house) throw new Error('the house is not open')
  return house
}

export function closeHouse(): void {
  house?.close()
  house = null
}
