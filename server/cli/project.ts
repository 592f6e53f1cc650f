import { House } from '#server/services/house'
import { realWorld } from '#server/services/the-house'
import { rebuildProjections } from '#server/services/rebuild-projections'

/** `npm run project`: facts, standing and search of every firm written again from its leaves. The server must be stopped. */
const house = new House({ dataDir: process.env.NUXT_DATA_DIR ?? '.data', keyDir: process.env.NUXT_KEY_DIR ?? '.keys', logHost: process.env.NUXT_LOG_HOST ?? '' }, realWorld)
for (const slug of house.slugs()) console.log(`${slug}: ${rebuildProjections(house.firm(slug).raw)} leaves read, projections written again`)
house.close()
