import { RateLimiterMemory, RateLimiterRes } from 'rate-limiter-flexible'
import { AppError } from '#shared/errors'

const MINUTE = 60
const HOUR = 60 * MINUTE

const limiter = (keyPrefix: string, points: number, duration: number) => new RateLimiterMemory({ keyPrefix, points, duration })

/** A network of the sixth version hands every customer 2^64 addresses: they count as one. */
const network = (address: string): string => address.includes(':') && !address.includes('.') ? address.split(':').slice(0, 4).join(':') : address

/** `onLimit` is called for the first refusal of a window only: what is written down of refusals must not be a way to fill the disk. */
async function take(from: RateLimiterMemory, key: string, onLimit?: () => void): Promise<void> {
  try {
    await from.consume(key)
  }
  catch (refused) {
    if (!(refused instanceof RateLimiterRes)) throw refused
    if (refused.consumedPoints === from.points + 1) onLimit?.()
    throw new AppError('too-many', [], { retryAfter: Math.ceil(refused.msBeforeNext / 1000) })
  }
}

/**
 * How often somebody may knock. A try is counted before it is judged and given back when it was right, so that many at once
 * can't slip past. In memory: a restart forgets, one process is one deployment.
 */
export class DoorLimits {
  private readonly pair = limiter('pair', 5, 15 * MINUTE)
  private readonly address = limiter('address', 100, 15 * MINUTE)
  private readonly resetOf = limiter('reset', 3, HOUR)
  private readonly resetFrom = limiter('reset-from', 20, HOUR)
  private readonly linkFrom = limiter('link', 30, 15 * MINUTE)
  private readonly invitesBy = limiter('invite', 60, HOUR)

  /** @throws AppError 429. */
  async trySignIn(email: string, address: string, onLimit: () => void): Promise<void> {
    await take(this.address, network(address), onLimit)
    await take(this.pair, `${email} ${network(address)}`, onLimit)
  }

  async signedIn(email: string, address: string): Promise<void> {
    await this.address.reward(network(address))
    await this.pair.delete(`${email} ${network(address)}`)
  }

  async tryReset(email: string, address: string): Promise<void> {
    await take(this.resetFrom, network(address))
    await take(this.resetOf, email)
  }

  tryLink = (address: string): Promise<void> => take(this.linkFrom, network(address))
  tryInvite = (accountId: string): Promise<void> => take(this.invitesBy, accountId)
}
