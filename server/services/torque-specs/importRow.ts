import { sayIssue } from '#shared/schemas/messages'
import { createSpecBody, type CreateSpecBody } from '#shared/schemas/torque-specs'
import type { CsvIssue, CsvRow, ImportColumn } from './csv'

/** A row as the body that POST takes, or what is wrong with it, beside the columns. */
export type JudgedRow = { ok: true, body: CreateSpecBody } | { ok: false, issues: CsvIssue[] }

// A field of the body that is not named like its column.
const columnOf: Record<string, ImportColumn> = {
  'boltCount': 'bolt_count',
  'propertyClass': 'property_class',
  'threadCondition': 'thread_condition',
  'target': 'target_value',
  'target.value': 'target_value',
  'target.unit': 'target_unit',
  'tolerance': 'tolerance_kind',
  'tolerance.kind': 'tolerance_kind',
  'tolerance.value': 'tolerance_value',
  'tolerance.unit': 'target_unit',
  'tolerance.lower': 'lower_value',
  'tolerance.lower.value': 'lower_value',
  'tolerance.lower.unit': 'target_unit',
  'tolerance.upper': 'upper_value',
  'tolerance.upper.value': 'upper_value',
  'tolerance.upper.unit': 'target_unit',
  'printed': 'printed_value',
  'printed.value': 'printed_value',
  'printed.unit': 'printed_unit',
  'printedLimits.lower': 'printed_lower',
  'printedLimits.lower.value': 'printed_lower',
  'printedLimits.lower.unit': 'printed_unit',
  'printedLimits.upper': 'printed_upper',
  'printedLimits.upper.value': 'printed_upper',
  'printedLimits.upper.unit': 'printed_unit',
  'places': 'pattern',
  'jointClass': 'joint_class',
  'secondCheckRequired': 'second_check_required',
  'oneTimeUse': 'one_time_use',
  'source.title': 'source_title',
  'source.section': 'source_section',
  'source.page': 'source_page',
}

/** Reads the cells of one row, and keeps what it could not read. */
class Cells {
  readonly issues: CsvIssue[] = []
  constructor(private readonly cells: CsvRow['cells']) {}

  text(column: ImportColumn): string | undefined {
    return this.cells[column] || undefined
  }

  number(column: ImportColumn): number | undefined {
    const typed = this.text(column)
    if (typed === undefined) return undefined
    if (/^[+-]?(?:\d+\.?\d*|\.\d+)(?:e[+-]?\d+)?$/i.test(typed)) return Number(typed)
    return this.wrong(column, typed.includes(',')
      ? `Write ${typed.slice(0, 20)} with a decimal point and without grouping, such as 12.5.`
      : `${typed.slice(0, 20)} is not a number. Write it like 12.5.`)
  }

  boolean(column: ImportColumn): boolean | undefined {
    const typed = this.text(column)?.toLowerCase()
    if (typed === undefined) return undefined
    return typed === 'true' || typed === 'false' ? typed === 'true' : this.wrong(column, 'Write true or false.')
  }

  wrong(column: ImportColumn, message: string): undefined {
    this.issues.push({ path: column, message })
    return undefined
  }
}

/** A number with its unit, where there is a number. */
const quantity = (value: number | undefined, unit: string | undefined) =>
  value === undefined ? undefined : { value, unit }

function toleranceOf(cells: Cells) {
  const lower = cells.number('lower_value')
  const upper = cells.number('upper_value')
  const value = cells.number('tolerance_value')
  const unit = cells.text('target_unit')
  const hasLimits = lower !== undefined || upper !== undefined
  const kind = cells.text('tolerance_kind')?.toLowerCase() ?? (hasLimits ? 'limits' : undefined)
  if (hasLimits && kind !== 'limits') {
    return cells.wrong('tolerance_kind', 'Lower and upper limit are given: write limits here, or leave it empty.')
  }
  if (value !== undefined && kind !== 'percent' && kind !== 'absolute') {
    return cells.wrong('tolerance_kind', 'A tolerance is given: write percent or absolute here.')
  }
  if (kind === undefined) return undefined
  if (kind === 'limits') return { kind, lower: quantity(lower, unit), upper: quantity(upper, unit) }
  return { kind, value, ...(kind === 'absolute' ? { unit } : {}) }
}

function bodyOf(cells: Cells) {
  const printedUnit = cells.text('printed_unit')
  const [printedLower, printedUpper] = [cells.number('printed_lower'), cells.number('printed_upper')]
  return {
    kind: cells.text('kind'),
    component: cells.text('component'),
    application: cells.text('application'),
    boltCount: cells.number('bolt_count'),
    pattern: cells.text('pattern'),
    thread: cells.text('thread'),
    propertyClass: cells.text('property_class'),
    threadCondition: cells.text('thread_condition'),
    target: quantity(cells.number('target_value'), cells.text('target_unit')),
    printed: quantity(cells.number('printed_value'), printedUnit),
    printedLimits: printedLower === undefined && printedUpper === undefined
      ? undefined
      : { lower: quantity(printedLower, printedUnit), upper: quantity(printedUpper, printedUnit) },
    tolerance: toleranceOf(cells),
    jointClass: cells.text('joint_class'),
    secondCheckRequired: cells.boolean('second_check_required'),
    oneTimeUse: cells.boolean('one_time_use'),
    source: {
      title: cells.text('source_title'),
      section: cells.text('source_section'),
      page: cells.text('source_page'),
    },
  }
}

/** Judges one row on its own, by the same schema as a spec that is typed in. */
export function judgeRow(row: CsvRow): JudgedRow {
  if (row.issues.length > 0) return { ok: false, issues: row.issues }
  const cells = new Cells(row.cells)
  const result = createSpecBody.safeParse(bodyOf(cells), { error: sayIssue })
  if (result.success && cells.issues.length === 0) return { ok: true, body: result.data }
  const unread = new Set(cells.issues.map(issue => issue.path))
  const issues = (result.error?.issues ?? []).map(({ path, message }) => {
    const field = path.join('.')
    return { path: columnOf[field] ?? field, message }
  })
  // What could not be read is missing to the schema, too: once is enough.
  const others = issues.filter(({ path }, index) =>
    !unread.has(path) && issues.findIndex(issue => issue.path === path) === index)
  return { ok: false, issues: [...cells.issues, ...others] }
}
