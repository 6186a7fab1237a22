import { mountSuspended, registerEndpoint } from '@nuxt/test-utils/runtime'
import { getQuery, setResponseStatus } from 'h3'
import { describe, expect, it } from 'vitest'
import { TorqueSpecImportChoose, TorqueSpecImportReport } from '#components'
import ImportPage from '~/pages/torque-specs/import.vue'
import { flaggedRevision } from './records'

const id = '00000000-0000-4000-8000-000000000003'
const rows: ImportRow[] = [
  { line: 2, status: 'imported', id, component: 'Water pump', flags: [], issues: [] },
  { line: 3, status: 'imported', id: '00000000-0000-4000-8000-000000000004', component: 'Oil pump cover', flags: flaggedRevision.flags, issues: [] },
  { line: 4, status: 'refused', component: 'Elbow', flags: [], issues: [{ path: 'target_value', message: 'abc is not a number.' }] },
]

const mountReport = (props: Partial<InstanceType<typeof TorqueSpecImportReport>['$props']> = {}) =>
  mountSuspended(TorqueSpecImportReport, { props: { rows, fileName: 'specs.csv', written: true, choice: '', ...props } })

const lines = (report: Awaited<ReturnType<typeof mountReport>>) => report.findAll('tbody tr').map(row => row.get('td').text())

describe('TorqueSpecImportReport', () => {
  it('says what became of each row and leads to its spec', async () => {
    const report = await mountReport()
    expect(report.get('[role=status]').text()).toContain('3 rows: 2 imported, 1 refused, 1 with units that disagree')
    expect(report.get('tbody a').attributes('href')).toBe(`/torque-specs/${id}`)
    expect(report.text()).toContain('abc is not a number.')
    expect(report.text()).toContain('2.1 N·m apart; rounding explains 1.2 N·m.')
  })

  it.each([['said', ['3', '4']], ['flagged', ['3']], ['refused', ['4']], ['', ['2', '3', '4']]] as const)('shows by %j the lines %j', async (choice, shown) => {
    expect(lines(await mountReport({ choice }))).toEqual(shown)
  })

  it('stays small however long the file is', async () => {
    const many = Array.from({ length: 5000 }, (_, index): ImportRow => ({ line: index + 2, status: 'imported', flags: [], issues: [] }))
    const report = await mountReport({ rows: many })
    expect(lines(report)).toHaveLength(100)
    await report.findAll('button').find(button => button.text() === 'Show more')?.trigger('click')
    expect(lines(report)).toHaveLength(1100)
  })

  it('offers the good rows after a refusal', async () => {
    const report = await mountReport({ written: false })
    const button = report.findAll('button').find(one => one.text().startsWith('Import the 2 good rows'))
    await button?.trigger('click')
    expect(report.emitted('partial')).toHaveLength(1)
    expect(report.text()).toContain('Nothing was imported')
  })
})

describe('TorqueSpecImportChoose', () => {
  it('takes a chosen file and pasted rows', async () => {
    const choose = await mountSuspended(TorqueSpecImportChoose)
    const input = choose.get<HTMLInputElement>('input[type=file]')
    Object.defineProperty(input.element, 'files', { value: [new File(['kind\n'], 'a.csv')], configurable: true })
    await input.trigger('change')
    await expect.poll(() => choose.emitted('choose')?.length).toBe(1)
    await choose.get('textarea').setValue('kind,component')
    await choose.get('form').trigger('submit')
    expect(choose.emitted('choose')).toEqual([['a.csv', 'kind\n'], ['pasted rows', 'kind,component']])
  })
})

describe('the import page', () => {
  registerEndpoint('/api/torque-specs/import', {
    method: 'POST',
    handler: (event) => {
      if (getQuery(event).partial === 'true') return { rows }
      setResponseStatus(event, 422)
      return { statusCode: 422, statusMessage: 'Unprocessable', message: '1 of 3 rows are refused.', data: { code: 'import_refused', rows } }
    },
  })

  it('keeps the file after a refusal and takes the good rows on asking', async () => {
    useSessionStore().can = { importSpecs: true }
    const page = await mountSuspended(ImportPage)
    await page.get('textarea').setValue('kind,component\n')
    await page.get('form').trigger('submit')
    await expect.poll(() => page.text()).toContain('Nothing was imported')
    await page.findAll('button').find(button => button.text().includes('anyway'))?.trigger('click')
    await expect.poll(() => page.text()).toContain('See the drafts')
    expect(useSpecImport().last.value).toMatchObject({ written: true, csv: 'kind,component\n' })
  })
})
