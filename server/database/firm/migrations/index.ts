import type { Migration } from '#server/database/migrate'
import first from './2026-12-01-first'
import noticePaper from './2026-12-01-notice-paper'

export const FIRM_MIGRATIONS: Record<string, Migration> = { '2026-12-01-first': first, '2026-12-01-notice-paper': noticePaper }
