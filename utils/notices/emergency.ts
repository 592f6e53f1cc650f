import type { Words } from '#shared/reports/words'

/** What a notice says for the case that somebody feels unwell. */
export interface EmergencyBlock { heading: string, lines: string[] }

/**
 * By country of the place. A country is added only when its numbers were read at their source.
 * US: 911 and Poison Control 1-800-222-1222, day and night (EPA, "In Case of Pesticide Emergency", snapshot of 19 January 2017);
 * National Pesticide Information Center 1-800-858-7378, weekdays 8:00 am to 12:00 pm Pacific, neither an emergency nor a medical line
 * (npic.orst.edu/factsheets/pcc-npic.html).
 */
const BLOCKS: Record<string, (words: Words) => EmergencyBlock> = {
  US: words => ({
    heading: words('notices.emergency.heading'),
    lines: [words('notices.emergency.us.first'), words('notices.emergency.us.poison', { number: '1-800-222-1222' }), words('notices.emergency.us.questions', { number: '1-800-858-7378' })],
  }),
}

/** Null where the country has no checked block: such a notice is not made. */
export const emergencyBlock = (country: string, words: Words): EmergencyBlock | null => BLOCKS[country]?.(words) ?? null
