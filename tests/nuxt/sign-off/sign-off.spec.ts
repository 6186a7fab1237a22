import { mockNuxtImport, mountSuspended } from '@nuxt/test-utils/runtime'
import { beforeEach, describe, expect, it, vi } from 'vitest'
import type { SecondCheckRecord, SignOffDetail, SignOffListItem } from '#shared/schemas/sign-offs'
import {
  SignOffCertainty, SignOffChecks, SignOffFilter, SignOffReadings, SignOffStanding, SignOffTable, SignOffVoid, SignOffWork,
} from '#components'

const { navigateTo } = vi.hoisted(() => ({ navigateTo: vi.fn() }))
mockNuxtImport('navigateTo', () => navigateTo)
beforeEach(() => navigateTo.mockClear())

const person = { id: '018f0000-0000-7000-8000-000000000001', name: 'Rhea Solberg' }
const limits = { targetNm: 41, lowerNm: 36.9, upperNm: 45.1 }
const item: SignOffListItem = {
  id: '018f0000-0000-7000-8000-000000000002',
  signedAt: '2026-12-01T23:30:00.000Z',
  repairOrder: { id: '018f0000-0000-7000-8000-000000000003', number: '24-1187' },
  fastenerGroupId: '018f0000-0000-7000-8000-000000000004',
  component: 'Water pump to block',
  targetNm: 41,
  target: { value: 30.2, unit: 'lbf.ft' },
  limits,
  verdict: 'in_band',
  readings: [{ nm: 41, verdict: 'in_band' }, { nm: 41, verdict: 'in_band' }],
  boltCount: 2,
  wPrimePercent: 1.5,
  exceptions: [],
  standing: true,
  checked: false,
  wrench: { id: '018f0000-0000-7000-8000-000000000005', assetTag: 'TW-07', kind: 'setting' },
  calibrationDueOn: '2027-03-14',
  technician: person,
}

describe('the table', () => {
  const mount = (rows: SignOffListItem[], sort = '-signedAt') =>
    mountSuspended(SignOffTable, { props: { rows, sort, timeZone: 'Europe/Berlin' } })

  it('shows every column, times in the shop\'s zone, both units', async () => {
    const table = await mount([item])
    expect(table.findAll('th').map(th => th.text())).toEqual([
      'Mark', 'Signed', 'Repair order', 'Component', 'Target', 'In the band', 'Verdict', 'Wrench', 'Calibration, months left', 'Technician',
    ])
    for (const words of ['2 Dec 2026 00:30', '24-1187', '30.2 ft·lb', '41.0 N·m', '2 clicks at one setting', 'TW-07', '14 Mar 2027', 'Rhea Solberg']) {
      expect(table.text()).toContain(words)
    }
  })

  it('sorts by each column the server can sort by', async () => {
    const table = await mount([item])
    expect(table.findAll('th button').map(button => button.text())).toEqual(
      ['Signed', 'Repair order', 'Component', 'Target', 'Verdict', 'Wrench', 'Calibration, months left', 'Technician'])
    expect(table.get('th:nth-child(2)').attributes('aria-sort')).toBe('descending')
    const click = async (label: string) => table.findAll('th button').find(button => button.text() === label)?.trigger('click')
    await click('Target')
    await click('Signed')
    expect(table.emitted('update:sort')).toEqual([['targetNm'], ['signedAt']])
  })

  it('strikes one that no longer stands, and says so', async () => {
    const table = await mount([{ ...item, standing: false }])
    expect(table.text()).toContain('no longer stands')
    expect(table.find('.line-through').exists()).toBe(true)
    expect((await mount([item])).find('.line-through').exists()).toBe(false)
  })

  it('names the exceptions', async () => {
    expect((await mount([{ ...item, exceptions: ['late_entry', 'wrench_unfit'] }])).text()).toContain('late entry, wrench was unfit')
  })
})

describe('the sentence', () => {
  const props = {
    component: '', from: '', until: '', verdict: '', technician: '', wrench: '', words: '',
    technicians: [{ value: 'a', label: 'Rhea Solberg' }], wrenches: [{ value: 'w', label: 'TW-07' }],
  }

  it('reads aloud, and changes one word at a time', async () => {
    const filter = await mountSuspended(SignOffFilter, { props })
    expect(filter.text().replace(/\s+/g, ' ')).toContain('signed since the beginning')
    await filter.get('select[aria-label=Verdict]').setValue('low')
    await filter.get('select[aria-label=Technician]').setValue('a')
    await filter.get('input[aria-label=Component]').setValue('pump')
    expect(filter.emitted('update:verdict')).toEqual([['low']])
    expect(filter.emitted('update:technician')).toEqual([['a']])
    expect(filter.emitted('update:component')).toEqual([['pump']])
  })

  it('keeps a person from the address whose name is not known', async () => {
    const filter = await mountSuspended(SignOffFilter, { props: { ...props, technician: 'b' } })
    expect(filter.text()).toContain('one person')
  })
})

const detail: SignOffDetail = {
  ...item,
  sequence: 12, hash: 'a'.repeat(64), previousHash: 'b'.repeat(64),
  readings: [
    { position: 1, stage: 1, attempt: 1, value: 30, unit: 'N.m', nm: 30, verdict: 'low', probabilityInBand: 0 },
    { position: 1, stage: 1, attempt: 2, value: 41, unit: 'N.m', nm: 41, verdict: 'in_band', probabilityInBand: 1 },
  ],
  wrench: { ...item.wrench, serial: 'S-1', kind: 'indicating' },
  calibration: { id: null, dueOn: '2027-03-14', status: 'valid' },
  receivedAt: item.signedAt, tightenedAt: null, capturedOffline: false,
  fastenerGroup: { id: item.fastenerGroupId, name: 'Water pump' },
  vehicle: { id: person.id, vin: null, unitNumber: 'S-14', make: 'Halyard', model: '450' },
  specRevision: { id: person.id, specId: person.id, number: 2, source: { title: 'Demo manual', section: null, page: null, date: null }, threadCondition: null, shopValue: false },
  target: { value: 41, unit: 'N.m', nm: 41 },
  adapter: null, multiplierRatio: null, attestedInOrder: true,
  preparation: [{ code: 'clean', text: 'Threads clean', required: true, confirmed: true }, { code: 'gasket', text: 'New gasket', required: false, confirmed: false }],
  prepReason: null, deviationReason: null, parts: [{ name: 'Gasket', lot: 'L1' }], note: null,
  decisionRule: 'simple acceptance', biasPercent: null, wPercent: null, wPrimePercent: 1.5, probabilityInBand: 1,
  supersedes: null, supersededBy: null, voided: null, secondChecks: [], can: {},
}

describe('the record', () => {
  it('keeps every attempt and says which was tightened again', async () => {
    const readings = await mountSuspended(SignOffReadings, { props: { readings: detail.readings, kind: 'indicating' } })
    const rows = readings.findAll('tbody tr').map(row => row.text())
    expect(rows).toHaveLength(2)
    expect(rows[0]).toContain('tightened again')
    expect(rows[1]).not.toContain('tightened again')
    expect(rows[1]).toContain('30.2 ft·lb')
  })

  it('counts only the last attempt on the band, and never claims certainty', async () => {
    const certainty = await mountSuspended(SignOffCertainty, { props: { signOff: detail } })
    expect(certainty.text()).toContain('1 reading')
    expect(certainty.text()).toContain('> 99.9 %')
    expect(certainty.text()).toContain('Clamp load is not in it')
  })

  it('says which preparation was confirmed, and the lot of each part', async () => {
    const work = await mountSuspended(SignOffWork, { props: { signOff: detail } })
    expect(work.findAll('li span:last-child').map(span => span.text())).toEqual(['confirmed', 'not confirmed'])
    expect(work.text()).toContain('lot L1')
  })

  it('says why it no longer counts, and what counts instead', async () => {
    const voided = { reason: 'Wrong bolts.', at: '2026-12-02T08:00:00.000Z', by: person }
    const standing = await mountSuspended(SignOffStanding, {
      props: { signOff: { ...detail, standing: false, voided, supersededBy: '018f0000-0000-7000-8000-00000000000a', exceptions: ['late_entry'] }, timeZone: 'UTC' },
    })
    for (const words of ['Voided', 'Wrong bolts.', 'Rhea Solberg', '1 exception', 'late entry']) expect(standing.text()).toContain(words)
    expect(standing.get('a').attributes('href')).toContain('00000000000a')
  })

  it('says of a check at the setting what it cannot show, and of a bolt that turned that it does not count', async () => {
    const check: SecondCheckRecord = {
      id: person.id, sequence: 3, verdict: null, exceptions: [], hash: '', method: 'setting', passed: true, at: item.signedAt,
      checkedBy: person, wrench: null, readings: [], note: null,
    }
    const passed = await mountSuspended(SignOffChecks, { props: { checks: [check], timeZone: 'UTC' } })
    expect(passed.text()).toContain('not that none was above it')
    const turned = { ...check, passed: false, readings: [{ position: 4, value: 41, unit: 'N.m' as const, nm: 41, turned: true }] }
    expect((await mountSuspended(SignOffChecks, { props: { checks: [turned], timeZone: 'UTC' } })).text()).toMatch(/does not count[\s\S]*Bolt 4: 41 N·m, turned/)
  })

  it('is voided with reason and PIN together', async () => {
    const dialog = await mountSuspended(SignOffVoid, { props: { open: true, lines: ['Water pump'], busy: false, error: null, reasonError: null } })
    await dialog.get('textarea').setValue('Wrong bolts.')
    await dialog.get('input[type=password]').setValue('408152')
    await dialog.get('form').trigger('submit')
    expect(dialog.emitted('confirm')).toEqual([['Wrong bolts.', '408152']])
  })
})
