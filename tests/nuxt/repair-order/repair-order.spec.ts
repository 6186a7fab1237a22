import { mountSuspended } from '@nuxt/test-utils/runtime'
import { describe, expect, it } from 'vitest'
import type { RepairOrderListItem } from '#shared/schemas/repair-orders'
import type { VehicleAnswer } from '#shared/schemas/vehicles'
import { RepairOrderFilter, RepairOrderTable, RepairOrderVehicleForm, RepairOrderVehiclePicker } from '#components'
import { emptyVehicle } from '#imports'

const person = { id: '018f0000-0000-7000-8000-000000000001', name: 'Dana Fiorelli' }
const vehicle: VehicleAnswer = {
  id: '018f0000-0000-7000-8000-000000000002', vin: '1M8GDM9AXKP042788', vinUnverified: false, unitNumber: 'S-14', plate: null,
  year: 2019, make: 'Halyard', model: '450', engine: null, odometer: null, createdAt: '2026-12-01T08:00:00.000Z', can: {},
}
const order: RepairOrderListItem = {
  id: '018f0000-0000-7000-8000-000000000003', number: '24-1187', vehicle, complaint: 'Coolant lost', odometer: null, bay: 'North',
  openedAt: '2026-12-01T23:30:00.000Z', openedBy: person, holds: [], release: null, can: {},
  groupCount: 3, groupsDone: 1, groupStates: ['signed', 'open', 'second_check_waiting'],
}

describe('the table', () => {
  const mount = (row: RepairOrderListItem) => mountSuspended(RepairOrderTable, { props: { rows: [row], sort: '-openedAt', timeZone: 'Europe/Berlin' } })

  it('says what is done and what an order waits for, and leads to its screen', async () => {
    const table = await mount(order)
    for (const words of ['24-1187', 'Unit S-14, 2019 Halyard 450', 'Coolant lost', '2 Dec 2026', '1 of 3', '1 joint to tighten, 1 second check']) {
      expect(table.text()).toContain(words)
    }
    expect(table.get('tbody a').attributes('href')).toBe(`/bay/repair-orders/${order.id}`)
  })

  it('says when and by whom it was released', async () => {
    const release = { id: person.id, at: '2026-12-03T10:00:00.000Z', by: person, sequence: 4, hash: '', ownJoint: false }
    const text = (await mount({ ...order, release })).text()
    expect(text).toContain('3 Dec 2026, Dana Fiorelli')
    expect(text).not.toContain('to tighten')
  })

  it('sorts by number, bay and opening', async () => {
    expect((await mount(order)).findAll('th button').map(button => button.text())).toEqual(['Number', 'Bay', 'Opened'])
  })
})

it('the sentence narrows to open ones and to mine', async () => {
  const filter = await mountSuspended(RepairOrderFilter, { props: { state: '', mine: '', words: '' } })
  await filter.get('select[aria-label=State]').setValue('open')
  await filter.get('select[aria-label="Worked on by"]').setValue('true')
  expect(filter.emitted('update:state')).toEqual([['open']])
  expect(filter.emitted('update:mine')).toEqual([['true']])
})

describe('the vehicle', () => {
  const props = { found: [vehicle], status: 'success' as const, chosen: null, error: null, words: '' }

  it('is chosen from those found, and can be chosen again', async () => {
    const picker = await mountSuspended(RepairOrderVehiclePicker, { props })
    await picker.get('li button').trigger('click')
    expect(picker.emitted('choose')).toEqual([[vehicle]])
    await picker.setProps({ chosen: vehicle })
    expect(picker.find('li').exists()).toBe(false)
    await picker.get('button').trigger('click')
    expect(picker.emitted('choose')?.[1]).toEqual([null])
  })

  it('can be added where none fits', async () => {
    const picker = await mountSuspended(RepairOrderVehiclePicker, { props: { ...props, found: [], words: 'X-9' } })
    expect(picker.text()).toContain('No vehicle of the shop fits')
    await picker.findAll('button').find(button => button.text() === 'Add a vehicle')?.trigger('click')
    expect(picker.emitted('add')).toHaveLength(1)
  })

  it('with a doubtful VIN is kept as it is only on a person\'s word', async () => {
    const entry = { ...emptyVehicle, vin: '1M8GDM9AXKP042789' }
    const errorOf = (path: string) => path === 'vin' ? 'Its check digit is wrong.' : null
    const form = await mountSuspended(RepairOrderVehicleForm, { props: { modelValue: entry, errorOf } })
    expect(form.text()).toContain('Look at the VIN again')
    expect(form.text()).toContain('Correct it, or say that it is right.')
    await form.get('input[type=checkbox]').setValue(true)
    expect(entry.keepVin || form.props('modelValue').keepVin).toBe(true)
  })

  it('with a VIN that agrees is not doubted', async () => {
    const form = await mountSuspended(RepairOrderVehicleForm, { props: { modelValue: { ...emptyVehicle, vin: '1M8GDM9AXKP042788' }, errorOf: () => null } })
    expect(form.find('input[type=checkbox]').exists()).toBe(false)
  })
})
