import { describe, expect, it } from 'vitest'
import {
  countingReadings, dayAfter, enteredWords, markOf, probabilityFigure, strokesOf, strokeWords, wasRepeated,
} from '../../../utils/sign-off-words'

const at = (nm: number) => ({ nm, verdict: 'in_band' as const })
const reading = (position: number, attempt: number, nm: number | null) => ({
  position, attempt, nm, stage: 1, value: nm, unit: 'N.m' as const, verdict: 'in_band' as const, probabilityInBand: 0.9,
})

describe('strokes on the band', () => {
  it('are one a setting, with its clicks', () => {
    const item = { readings: [at(41), at(41), at(40)], wrench: { kind: 'setting' as const } }
    expect(strokesOf(item)).toEqual([{ ...at(41), clicks: 2 }, { ...at(40), clicks: 1 }])
    expect(strokeWords(item)).toBe('3 clicks at 2 settings')
    expect(strokeWords({ ...item, readings: [at(41)] })).toBe('1 click at one setting')
  })

  it('are one a reading on an indicating wrench', () => {
    const item = { readings: [at(41), at(41)], wrench: { kind: 'indicating' as const } }
    expect(strokesOf(item)).toEqual([at(41), at(41)])
    expect(strokeWords(item)).toBe('2 readings')
  })

  it('are none where only an angle was turned', () => {
    expect(strokeWords({ readings: [], wrench: { kind: 'setting' } })).toBe('turned by angle')
  })
})

it.each([
  [{ standing: true, checked: false, verdict: 'in_band' }, 'signed'],
  [{ standing: true, checked: true, verdict: 'edge' }, 'checked'],
  [{ standing: true, checked: true, verdict: 'low' }, 'out'],
  [{ standing: true, checked: false, verdict: null }, 'signed'],
  [{ standing: false, checked: true, verdict: 'in_band' }, 'none'],
] as const)('paints %o as %s', (item, mark) => {
  expect(markOf(item)).toBe(mark)
})

it('counts the last attempt of each bolt, whatever their order', () => {
  expect(countingReadings([reading(1, 2, 41), reading(1, 1, 30), reading(2, 1, 40), reading(3, 1, null)])).toEqual([at(41), at(40)])
})

it('tells which attempts were followed by another', () => {
  const readings = [reading(1, 1, 30), reading(1, 2, 41), reading(2, 1, 40)]
  expect(readings.map(item => wasRepeated(item, readings))).toEqual([true, false, false])
})

it('says what was entered: torque, angle, snug', () => {
  expect(enteredWords({ value: 37, unit: 'lbf.ft' })).toBe('37 ft·lb')
  expect(enteredWords({ value: 90, unit: 'deg' })).toBe('90°')
  expect(enteredWords({ value: null, unit: null })).toBe('snug')
})

it.each([[null, null], [1, '> 99.9 %'], [0.99951, '> 99.9 %'], [0.999, '99.9 %'], [0.974, '97.4 %'], [0, '< 0.1 %']])('states the probability %s as %s', (share, words) => {
  expect(probabilityFigure(share)).toBe(words)
})

it.each([['2026-11-30', '2026-12-01'], ['2026-12-31', '2027-01-01'], ['2028-02-28', '2028-02-29'], ['', ''], ['nonsense', '']])('follows %s with %s', (day, next) => {
  expect(dayAfter(day)).toBe(next)
})
