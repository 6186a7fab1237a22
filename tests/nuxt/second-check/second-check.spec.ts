import { mountSuspended } from '@nuxt/test-utils/runtime'
import { flushPromises } from '@vue/test-utils'
import { describe, expect, it, vi } from 'vitest'
import type { SecondCheckWaiting } from '#shared/schemas/sign-offs'
import type { WrenchAnswer } from '#shared/schemas/wrenches'
import { SecondCheckForm, SecondCheckTable, SecondCheckWrench } from '#components'
import { ApiError } from '#imports'

const id = (last: number) => `018f0000-0000-7000-8000-00000000000${last}`
const waiting: SecondCheckWaiting = {
  signOff: {
    id: id(1), signedAt: '2026-12-01T08:00:00.000Z', repairOrder: { id: id(2), number: '24-1187' }, fastenerGroupId: id(3),
    component: 'Water pump', targetNm: 41, target: { value: 41, unit: 'N.m' }, limits: { targetNm: 41, lowerNm: 36.9, upperNm: 45.1 },
    verdict: 'in_band', readings: [], boltCount: 2, wPrimePercent: null, exceptions: [], standing: true, checked: false,
    wrench: { id: id(4), assetTag: 'TW-07', kind: 'setting' }, calibrationDueOn: null, technician: { id: id(5), name: 'Rhea Solberg' },
  },
  fastenerGroup: { id: id(3), name: 'Water pump to block' },
  vehicle: { id: id(6), vin: null, unitNumber: 'S-14', make: 'Halyard', model: '450' },
  methods: [
    { method: 'witness', allowed: true, why: null }, { method: 'setting', allowed: true, why: null },
    { method: 'residual', allowed: false, why: 'Thread locker bonds the threads.' },
  ],
  positions: [1, 2],
  can: { check: true },
}
function wrench(assetTag: string, last: number, more: Partial<WrenchAnswer>): WrenchAnswer {
  return {
    id: id(last), assetTag, serial: '', kind: 'setting', toolClass: null, range: { min: 10, max: 100, unit: 'N.m', minNm: 10, maxNm: 100 },
    graduation: { value: 2, unit: 'N.m', nm: 2 }, gripLengthMm: null, drive: null, directions: null, permissiblePercent: 4, intervalMonths: 12,
    intervalCycles: null, location: null, state: 'in_use', stateReason: null,
    calibration: { id: null, status: 'valid', performedOn: null, dueOn: null, daysLeft: null, cyclesSince: 0 }, figures: [], fit: true, reasons: [], can: {},
    ...more,
  }
}
const overdue = { fit: false, reasons: [{ code: 'not_valid', text: 'Its calibration is overdue.', hard: true }] }

async function mountForm(sign: (...args: unknown[]) => Promise<unknown> = vi.fn(async () => undefined)) {
  const form = await mountSuspended(SecondCheckForm, { props: { waiting, wrenches: [wrench('TW-11', 7, {})], refuseUnfit: true, sign }, attachTo: document.body })
  return { form, sign, submit: async () => {
    await form.get('form').trigger('submit')
    await flushPromises()
  } }
}

describe('the form', () => {
  it('shows a method the joint forbids, with the reason, and does not offer it', async () => {
    const { form } = await mountForm()
    expect(form.text()).toContain('Thread locker bonds the threads.')
    expect(form.get('input[value=residual]').attributes('disabled')).toBeDefined()
    form.unmount()
  })

  it('says before signing what is missing, and goes to it', async () => {
    const { form, submit } = await mountForm()
    await submit()
    expect(form.text()).toContain('Say how you checked it.')
    expect(document.activeElement?.getAttribute('type')).toBe('radio')
    expect(form.find('input[type=password]').exists()).toBe(false)
    form.unmount()
  })

  it('at the setting: says what it cannot show, proposes the graduation, wants a word on every bolt, then the PIN', async () => {
    const { form, sign, submit } = await mountForm()
    await form.get('input[value=setting]').setValue(true)
    expect(form.text()).toContain('shows only that no bolt is below the setting')
    await form.get(`input[value="${id(7)}"]`).setValue(true)
    await flushPromises()
    expect(form.get<HTMLInputElement>('input[inputmode=text]').element.value).toBe('40')
    const held = form.findAll('input[value=held]')
    await held[0]?.setValue(true)
    await submit()
    expect(form.text()).toContain('Say whether bolt 2 held.')
    await form.findAll('input[value=turned]')[1]?.setValue(true)
    await submit()
    await form.get('input[type=password]').setValue('408152')
    await form.findAll('form').at(-1)?.trigger('submit')
    await flushPromises()
    expect(sign).toHaveBeenCalledTimes(1)
    expect(vi.mocked(sign).mock.calls[0]).toMatchObject([{ method: 'setting', wrenchId: id(7), turned: { 1: 'held', 2: 'turned' } }, '408152'])
    form.unmount()
  })

  it('a wrong PIN is told in the dialog, and nothing entered is lost', async () => {
    const { form, submit } = await mountForm(() => Promise.reject(new ApiError(403, 'That is not your PIN; 9 tries are left.', { code: 'wrong_pin', triesLeft: 9 })))
    await form.get('input[value=witness]').setValue(true)
    await form.get('textarea').setValue('From bolt 1 on.')
    await submit()
    await form.get('input[type=password]').setValue('111222')
    await form.findAll('form').at(-1)?.trigger('submit')
    await flushPromises()
    expect(form.text()).toContain('9 tries are left.')
    expect(form.get<HTMLTextAreaElement>('textarea').element.value).toBe('From bolt 1 on.')
    form.unmount()
  })
})

describe('the wrenches', () => {
  const mount = (refuseUnfit: boolean, method: 'setting' | 'residual' = 'setting') => mountSuspended(SecondCheckWrench, {
    props: { wrenches: [wrench('TW-11', 7, {}), wrench('TW-02', 8, { kind: 'indicating', ...overdue })], method, refuseUnfit, error: null, modelValue: '' },
  })

  it('refuse an unfit one with its reason where the shop\'s rule refuses it', async () => {
    const choice = await mount(true)
    expect(choice.text()).toContain('Its calibration is overdue.')
    expect(choice.get(`input[value="${id(8)}"]`).attributes('disabled')).toBeDefined()
    expect((await mount(false)).get(`input[value="${id(8)}"]`).attributes('disabled')).toBeUndefined()
  })

  it('read a residual torque only when they indicate', async () => {
    expect((await mount(false, 'residual')).get(`input[value="${id(7)}"]`).attributes('disabled')).toBeDefined()
  })
})

it('the list tells the signer that somebody else checks it', async () => {
  const props = { rows: [waiting], sort: 'signedAt', timeZone: 'UTC' }
  expect((await mountSuspended(SecondCheckTable, { props: { ...props, personId: id(5) } })).text()).toContain('you: somebody else checks it')
  expect((await mountSuspended(SecondCheckTable, { props: { ...props, personId: id(9) } })).text()).not.toContain('you: somebody else')
})
