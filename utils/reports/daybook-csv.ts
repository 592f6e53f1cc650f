import type { DaybookRow } from '#shared/api/contract/daybook'

/** Columns of the export, in order; `docs/daybook-csv.md` says what each holds. */
export const CSV_COLUMNS = [
  'reference', 'id', 'status', 'confirmation', 'local_day', 'started_at', 'finished_at', 'zone', 'recorded_at', 'late', 'place', 'address', 'county', 'state', 'site', 'product', 'registration_number', 'ingredients', 'restricted_use',
  'amount', 'amount_unit', 'finished_spray', 'finished_spray_unit', 'method', 'equipment', 'targets', 'areas', 'treated_area', 'treated_area_unit', 'weather', 'temperature', 'temperature_unit', 'wind', 'wind_unit', 'wind_from', 'applicator', 'licence', 'licence_state', 'findings',
] as const

/** Text that a spreadsheet would take for a formula gets an apostrophe before it (OWASP ASVS 5.0, 1.2.10). Figures are validated numbers and stay bare. */
const text = (value: string | null): string => value === null ? '' : /^[=+\-@\t\r]/.test(value) ? `'${value}` : value

function weatherOf({ weather }: DaybookRow): string[] {
  if (typeof weather === 'string') return [weather, '', '', '', '', '']
  return [weather.calm ? 'calm' : 'taken', weather.temperature?.value ?? '', weather.temperature?.unit ?? '', weather.wind?.value ?? '', weather.wind?.unit ?? '', weather.from ?? '']
}

/** A row of the export for each product of an entry; one for a visit with nothing applied. */
export function csvRows(row: DaybookRow): string[][] {
  const sizes = row.areas.flatMap(area => area.size ? [area.size] : [])
  const single = sizes.length === 1 && row.areas.length === 1 ? sizes[0] : undefined
  const before = [row.reference, row.root, row.kind === 'nothing' ? 'nothing-applied' : row.status, row.confirmation, row.localDay, row.startedAt ?? '', row.finishedAt, row.zone, row.recordedAt, row.late ? 'yes' : 'no', text(row.place.name), text(row.place.address), text(row.place.county), row.place.region, text(row.place.siteKind)]
  const after = [row.finished?.value ?? '', row.finished?.unit ?? '', text(row.method), text(row.equipment), text(row.targets.join('; ')), text(row.areas.map(a => a.size ? `${a.place} (${a.size.value} ${a.size.unit})` : a.place).join('; ')), single?.value ?? '', single?.unit ?? '',
    ...weatherOf(row), text(row.person), text(row.licence?.number ?? null), row.licence?.region ?? '', (row.findings ?? []).map(f => `${f.outcome} ${f.message}`).join('; ')]
  if (row.lines.length === 0) return [[...before, '', '', '', '', '', '', ...after]]
  return row.lines.map(line => [...before, text(line.name), text(line.number), text(line.ingredients.map(i => `${i.name} ${i.percent}%`).join('; ')), line.restrictedUse ? 'yes' : 'no', line.amount?.value ?? '', line.amount?.unit ?? '', ...after])
}
