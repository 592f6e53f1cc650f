import { uuidv7 } from '#shared/ledger/ids'
/** An id as a device makes it for what it signs. */
export const newRecordId = (): string => uuidv7(Date.now(), crypto.getRandomValues(new Uint8Array(10)))
