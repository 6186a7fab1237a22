import { readFileSync } from 'node:fs'
import { describe, expect, it } from 'vitest'
import type { ImportReport } from '#shared/schemas/torque-specs'
import { LogEntry } from '../../../server/db/models/log-entry'
import { TorqueSpec } from '../../../server/db/models/torque-spec'
import { verifyLog } from '../../../server/services/log/queries'
import { importSpecs } from '../../../server/services/torque-specs/import'
import { inTransaction } from '../../../server/transaction'
import { buildShop, buildUser } from '../../factories/shop'
import { useApi } from '../support/api'
import { useDatabase } from '../support/database'

useDatabase()
const api = useApi()

const published = (name: string) => readFileSync(new URL(`../../published/data/${name}.csv`, import.meta.url), 'utf8')
const joints = published('published-joints')
const tables = published('published-general-tables')

async function lead() {
  const shop = await buildShop()
  const caller = await api.as(await buildUser(shop, 'quality_lead'))
  return {
    shop,
    caller,
    send: (csv: string, query = '') => caller.post(`/torque-specs/import${query}`, csv, { 'Content-Type': 'text/csv' }),
    count: () => TorqueSpec.count({ where: { shopId: shop.id } }),
  }
}

const heading = 'kind,component,application,bolt_count,pattern,thread_condition,target_value,target_unit,lower_value,upper_value,printed_value,printed_lower,printed_upper,printed_unit,tolerance_kind,tolerance_value,joint_class,second_check_required,one_time_use,source_title'
const columns = heading.split(',')
/** A row of the file above, one value given by column. */
const row = (values: Record<string, string> = {}) => {
  const whole: Record<string, string> = { component: 'Pump', application: 'engine', target_value: '41', target_unit: 'N.m', source_title: 'Invented manual', ...values }
  return columns.map(column => whole[column] ?? '').join(',')
}
const file = (...rows: string[]) => [heading, ...rows].join('\n')

describe('what was published', () => {
  it('joints: 20 ft·lb beside 25 N·m and 120 in·lb beside 15 N·m are flagged, and no other', async () => {
    const { caller, send } = await lead()
    const { status, body } = await send(joints)
    expect(status).toBe(201)
    const rows: ImportReport['rows'] = body.rows
    expect(rows.map(({ line }) => line)).toEqual([2, 3, 4, 5, 6, 7, 8, 9, 10])
    expect(rows.every(item => item.status === 'imported' && item.issues.length === 0)).toBe(true)
    const flagged = rows.filter(item => item.flags.length > 0)
    expect(flagged.map(item => item.component)).toEqual(['Lubricating oil pump cover', 'Pressure sensing line nut'])
    const specs = await Promise.all(flagged.map(item => caller.get(`/torque-specs/${item.id}`)))
    expect(specs.map(({ body: { revision } }) => [revision.target.value, revision.printed.value])).toEqual([[20, 25], [120, 15]])
  })

  it('general tables: 300 beside 408 and 1820 beside 2712 are flagged, and no other; they land as general tables', async () => {
    const { caller, send } = await lead()
    const { status, body } = await send(tables)
    expect([status, body.rows.length]).toEqual([201, 40])
    const { body: flagged } = await caller.get('/torque-specs?flagged=true&sort=targetNm')
    expect(flagged.items.map(({ revision }: { revision: { target: { value: number }, printed: { value: number } } }) =>
      [revision.target.value, revision.printed.value])).toEqual([[300, 408], [1820, 2712]])
    const { body: listed } = await caller.get('/torque-specs?kind=general_table&limit=200')
    expect(listed.items).toHaveLength(40)
    expect((await caller.get('/torque-specs?kind=joint')).body.items).toEqual([])
  })

  it('is kept as printed', async () => {
    const { caller, send } = await lead()
    const { rows }: ImportReport = (await send(joints)).body
    const read = async (line: number) => (await caller.get(`/torque-specs/${rows.find(item => item.line === line)?.id}`)).body
    const cover = await read(2)
    expect(cover).toMatchObject({ kind: 'joint', component: 'Thermostat cover to water pump', application: 'engine, cooling system' })
    expect(cover.revision).toMatchObject({
      status: 'draft', jointClass: 'sealing', boltCount: 2, pattern: 'row', threadCondition: 'wet', tolerance: null,
      target: { value: 17, unit: 'lbf.ft' }, printed: { value: 23, unit: 'N.m' },
      source: { title: 'US Army TM 5-3825-229-14&P', section: 'paragraph 4-46A', page: '4-95' },
    })
    const pump = await read(3)
    expect(pump.revision).toMatchObject({
      target: null, tolerance: { kind: 'limits', lower: { value: 12, unit: 'lbf.ft' }, upper: { value: 15, unit: 'lbf.ft' } },
    })
    expect((await read(8)).revision.printedLimits).toEqual({ lower: { value: 3.5, unit: 'kgf.m' }, upper: { value: 4.8, unit: 'kgf.m' } })
  })

  it('again is refused, row by row, and nothing is added', async () => {
    const { send, count } = await lead()
    await send(joints)
    for (const query of ['', '?partial=true']) {
      const { status, body } = await send(joints, query)
      expect([status, body.data.code]).toEqual([422, 'import_refused'])
      expect(body.rows).toEqual(body.data.rows)
      expect(body.rows.every((item: ImportReport['rows'][number]) => item.status === 'refused')).toBe(true)
    }
    expect(await count()).toBe(9)
    expect((await (await lead()).send(joints)).status).toBe(201)
  })
})

describe('rows', () => {
  it('one refused refuses all, unless partial', async () => {
    const { shop, send, count } = await lead()
    const csv = file(row(), row({ component: 'Cover', target_value: '-3' }), row({ component: 'Pipe' }))
    const whole = await send(csv)
    expect([whole.status, whole.body.statusCode, whole.body.data.code]).toEqual([422, 422, 'import_refused'])
    expect(whole.body.rows).toMatchObject([{ line: 2, status: 'imported' }, { line: 3, status: 'refused', component: 'Cover' }, { line: 4 }])
    expect(whole.body.rows.some((item: object) => 'id' in item)).toBe(false)
    expect([await count(), await LogEntry.count({ where: { shopId: shop.id } })]).toEqual([0, 0])

    const partial = await send(csv, '?partial=true')
    expect(partial.status).toBe(201)
    expect(partial.body.rows.map((item: object) => 'id' in item)).toEqual([true, false, true])
    expect([await count(), await LogEntry.count({ where: { shopId: shop.id, kind: 'torque_specs.import' } })]).toEqual([2, 2])
  })

  it('the same twice in one file is refused, however it is written', async () => {
    const { send } = await lead()
    const { body } = await send(file(row(), row({ component: 'Other' }), row({ component: ' Pump ', target_value: '41.0' })), '?partial=true')
    expect(body.rows[2]).toMatchObject({ line: 4, status: 'refused', issues: [{ message: 'This row is the same as line 2.' }] })
  })

  it('two imports at once bring a row in once', async () => {
    const { send, count } = await lead()
    const answers = await Promise.all([send(file(row())), send(file(row()))])
    expect(answers.map(answer => answer.status).toSorted()).toEqual([201, 422])
    expect(await count()).toBe(1)
  })

  it.each<[string, Record<string, string>, string]>([
    ['no component', { component: '' }, 'component'],
    ['no source', { source_title: '' }, 'source_title'],
    ['another kind', { kind: 'table' }, 'kind'],
    ['a decimal comma', { target_value: '"12,5"' }, 'target_value'],
    ['grouping', { target_value: '"1,200"' }, 'target_value'],
    ['a word for a number', { target_value: 'forty' }, 'target_value'],
    ['NaN', { target_value: 'NaN' }, 'target_value'],
    ['Infinity', { target_value: 'Infinity' }, 'target_value'],
    ['beyond infinity', { target_value: '1e999' }, 'target_value'],
    ['1e308', { target_value: '1e308' }, 'target_value'],
    ['zero', { target_value: '0' }, 'target_value'],
    ['a negative', { target_value: '-41' }, 'target_value'],
    ['far too small', { target_value: '1e-300' }, 'target_value'],
    ['no target', { target_value: '' }, 'target_value'],
    ['no unit', { target_unit: '' }, 'target_unit'],
    ['an unknown unit', { target_unit: 'ft-lb' }, 'target_unit'],
    ['10 000 characters', { component: 'x'.repeat(10_000) }, 'component'],
    ['a count that is none', { bolt_count: '4.5' }, 'bolt_count'],
    ['an unknown pattern', { pattern: 'star' }, 'pattern'],
    ['two rows of an odd count', { pattern: 'two_rows', bolt_count: '5' }, 'bolt_count'],
    ['a pattern drawn nowhere', { pattern: 'free', bolt_count: '5' }, 'pattern'],
    ['a lower limit alone', { lower_value: '40' }, 'upper_value'],
    ['limits the wrong way round', { lower_value: '45', upper_value: '40' }, 'upper_value'],
    ['a target outside', { lower_value: '10', upper_value: '20' }, 'target_value'],
    ['limits and percent', { lower_value: '40', upper_value: '45', tolerance_kind: 'percent', tolerance_value: '5' }, 'tolerance_kind'],
    ['a tolerance without a kind', { tolerance_value: '5' }, 'tolerance_kind'],
    ['percent without a value', { tolerance_kind: 'percent' }, 'tolerance_value'],
    ['100 percent', { tolerance_kind: 'percent', tolerance_value: '100' }, 'tolerance_value'],
    ['half the limits', { tolerance_kind: 'limits', upper_value: '45' }, 'lower_value'],
    ['another tolerance', { tolerance_kind: 'about' }, 'tolerance_kind'],
    ['a margin as large as the target', { tolerance_kind: 'absolute', tolerance_value: '41' }, 'tolerance_value'],
    ['a printed value without unit', { printed_value: '30' }, 'printed_unit'],
    ['half a printed range', { printed_lower: '30', printed_unit: 'lbf.ft' }, 'printed_upper'],
    ['yes for true', { one_time_use: 'yes' }, 'one_time_use'],
    ['an unknown class', { joint_class: 'critical' }, 'joint_class'],
  ])('%s is refused beside its column', async (_, values, path) => {
    const { send } = await lead()
    const { status, body } = await send(file(row(values)))
    expect(status).toBe(422)
    expect(body.rows[0].issues.map((issue: { path: string }) => issue.path), JSON.stringify(body.rows)).toEqual([path])
    expect(body.rows[0].issues[0].message).toMatch(/\.$/)
  })

  it('takes tolerance in percent, absolute, by limits and by default', async () => {
    const { caller, send } = await lead()
    const { status, body } = await send(file(
      row({ tolerance_kind: 'percent', tolerance_value: '5' }), row({ tolerance_kind: 'Absolute', tolerance_value: '2' }),
      row({ lower_value: '40', upper_value: '45' }), row(),
    ))
    expect(status, JSON.stringify(body)).toBe(201)
    const limits = await Promise.all(body.rows.map(async ({ id }: { id: string }) => {
      const { lowerNm, upperNm } = (await caller.get(`/torque-specs/${id}`)).body.revision.limits
      return [lowerNm, upperNm].map(value => Number(value.toFixed(6)))
    }))
    expect(limits).toEqual([[38.95, 43.05], [39, 43], [40, 45], [36.9, 45.1]])
  })
})

describe('files', () => {
  it.each([
    ['a byte order mark', (csv: string) => `\uFEFF${csv}`],
    ['CRLF', (csv: string) => csv.replaceAll('\n', '\r\n')],
    ['semicolons', (csv: string) => csv.replaceAll(',', ';')],
    ['capitals and spaces in the heading', (csv: string) => csv.replace(heading, heading.toUpperCase().replaceAll(',', ' , '))],
    ['blank lines', (csv: string) => csv.replace('\n', '\n\n,,,\n\n') + '\n\n'],
    ['an inch mark', (csv: string) => csv.replace('Pump', 'Capscrew 1/4" long')],
  ])('with %s are read', async (_, change) => {
    const { send } = await lead()
    const { status, body } = await send(change(file(row())))
    expect([status, body.rows?.length], JSON.stringify(body)).toEqual([201, 1])
  })

  it('count their lines as an editor does', async () => {
    const { send } = await lead()
    const csv = `${file(row({ component: '"Pump\r\nto block"' }))}\r\n\r\n${row({ component: '' })}`
    expect((await send(csv)).body.rows.map((item: { line: number }) => item.line)).toEqual([2, 5])
  })

  it.each([
    ['nothing', '', ''],
    ['only blank lines', '\n\n', ''],
    ['a heading alone', heading, ''],
    ['an unknown column', `${heading},colour\n${row()},red`, 'colour'],
    ['a nameless column', `${heading},\n${row()},red`, ''],
    ['a column twice', `${heading},component\n${row()},red`, 'component'],
    ['a missing column', file(row()).replace('source_title', 'source_page'), 'source_title'],
    ['no torque', 'component,application,target_unit,source_title\nPump,engine,N.m,Invented manual', 'target_value'],
    ['no heading', row(), 'component'],
  ])('of %s are refused at the heading', async (_, csv, path) => {
    const { send, count } = await lead()
    for (const query of ['', '?partial=true']) {
      const { status, body } = await send(csv, query)
      expect([status, body.data.code, body.rows.length]).toEqual([422, 'import_refused', 1])
      expect(body.rows[0]).toMatchObject({ line: 1, status: 'refused' })
      expect(body.rows[0].issues.map((issue: { path: string }) => issue.path)).toContain(path)
    }
    expect(await count()).toBe(0)
  })

  it.each([
    ['too many cells', `${row()},more`],
    ['too few cells', 'joint,Pump,engine'],
    ['letters that are no UTF-8', row({ component: 'Pumpe f\uFFFDr Wasser' })],
  ])('with %s in a row refuse that row', async (_, wrong) => {
    const { send } = await lead()
    const { status, body } = await send(file(row(), wrong), '?partial=true')
    expect([status, body.rows[0].status, body.rows[1].status, body.rows[1].line]).toEqual([201, 'imported', 'refused', 3])
  })

  it('with a quotation mark that is not closed say where', async () => {
    const { send } = await lead()
    const { status, body } = await send(file(row(), row({ component: '"Pump' })))
    expect([status, body.rows[0].line, body.rows[0].status]).toEqual([422, 3, 'refused'])
    expect(body.rows[0].issues[0].message).toMatch(/quotation mark/)
  })

  it('of more than 5 MB are too large; JSON is another type', async () => {
    const { caller, send } = await lead()
    expect((await send('x'.repeat(5_000_001))).status).toBe(413)
    expect((await caller.post('/torque-specs/import', {})).status).toBe(415)
  })

  it('of thousands of rows take seconds, and the log holds together', async () => {
    const shop = await buildShop()
    const actor = await buildUser(shop, 'foreman')
    const csv = file(...Array.from({ length: 3000 }, (_, index) => row({ component: `Bolt ${index}`, printed_value: '30', printed_unit: 'lbf.ft' })))
    const started = performance.now()
    const { rows } = await inTransaction({ actor, shop, now: new Date() }, ctx => importSpecs(ctx, csv, { partial: false }))
    expect(performance.now() - started).toBeLessThan(30_000)
    expect(rows).toHaveLength(3000)
    expect(await verifyLog(shop.id)).toMatchObject({ ok: true, head: { sequence: 3000 } })
    const caller = await api.as(actor)
    for (const sort of ['component', '-targetNm', 'status', 'source']) {
      const began = performance.now()
      expect((await caller.get(`/torque-specs?sort=${sort}&limit=50`)).body.items).toHaveLength(50)
      expect(performance.now() - began, sort).toBeLessThan(2000)
    }
  }, 60_000)
})
