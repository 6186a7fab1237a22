import * as z from 'zod/mini'
import { importReport, type ImportReport } from '#shared/schemas/torque-specs'
import { toApiError, type ApiError } from './api-error'
import { formatCount } from './format'

export type ImportRow = ImportReport['rows'][number]

/** Columns of the CSV file in their order, and what goes into them. */
export const importColumns = [
  ['kind', 'joint or general_table'],
  ['component', 'what is tightened; needed'],
  ['application', 'where it sits, such as “engine, cooling system”; needed'],
  ['bolt_count', 'a whole number; empty where the source does not say'],
  ['pattern', 'circle, row or two_rows'],
  ['thread', 'such as M8 or 3/8-16'],
  ['property_class', 'such as 8.8'],
  ['thread_condition', 'such as dry, wet, thread locker'],
  ['target_value', 'the target as printed; empty where only limits are'],
  ['target_unit', 'N.m, lbf.ft, lbf.in, ozf.in, kgf.m, kgf.cm, cN.m, dN.m or kN.m'],
  ['lower_value', 'the lower limit, in target_unit'],
  ['upper_value', 'the upper limit, in target_unit'],
  ['printed_value', 'the target in the second unit printed'],
  ['printed_lower', 'the lower limit in the second unit'],
  ['printed_upper', 'the upper limit in the second unit'],
  ['printed_unit', 'the second unit'],
  ['tolerance_kind', 'percent, absolute or limits; empty: the shop’s own'],
  ['tolerance_value', 'the percent, or the torque in target_unit'],
  ['joint_class', 'safety, sealing or general'],
  ['second_check_required', 'true or false'],
  ['one_time_use', 'true or false'],
  ['source_title', 'the manual; needed'],
  ['source_section', 'paragraph or chapter'],
  ['source_page', 'page'],
  ['source_mark', 'how the source was seen; kept out of the spec'],
] as const

const example = [
  'joint', 'Outlet elbow to head', '"engine, cooling system"', '2', 'row', 'M8', '8.8', 'dry', '22', 'N.m', '', '', '16', '', '', 'lbf.ft',
  'percent', '10', 'sealing', 'false', 'false', 'Demo manual', 'chapter 3', '3-12', '',
]

/** The heading and one example row, as a file to begin with. */
export const importExample = `${importColumns.map(([name]) => name).join(',')}\n${example.join(',')}\n`

export const rowChoices = ['', 'refused', 'flagged', 'said'] as const
export type RowChoice = (typeof rowChoices)[number]

export const isFlagged = (row: ImportRow): boolean => row.flags.length > 0
export const isRefused = (row: ImportRow): boolean => row.status === 'refused'

/** The rows of a report that a choice shows: all, refused, flagged, or those with anything to say. */
export function chosenRows(rows: readonly ImportRow[], choice: RowChoice): ImportRow[] {
  if (choice === 'refused') return rows.filter(isRefused)
  if (choice === 'flagged') return rows.filter(isFlagged)
  return choice === 'said' ? rows.filter(row => isRefused(row) || isFlagged(row)) : [...rows]
}

/** The report in one sentence: "49 rows: 47 imported, 2 refused, 4 with units that disagree". */
export function reportWords(rows: readonly ImportRow[], written: boolean): string {
  const refused = rows.filter(isRefused).length
  const flagged = rows.filter(isFlagged).length
  const parts = [
    `${rows.length - refused} ${written ? 'imported' : 'could be imported'}`,
    ...(refused > 0 ? [`${refused} refused`] : []),
    ...(flagged > 0 ? [`${flagged} with units that disagree`] : []),
  ]
  return `${formatCount(rows.length, 'row')}: ${parts.join(', ')}`
}

const refusedReport = z.object({ rows: importReport.shape.rows })

/** The report that comes with a refused import; null where it was refused for another reason. */
export function reportOf(error: ApiError): ImportReport | null {
  const report = refusedReport.safeParse(toApiError(error).data)
  return report.success ? report.data : null
}
