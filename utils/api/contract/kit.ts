import type { Contracts } from '#shared/api/contract/define'
import { KitSchema } from '#shared/books/kit'

export const KIT = {
  'GET /api/kit': { ability: 'kit.read', summary: 'All that the entry form needs to work without the server: books of the own branches, open tanks, last visits, what is due', answers: { 200: KitSchema } },
} as const satisfies Contracts
