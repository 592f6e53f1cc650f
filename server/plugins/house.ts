import { randomUUID } from 'node:crypto'
import { DemoMailbox, demoTransport } from '#server/mail/demo-mailbox'
import { smtpTransport } from '#server/mail/transport'
import { checkDemonstrationHost, isDemonstration } from '#server/services/demonstration'
import { closeHouse, openHouse } from '#server/services/the-house'
import { checkMailUrl, checkSettings } from '#server/services/settings'
import { startJobs, stopJobs } from '#server/services/the-jobs'

/** Opens the house when the server starts; closes all in order when the requests under way are answered: jobs, mail, drawing thread, house. */
export default defineNitroPlugin((nitro) => {
  const config = useRuntimeConfig()
  checkSettings(config)
  const house = openHouse({ dataDir: config.dataDir, keyDir: config.keyDir, logHost: config.logHost })
  checkDemonstrationHost(house, process.env.NITRO_HOST || process.env.HOST)
  const demo = isDemonstration(house)
  checkMailUrl(config.mail.url, demo)
  const mailbox = demo && config.mail.url === '' ? new DemoMailbox(config.dataDir) : null
  const arrival = () => `${house.world.now().toISOString().replace(/\D/g, '')}-${randomUUID().slice(0, 8)}`
  startJobs({ house, accountFrom: config.mail.from, mailbox, transport: mailbox ? demoTransport(mailbox, arrival) : Promise.resolve(smtpTransport(config.mail.url)) })
  nitro.hooks.hook('close', async () => {
    await stopJobs()
    closeHouse()
  })
})
