import { createHash } from 'node:crypto'
import type { CreateSpecBody, ImportReport } from '#shared/schemas/torque-specs'
import type { Context } from '../../context'
import { database } from '../../db'
import { TorqueSpec } from '../../db/models/torque-spec'
import { TorqueSpecRevision } from '../../db/models/torque-spec-revision'
import { authorize } from '../../policies/policy'
import * as policies from '../../policies/torque-specs'
import { Refusal } from '../../refusal'
import { appendAllToLog } from '../log/append'
import { canonicalJson } from '../log/hash'
import { readCsv, type CsvIssue, type CsvRow } from './csv'
import { judgeRow } from './importRow'
import { draftOf } from './specs'

type ReportRow = ImportReport['rows'][number]
type Draft = ReturnType<typeof draftOf>
interface Outcome {
  line: number
  component: string | undefined
  issues: CsvIssue[]
  draft?: Draft
}

/** Rows of one INSERT. */
const rowsAtOnce = 500

/** What makes two rows the same: all that they say, however it is written. */
const keyOf = (body: CreateSpecBody) => createHash('sha256').update(canonicalJson(body), 'utf8').digest('hex')

/** Keys of the shop's imported rows. Two imports of a shop wait for one another, so that no row comes in twice. */
async function keysThere(ctx: Context): Promise<Set<string | null>> {
  await database().query('SELECT pg_advisory_xact_lock(hashtextextended($1, 0))', {
    bind: [`torque_specs.import ${ctx.shop.id}`], transaction: ctx.tx,
  })
  const specs = await TorqueSpec.findAll({
    attributes: ['importKey'], where: { shopId: ctx.shop.id }, raw: true, transaction: ctx.tx,
  })
  return new Set(specs.map(spec => spec.importKey))
}

function judge(ctx: Context, rows: readonly CsvRow[], there: ReadonlySet<string | null>): Outcome[] {
  const lineOf = new Map<string, number>()
  return rows.map((row) => {
    const outcome = { line: row.line, component: row.cells.component?.slice(0, 120) || undefined }
    const judged = judgeRow(row)
    if (!judged.ok) return { ...outcome, issues: judged.issues }
    const key = keyOf(judged.body)
    const earlier = lineOf.get(key)
    if (there.has(key) || earlier !== undefined) {
      const where = earlier === undefined ? 'This row was imported before.' : `This row is the same as line ${earlier}.`
      return { ...outcome, issues: [{ path: '', message: where }] }
    }
    lineOf.set(key, row.line)
    return { ...outcome, issues: [], draft: draftOf(ctx, judged.body, key) }
  })
}

async function write(ctx: Context, drafts: readonly Draft[]): Promise<void> {
  await appendAllToLog(ctx, drafts.map(({ spec, content }) => {
    return { kind: 'torque_specs.import', subject: spec.id, content }
  }))
  for (let start = 0; start < drafts.length; start += rowsAtOnce) {
    const some = drafts.slice(start, start + rowsAtOnce)
    await TorqueSpec.bulkCreate(some.map(draft => draft.spec), { transaction: ctx.tx, returning: false })
    await TorqueSpecRevision.bulkCreate(some.map(draft => draft.revision), { transaction: ctx.tx, returning: false })
  }
}

const reportOf = ({ line, component, issues, draft }: Outcome, written: boolean): ReportRow => ({
  line,
  status: draft ? 'imported' : 'refused',
  ...(draft && written ? { id: draft.spec.id } : {}),
  ...(component === undefined ? {} : { component }),
  flags: draft?.revision.flags ?? [],
  issues,
})

function refusal(rows: ReportRow[], message: string): Refusal {
  return new Refusal(422, 'import_refused', message, { rows })
}

/**
 * Drafts a spec for each row of a CSV file. Each row is judged on its own; flags never refuse. Unless `partial`, one
 * refused row refuses them all.
 * @throws Refusal 422 `import_refused` with the report of every row; rows that are well in themselves have no id then,
 * for nothing was written
 */
export async function importSpecs(
  ctx: Context, text: string, { partial }: { partial: boolean },
): Promise<ImportReport> {
  authorize(ctx.actor, policies.importSpecs, undefined)
  const file = readCsv(text)
  if (!file.ok) {
    const { line, issues } = file
    throw refusal([{ line, status: 'refused', flags: [], issues }], issues[0]?.message ?? 'The file cannot be read.')
  }
  const outcomes = judge(ctx, file.rows, await keysThere(ctx))
  const drafts = outcomes.flatMap(({ draft }) => draft ? [draft] : [])
  const refusedCount = outcomes.length - drafts.length
  if (drafts.length === 0 || (refusedCount > 0 && !partial)) {
    const message = `${refusedCount} of ${outcomes.length} rows are refused. Nothing was imported.`
    throw refusal(outcomes.map(outcome => reportOf(outcome, false)), message)
  }
  await write(ctx, drafts)
  return { rows: outcomes.map(outcome => reportOf(outcome, true)) }
}
