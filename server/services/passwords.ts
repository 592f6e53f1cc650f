import { randomBytes } from 'node:crypto'
import { Scrypt } from '@adonisjs/hash/drivers/scrypt'
import { AppError } from '#shared/errors'
import { weakness } from '#shared/access/passwords'

/** OWASP ASVS 5.0, appendix C: N at least 2^17, r 8, p 1. About 0.4 s and 128 MiB each. The driver is the one that nuxt-auth-utils uses. */
const COST = { cost: 2 ** 17, blockSize: 8, parallelization: 1, maxMemory: 256 * 1024 * 1024 } as const
const AT_ONCE = 2
const MOST_WAITING = 20
const RETRY_AFTER = 5

const unpadded = (bytes: Buffer) => bytes.toString('base64').replace(/=+$/, '')

/** @throws AppError 422 that names the field and the rule. */
export function assertStrong(password: string, email: string, path: string): void {
  const code = weakness(password, email)
  if (code) throw new AppError('weak-password', [{ path, code }])
}

/** Makes and compares password hashes, two at once; who would wait behind twenty others is sent away (503). */
export class Passwords {
  private readonly scrypt = new Scrypt(COST)
  private readonly waiting: (() => void)[] = []
  private running = 0
  /** Of no password at all: what an unknown address is compared with, so that both take the same time. */
  private readonly nobodys = `$scrypt$n=${COST.cost},r=${COST.blockSize},p=${COST.parallelization}$${unpadded(randomBytes(16))}$${unpadded(randomBytes(64))}`

  make(password: string): Promise<string> {
    return this.inTurn(() => this.scrypt.make(password))
  }

  /** `hash` null (no such account, or none set yet) costs the same and is never right. */
  async matches(hash: string | null, password: string): Promise<boolean> {
    const right = await this.inTurn(() => this.scrypt.verify(hash ?? this.nobodys, password))
    return right && hash !== null
  }

  private async inTurn<T>(work: () => Promise<T>): Promise<T> {
    if (this.running >= AT_ONCE) {
      if (this.waiting.length >= MOST_WAITING) throw new AppError('not-now', [], { retryAfter: RETRY_AFTER })
      await new Promise<void>(resolve => this.waiting.push(resolve))
    }
    else {
      this.running += 1
    }
    try {
      return await work()
    }
    finally {
      // the slot is handed on, not given back, so that nobody slips in between
      const next = this.waiting.shift()
      if (next) next()
      else this.running -= 1
    }
  }
}
