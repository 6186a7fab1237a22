import { describe, expect, it } from 'vitest'
import { toApiError } from '../../../utils/api-error'
import { emptyCheck, readSecondCheck, settingFor, typed } from '../../../utils/second-check-form'

const signOffId = '018f0000-0000-7000-8000-000000000002'
const wrenchId = '018f0000-0000-7000-8000-000000000003'
const about = { signOffId, positions: [1, 2], at: '2026-12-01T08:00:00.000Z' }
const empty = () => emptyCheck({ positions: [1, 2], signOff: { target: { value: 30, unit: 'lbf.ft' } } })

function paths(read: () => unknown) {
  try {
    read()
  } catch (error) {
    return toApiError(error).issues.map(issue => issue.path).sort()
  }
  return []
}

it('begins with nothing chosen, in the unit of the target', () => {
  const entry = empty()
  expect(entry.turned).toEqual({ 1: '', 2: '' })
  expect(entry.residual[2]).toEqual({ text: '', value: null, unit: 'lbf.ft' })
  expect(emptyCheck({ positions: [], signOff: { target: null } }).setting.unit).toBe('N.m')
})

describe('reading it', () => {
  it('asks how it was checked', () => {
    expect(paths(() => readSecondCheck(empty(), about))).toContain('method')
  })

  it('takes a witness without wrench and readings', () => {
    expect(readSecondCheck({ ...empty(), method: 'witness', note: ' seen ' }, about))
      .toEqual({ signOffId, method: 'witness', note: 'seen', at: about.at, capturedOffline: false })
  })

  it('at the setting wants wrench, setting and a word on every bolt', () => {
    expect(paths(() => readSecondCheck({ ...empty(), method: 'setting' }, about))).toEqual(['setting', 'turned.1', 'turned.2', 'wrenchId'])
  })

  it('at the setting carries which bolts turned', () => {
    const entry = { ...empty(), method: 'setting' as const, wrenchId, setting: typed({ value: 30, unit: 'lbf.ft' as const }), turned: { 1: 'held' as const, 2: 'turned' as const } }
    expect(readSecondCheck(entry, about).readings).toEqual([
      { position: 1, value: 30, unit: 'lbf.ft', turned: false }, { position: 2, value: 30, unit: 'lbf.ft', turned: true },
    ])
  })

  it('of residual torques wants one of every bolt, each in its own unit', () => {
    const entry = { ...empty(), method: 'residual' as const, wrenchId }
    expect(paths(() => readSecondCheck(entry, about))).toEqual(['residual.1', 'residual.2'])
    entry.residual = { 1: typed({ value: 28.5, unit: 'lbf.ft' }), 2: typed({ value: 40, unit: 'N.m' }) }
    expect(readSecondCheck(entry, about).readings).toEqual([
      { position: 1, value: 28.5, unit: 'lbf.ft' }, { position: 2, value: 40, unit: 'N.m' },
    ])
  })
})

it('proposes the nearest graduation of the wrench, else the target itself', () => {
  expect(settingFor(41, 'lbf.ft', { value: 0.5, unit: 'lbf.ft' })).toEqual({ text: '30', value: 30, unit: 'lbf.ft' })
  expect(settingFor(41, 'N.m', null)).toEqual({ text: '41', value: 41, unit: 'N.m' })
})
