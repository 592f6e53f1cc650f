import { createPrivateKey, createPublicKey, generateKeyPairSync } from 'node:crypto'
import { existsSync, mkdirSync, readFileSync, writeFileSync } from 'node:fs'
import { join } from 'node:path'
import type { Kysely } from 'kysely'
import { LRUCache } from 'lru-cache'
import { kyselyOn, openLock, openReader, openWriter } from '#server/database/connection'
import type { Raw } from '#server/database/connection'
import { migrate } from '#server/database/migrate'
import { brokenTriggers } from '#server/database/firm/append-only'
import { FIRM_MIGRATIONS } from '#server/database/firm/migrations/index'
import type { FirmDatabase, FirmRow } from '#server/database/firm/tables'
import { DIRECTORY_MIGRATIONS } from '#server/database/directory/migrations/index'
import type { DirectoryDatabase } from '#server/database/directory/tables'
import { toHex, sha256 } from '#shared/ledger/hash'
import { uuidv7 } from '#shared/ledger/ids'

/** What services may not reach for themselves: the clock and randomness. */
export interface World {
  now: () => Date
  random: (size: number) => Uint8Array
}

export const newId = (world: World): string => uuidv7(world.now().getTime(), world.random(10))

/** A firm's file, open: one writing connection (the ledger's, synchronous), one reading connection. */
export interface FirmFile {
  readonly id: string
  readonly slug: string
  readonly path: string
  readonly raw: Raw
  readonly reader: Raw
  readonly read: Kysely<FirmDatabase>
}

export interface Directory { readonly raw: Raw, readonly db: Kysely<DirectoryDatabase> }

export interface HouseSettings { dataDir: string, keyDir: string, logHost: string, openFirms?: number }

export interface NewFirm { id: string, slug: string, name: string, address: string, phone: string, country: string, mailFrom: string }

/** All files of one deployment. There is one house a process; it holds the lock on the data folder while it is open. */
export class House {
  readonly directory: Directory
  private readonly lock: Raw | null
  private readonly open: LRUCache<string, FirmFile>
  /** Firms whose file did not open when it was last asked for, and why. */
  readonly closedFirms = new Map<string, string>()

  constructor(readonly settings: HouseSettings, readonly world: World, options: { lock?: boolean } = {}) {
    mkdirSync(join(settings.dataDir, 'firms'), { recursive: true })
    mkdirSync(settings.keyDir, { recursive: true, mode: 0o700 })
    this.lock = options.lock === false ? null : takeLock(join(settings.dataDir, 'lock.sqlite'))
    const raw = openWriter(join(settings.dataDir, 'directory.sqlite'))
    migrate(raw, DIRECTORY_MIGRATIONS)
    this.directory = { raw, db: kyselyOn<DirectoryDatabase>(raw) }
    this.open = new LRUCache({ max: settings.openFirms ?? 64, dispose: closeFirm })
  }

  private pathOf(slug: string): string {
    if (!/^[a-z0-9][a-z0-9-]{0,60}$/.test(slug)) throw new Error(`not a firm's short name: ${slug}`)
    return join(this.settings.dataDir, 'firms', `${slug}.sqlite`)
  }

  /** Opens on demand. @throws when the file is missing or its triggers are not as this program makes them: such a firm stays closed. */
  firm(slug: string): FirmFile {
    const held = this.open.get(slug)
    if (held) return held
    const path = this.pathOf(slug)
    if (!existsSync(path)) throw new Error(`no file for firm ${slug}`)
    const file = openFirm(slug, path)
    if (!existsSync(this.keyPath(slug))) throw new Error(`no key for firm ${slug}: ${this.keyPath(slug)}`)
    this.open.set(slug, file)
    return file
  }

  /** The firm's file, or null when it stays closed; the reason is kept for the operator (`closedFirms`), the other firms go on. */
  openOrClosed(slug: string): FirmFile | null {
    try {
      const file = this.firm(slug)
      this.closedFirms.delete(slug)
      return file
    }
    catch (error) {
      this.closedFirms.set(slug, error instanceof Error ? error.message : String(error))
      return null
    }
  }

  firmById(id: string): FirmFile {
    const row = this.directory.raw.prepare('select slug from firm where id = ?').get(id) as { slug: string } | undefined
    if (!row) throw new Error(`no firm ${id}`)
    return this.firm(row.slug)
  }

  slugs(): string[] {
    return (this.directory.raw.prepare('select slug from firm order by slug').all() as { slug: string }[]).map(row => row.slug)
  }

  private keyPath(slug: string): string {
    return join(this.settings.keyDir, `${slug}.ed25519.pem`)
  }

  /** The firm's file, key and directory row, in that order: a crash in between leaves a file that nothing names. */
  createFirm(firm: NewFirm): FirmFile {
    const path = this.pathOf(firm.slug)
    if (existsSync(path)) throw new Error(`firm ${firm.slug} exists`)
    const fingerprint = makeKey(this.keyPath(firm.slug))
    const raw = openWriter(path)
    migrate(raw, FIRM_MIGRATIONS)
    const at = this.world.now().toISOString()
    const origin = `${this.settings.logHost}/${firm.id}/1`
    const row: FirmRow = { id: firm.id, slug: firm.slug, name: firm.name, address: firm.address, phone: firm.phone, country: firm.country, mail_from: firm.mailFrom, origin, key_fingerprint: fingerprint, created_at: at }
    raw.prepare(`insert into firm (${Object.keys(row).join(', ')}) values (${Object.keys(row).map(name => `@${name}`).join(', ')})`).run(row)
    raw.close()
    this.directory.raw.prepare('insert into firm (id, slug, name, created_at) values (?, ?, ?, ?)').run(firm.id, firm.slug, firm.name, at)
    return this.firm(firm.slug)
  }

  close(): void {
    this.open.clear()
    this.directory.raw.close()
    this.lock?.close()
  }
}

function openFirm(slug: string, path: string): FirmFile {
  const raw = openWriter(path)
  migrate(raw, FIRM_MIGRATIONS)
  const broken = brokenTriggers(raw)
  if (broken.length > 0) {
    raw.close()
    throw new Error(`firm ${slug} stays closed: these triggers are missing or altered: ${broken.join(', ')}`)
  }
  const { id } = raw.prepare('select id from firm').get() as { id: string }
  const reader = openReader(path)
  return { id, slug, path, raw, reader, read: kyselyOn<FirmDatabase>(reader) }
}

function closeFirm(file: FirmFile): void {
  file.reader.close()
  file.raw.close()
}

/** An exclusive transaction that lasts as long as the house: the operating system ends it with the process, however that ends. */
function takeLock(path: string): Raw {
  const lock = openLock(path)
  try {
    lock.exec('begin exclusive')
    return lock
  }
  catch {
    lock.close()
    throw new Error(`another program holds this data folder (${path}): stop it first`)
  }
}

/** Makes the firm's Ed25519 key, outside the data. @returns the fingerprint: SHA-256 of the public key, hex. */
function makeKey(path: string): string {
  const pem = existsSync(path) ? readFileSync(path, 'utf8') : generateKeyPairSync('ed25519', { privateKeyEncoding: { type: 'pkcs8', format: 'pem' }, publicKeyEncoding: { type: 'spki', format: 'pem' } }).privateKey
  writeFileSync(path, pem, { mode: 0o600 })
  const spki = createPublicKey(createPrivateKey(pem)).export({ type: 'spki', format: 'der' })
  return toHex(sha256(new Uint8Array(spki.subarray(-32))))
}
