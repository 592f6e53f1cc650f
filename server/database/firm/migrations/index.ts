import type { Migration } from '#server/database/migrate'
import first from './2026-12-01-first'

export const FIRM_MIGRATIONS: Record<string, Migration> = { '2026-12-01-first': first }
