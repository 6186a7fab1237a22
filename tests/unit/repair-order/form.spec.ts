import { describe, expect, it } from 'vitest'
import { toApiError } from '../../../utils/api-error'
import { emptyOrder, emptyVehicle, readOrder, readVehicle, vinDoubt } from '../../../utils/repair-order-form'
import { waitsFor } from '../../../utils/repair-order-words'

const vehicleId = '018f0000-0000-7000-8000-000000000001'
// The example of 49 CFR 565; with another last figure its check digit no longer agrees.
const rightVin = '1M8GDM9AXKP042788'
const doubtfulVin = '1M8GDM9AXKP042789'

function refusal(read: () => unknown) {
  try {
    read()
  } catch (error) {
    return toApiError(error)
  }
  throw new Error('It was not refused.')
}

describe('a new repair order', () => {
  it('leaves out what was not said', () => {
    expect(readOrder({ ...emptyOrder, number: ' 24-1187 ' }, vehicleId)).toEqual({ number: '24-1187', vehicleId })
  })

  it('needs number and vehicle, and an odometer that is a number', () => {
    expect(refusal(() => readOrder({ ...emptyOrder, odometer: 'many' }, '')).issues.map(issue => issue.path).sort())
      .toEqual(['number', 'odometer', 'vehicleId'])
  })
})

describe('a new vehicle', () => {
  const entry = { ...emptyVehicle, make: 'Halyard', model: '450' }

  it('needs only make and model', () => {
    expect(readVehicle(entry)).toEqual({ make: 'Halyard', model: '450' })
  })

  it('says that a doubtful VIN is right only when a person said so', () => {
    expect(readVehicle({ ...entry, vin: doubtfulVin })).not.toHaveProperty('vinUnverified')
    expect(readVehicle({ ...entry, vin: doubtfulVin, keepVin: true })).toMatchObject({ vin: doubtfulVin, vinUnverified: true })
    expect(readVehicle({ ...entry, vin: rightVin, keepVin: true })).not.toHaveProperty('vinUnverified')
  })

  it('refuses a VIN of another length, whatever was said', () => {
    expect(refusal(() => readVehicle({ ...entry, vin: '1M8G', keepVin: true })).issues[0]?.path).toBe('vin')
  })

  it('doubts the check digit, not what no VIN can be', () => {
    expect(vinDoubt(doubtfulVin)).toContain('check digit')
    expect([rightVin, '', '1M8G'].map(vinDoubt)).toEqual([null, null, null])
  })
})

it.each([
  [[], ['its first joint']],
  [['signed', 'conceded', 'not_disturbed'], ['release']],
  [['open', 'open', 'second_check_waiting', 'exception', 'signed'], ['2 joints to tighten', '1 decision', '1 second check']],
] as const)('an order with joints %o waits for %o', (groupStates, words) => {
  expect(waitsFor({ groupStates: [...groupStates] })).toEqual(words)
})
