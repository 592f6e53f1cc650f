import type { Actor } from '#shared/access/abilities'
import { branchesFor } from '#shared/access/abilities'
import type { Kit } from '#shared/books/kit'
import { plusDays } from '#shared/time/days'
import { kitBranches, kitEquipment, kitFirm, kitLabels, kitParties, kitPeople, kitPlaces, kitProducts } from '#server/database/firm/repositories/kit'
import { lastVisits, openMixes, placesDue, recentPlaces } from '#server/database/firm/repositories/kit-visits'
import type { FirmFile } from '#server/services/house'

/** A late entry may be of work done under a label that has ended meanwhile. */
const LABEL_DAYS = 60
const MIX_DAYS = 3
const DUE_DAYS = 14
const DAY_MS = 86_400_000

/** What the person's device keeps: the books of the branches where the person may sign (all of the firm's products and people), what is due, last visits. */
export function makeKit({ reader }: FirmFile, actor: Actor, now: Date): Kit {
  const seen = branchesFor(actor, 'kit.read')
  const day = now.toISOString().slice(0, 10)
  const since = plusDays(day, -LABEL_DAYS)
  return reader.transaction((): Kit => ({
    v: 1,
    madeAt: now.toISOString(),
    firm: kitFirm(reader),
    branches: kitBranches(reader, seen),
    places: kitPlaces(reader, seen, day),
    ...kitParties(reader, seen, since),
    products: kitProducts(reader, since),
    // the day of the place may be ahead of UTC's
    labels: kitLabels(reader, since, plusDays(day, 1)),
    people: kitPeople(reader, day),
    equipment: kitEquipment(reader, seen, day),
    mixes: openMixes(reader, seen, new Date(now.getTime() - MIX_DAYS * DAY_MS).toISOString()),
    last: lastVisits(reader, seen),
    due: placesDue(reader, seen, plusDays(day, DUE_DAYS)),
    recent: recentPlaces(reader, actor.subject.id),
  }))()
}
