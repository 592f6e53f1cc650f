import { Readable } from 'node:stream'
import { stringify } from 'csv-stringify/sync'
import type { Actor } from '#shared/access/abilities'
import type { DaybookFilter } from '#shared/api/contract/daybook'
import { CSV_COLUMNS, csvRows } from '#shared/reports/daybook-csv'
import { readDaybook } from '#server/services/daybook'
import type { FirmFile } from '#server/services/house'

const PAGE = 200

/** What the filters find, as CSV, page by page: the reader's pace is ours. */
export function exportCsv(file: FirmFile, actor: Actor, filter: DaybookFilter): Readable {
  return Readable.from(pages(file, actor, filter))
}

async function* pages(file: FirmFile, actor: Actor, filter: DaybookFilter): AsyncGenerator<string> {
  yield stringify([[...CSV_COLUMNS]])
  let cursor: string | undefined
  do {
    const { rows, next } = await readDaybook(file, actor, { ...filter, sort: '-finishedAt', limit: PAGE, cursor })
    yield stringify(rows.flatMap(csvRows))
    cursor = next ?? undefined
  } while (cursor !== undefined)
}
