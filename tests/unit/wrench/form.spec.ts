import { describe, expect, it } from 'vitest'
import { createWrenchBody, updateWrenchBody, type WrenchAnswer } from '#shared/schemas/wrenches'
import { readForm } from '../../../utils/form-issues'
import { emptyWrenchForm, readWrenchForm, wrenchChange, wrenchFormFrom } from '../../../utils/wrench-form'
import { deviationText, deviationWords, rangeIn } from '../../../utils/wrench-words'

const id = '00000000-0000-4000-8000-000000000001'
const wrench: WrenchAnswer = {
  id, assetTag: 'TW-07', serial: 'S1', kind: 'setting', toolClass: null,
  range: { min: 40, max: 200, unit: 'N.m', minNm: 40, maxNm: 200 }, graduation: { value: 1, unit: 'N.m', nm: 1 },
  gripLengthMm: 420, drive: '1/2 in', directions: ['clockwise'], permissiblePercent: 4, intervalMonths: 12,
  intervalCycles: null, location: null, state: 'in_use', stateReason: null,
  calibration: { id: null, status: 'none', performedOn: null, dueOn: null, daysLeft: null, cyclesSince: 0 }, figures: [], can: {},
}

describe('a wrench form', () => {
  it('says no more than what is filled in', () => {
    const form = { ...emptyWrenchForm(), assetTag: 'TW-1', serial: 'X', min: '4', max: '20,5', graduation: '0.1', intervalCycles: '' }
    expect(readForm(createWrenchBody, readWrenchForm(form))).toEqual({
      assetTag: 'TW-1', serial: 'X', kind: 'setting', range: { min: 4, max: 20.5, unit: 'N.m' },
      graduation: { value: 0.1, unit: 'N.m' }, directions: ['clockwise'], intervalMonths: 12,
    })
  })

  it('of a wrench says that wrench again', () => {
    expect(readForm(createWrenchBody, readWrenchForm(wrenchFormFrom(wrench)))).toEqual({
      assetTag: 'TW-07', serial: 'S1', kind: 'setting', range: { min: 40, max: 200, unit: 'N.m' },
      graduation: { value: 1, unit: 'N.m' }, gripLengthMm: 420, drive: '1/2 in', directions: ['clockwise'], intervalMonths: 12,
    })
  })

  it('keeps a permissible deviation that is not the one of the class', () => {
    expect(wrenchFormFrom({ ...wrench, permissiblePercent: 3 }).permissiblePercent).toBe('3')
  })

  it('says the deviation of a new class, where none of its own was typed', () => {
    const before = wrenchFormFrom(wrench)
    expect(readForm(updateWrenchBody, wrenchChange(before, { ...before, toolClass: 'II-G' }))).toEqual({ toolClass: 'II-G', permissiblePercent: 6 })
  })

  it('sends only what was changed', () => {
    const before = wrenchFormFrom(wrench)
    expect(readForm(updateWrenchBody, wrenchChange(before, { ...before, location: 'Rack 2', max: '210' }))).toEqual({ location: 'Rack 2', range: { min: 40, max: 210, unit: 'N.m' } })
  })
})

describe('words of a wrench', () => {
  it('gives the range as marked and in the other unit', () => {
    expect(rangeIn('N.m', wrench.range)).toBe('40–200 N·m')
    expect(rangeIn('lbf.ft', wrench.range)).toBe('29.5–147.5 ft·lb')
  })

  it.each([
    [4.1667, '+4.2 %', 'reads high: the bolt gets less'],
    [-0.96, '−1.0 %', 'reads low: the bolt gets more'],
    [-0.04, '0.0 %', 'reads true'],
  ])('says %f as %s, %s', (percent, text, words) => {
    expect(deviationText(percent)).toBe(text)
    expect(deviationWords(percent)).toBe(words)
  })
})
