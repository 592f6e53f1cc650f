import { existsSync } from 'node:fs'
import { join } from 'node:path'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { makeFirm } from '../support/firm'
import type { MadeFirm } from '../support/firm'
import { removeDirs, signIn, startServer, temporaryDirs } from '../support/server'

const dirs = temporaryDirs()
let firm: MadeFirm

beforeAll(async () => {
  firm = await makeFirm(dirs)
})
afterAll(() => removeDirs(dirs))

describe('one server a data folder', () => {
  it('a second server on the same data folder refuses to start; the first goes on', async () => {
    const first = await startServer({ dirs })
    await expect(startServer({ dirs })).rejects.toThrow(/another program holds this data folder/)
    expect((await fetch(`${first.url}/api/health`)).status).toBe(200)
    await first.stop()
  })

  it('leaves no journal behind when it is told to end', async () => {
    const server = await startServer({ dirs })
    await signIn(server, firm.people.officer.email)
    await server.stop()
    expect(existsSync(join(dirs.dataDir, 'firms', `${firm.slug}.sqlite-wal`))).toBe(false)
    expect(existsSync(join(dirs.dataDir, 'directory.sqlite-wal'))).toBe(false)
  })
})
