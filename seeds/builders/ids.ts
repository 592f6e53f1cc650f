import { uuidv7 } from '#shared/ledger/ids'
import type { Dice } from './random'

export type MakeId = (ms?: number) => string

/** Ids that count up from one moment, so that books list in the order in which the plan names them; or of the moment given. */
export function idsFrom(start: number, dice: Dice): MakeId {
  let made = 0
  return ms => uuidv7(ms ?? start + made++, dice.bytes(10))
}
