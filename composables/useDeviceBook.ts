import type { DBSchema, IDBPDatabase } from 'idb'
import { openDB } from 'idb'
import type { Kit } from '#shared/books/kit'
import type { Draft } from '#shared/records/draft'

/**
 * A visit on this device. `open`: being written. `signed`: its bytes are frozen and go to the server unchanged, as often as it takes;
 * it goes from the device when the server has said that they are on record.
 */
export interface HeldVisit { who: string, id: string, state: 'open' | 'signed', draft: Draft, frozen: string | null, changedAt: string }

interface DeviceSchema extends DBSchema {
  kits: { key: string, value: Kit }
  visits: { key: [string, string], value: HeldVisit, indexes: { who: string } }
}

let opened: Promise<IDBPDatabase<DeviceSchema>> | undefined

/** What the device keeps, each row under the membership (account and firm) that wrote it. */
export function useDeviceBook(): Promise<IDBPDatabase<DeviceSchema>> {
  return opened ??= openDB<DeviceSchema>('tankside', 1, {
    upgrade(db) {
      db.createObjectStore('kits')
      db.createObjectStore('visits', { keyPath: ['who', 'id'] }).createIndex('who', 'who')
    },
  })
}
