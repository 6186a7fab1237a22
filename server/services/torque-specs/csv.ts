import { CsvError, parse } from 'csv-parse/sync'

/** The columns of an import file. Where the heading leaves one out, its cells count as empty. */
export const importColumns = [
  'kind', 'component', 'application', 'bolt_count', 'pattern', 'thread', 'property_class', 'thread_condition',
  'target_value', 'target_unit', 'lower_value', 'upper_value', 'printed_value', 'printed_lower', 'printed_upper',
  'printed_unit', 'tolerance_kind', 'tolerance_value', 'joint_class', 'second_check_required', 'one_time_use',
  'source_title', 'source_section', 'source_page', 'source_mark',
] as const
export type ImportColumn = typeof importColumns[number]

const needed: readonly ImportColumn[] = ['component', 'application', 'target_unit', 'source_title']

export interface CsvIssue {
  path: string
  message: string
}
/** A row of the file: the line it begins on, the heading being line 1, and its cells, trimmed. */
export interface CsvRow {
  line: number
  cells: Partial<Record<ImportColumn, string>>
  issues: CsvIssue[]
}
/** The rows, or what is wrong with the file as a whole, and in which line. */
export type CsvFile = { ok: true, rows: CsvRow[] } | { ok: false, line: number, issues: CsvIssue[] }

const isColumn = (name: string): name is ImportColumn => importColumns.some(column => column === name)

function headingIssues(heading: readonly string[]): CsvIssue[] {
  const has = (...columns: ImportColumn[]) => columns.every(column => heading.includes(column))
  return [
    ...heading.flatMap((name, index) => {
      if (name === '') return [{ path: name, message: `Column ${index + 1} has no name.` }]
      if (!isColumn(name)) return [{ path: name, message: `The column ${name.slice(0, 60)} is not known.` }]
      return heading.indexOf(name) === index ? [] : [{ path: name, message: `The column ${name} is there twice.` }]
    }),
    ...needed.filter(column => !has(column)).map(column => ({ path: column, message: `The column ${column} is missing.` })),
    ...(has('target_value') || has('lower_value', 'upper_value')
      ? []
      : [{ path: 'target_value', message: 'There must be a column target_value, or lower_value and upper_value.' }]),
  ]
}

function rowOf(heading: readonly string[], cells: readonly string[], line: number): CsvRow {
  const named: CsvRow['cells'] = {}
  for (const [index, name] of heading.entries()) if (isColumn(name)) named[name] = cells[index] ?? ''
  const issues = [
    ...(cells.length === heading.length
      ? []
      : [{ path: '', message: `There are ${cells.length} cells, but ${heading.length} columns.` }]),
    ...(cells.some(cell => cell.includes('\uFFFD'))
      ? [{ path: '', message: 'A letter cannot be read. Save the file as UTF-8.' }]
      : []),
  ]
  return { line, cells: named, issues }
}

const wholeFile = (line: number, message: string): CsvFile => ({ ok: false, line, issues: [{ path: '', message }] })

/**
 * Reads a CSV file with our heading: comma or semicolon between cells, any line ends, a byte order mark or none, blank
 * lines anywhere. Never throws.
 */
export function readCsv(text: string): CsvFile {
  const lines = text.replace(/^\uFEFF/, '').replace(/\r\n?/g, '\n')
  const first = lines.trimStart().split('\n', 1)[0] ?? ''
  const records: { line: number, cells: string[] }[] = []
  try {
    parse(lines, {
      delimiter: first.includes(';') && !first.includes(',') ? ';' : ',',
      relax_column_count: true,
      // An inch mark in a cell without quotes: 1/4".
      relax_quotes: true,
      skip_empty_lines: true,
      skip_records_with_empty_values: true,
      trim: true,
      on_record: (cells, { lines: last }) => {
        // A cell in quotes may go over several lines.
        records.push({ line: last - cells.join('').split('\n').length + 1, cells })
        return null
      },
    })
  } catch (error) {
    if (!(error instanceof CsvError)) throw error
    const message = 'The file cannot be read from here on: a quotation mark is out of place, or is not closed.'
    return wholeFile(Number(error.lines) || 1, message)
  }
  const [heading, ...rows] = records
  if (!heading) return wholeFile(1, 'The file is empty.')
  const names = heading.cells.map(name => name.toLowerCase())
  const issues = headingIssues(names)
  if (issues.length > 0) return { ok: false, line: heading.line, issues }
  if (rows.length === 0) return wholeFile(heading.line, 'There are no rows under the heading.')
  return { ok: true, rows: rows.map(({ line, cells }) => rowOf(names, cells, line)) }
}
