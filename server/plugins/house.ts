import { checkDemonstrationHost } from '#server/services/demonstration'
import { closeHouse, openHouse } from '#server/services/the-house'
import { checkSettings } from '#server/services/settings'

/** Opens the house when the server starts and closes it last, when all requests under way are answered. */
export default defineNitroPlugin((nitro) => {
  const config = useRuntimeConfig()
  checkSettings(config)
  const house = openHouse({ dataDir: config.dataDir, keyDir: config.keyDir, logHost: config.logHost })
  checkDemonstrationHost(house, process.env.NITRO_HOST || process.env.HOST)
  nitro.hooks.hook('close', () => closeHouse())
})
