import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import {
  dayIn, formatCount, formatDate, formatDateTime, formatDay, formatDaysLeft, formatEven, formatPercent, formatTime,
  monthsUntil, nothing, ordinal,
} from '../../../utils/format'

describe('instants in the shop\'s time zone', () => {
  it('may fall on another day than in UTC', () => {
    expect(formatDateTime('2026-12-01T23:41:00Z', 'Europe/Oslo')).toBe('2 Dec 2026 00:41')
    expect(formatDateTime('2026-12-01T03:41:00Z', 'America/Denver')).toBe('30 Nov 2026 20:41')
    expect(formatDate('2026-12-31T23:30:00Z', 'Asia/Tokyo')).toBe('1 Jan 2027')
    expect(formatTime('2026-06-01T12:00:00Z', 'Europe/Oslo')).toBe('14:00')
    expect(dayIn('2026-12-01T23:41:00Z', 'Europe/Oslo')).toBe('2026-12-02')
  })

  it('shows a dash for nothing and for what is no time', () => {
    expect(formatDateTime(null, 'UTC')).toBe(nothing)
    expect(formatDateTime('yesterday', 'UTC')).toBe(nothing)
  })
})

describe('days', () => {
  it('reads a date without time as it stands', () => {
    expect(formatDay('2027-03-04')).toBe('4 Mar 2027')
    expect(formatDay('2027-13-04')).toBe(nothing)
    expect(formatDay(null)).toBe(nothing)
  })

  it.each([[0, 'due today'], [1, '1 day left'], [14, '14 days left'], [-1, 'overdue by 1 day'], [-8, 'overdue by 8 days']])(
    '%d days left', (days, words) => expect(formatDaysLeft(days)).toBe(words),
  )
})

describe('monthsUntil', () => {
  it.each([
    ['2026-12-02', '2027-03-14', 4],
    ['2026-12-02', '2027-03-02', 3],
    ['2026-12-02', '2027-03-01', 3],
    ['2026-12-02', '2026-12-02', 1],
    ['2026-12-02', '2026-11-24', 0],
    ['2027-01-31', '2027-02-28', 1],
  ])('%s to %s', (from, to, months) => expect(monthsUntil(from, to)).toBe(months))

  it('never shrinks as the due date moves on', () => {
    const day = fc.date({ min: new Date('2020-01-01'), max: new Date('2035-12-31'), noInvalidDate: true })
      .map(date => date.toISOString().slice(0, 10))
    fc.assert(fc.property(day, day, day, (from, a, b) => {
      const [sooner = '', later = ''] = [a, b].sort()
      expect(monthsUntil(from, sooner)).toBeLessThanOrEqual(monthsUntil(from, later))
    }))
  })
})

describe('figures', () => {
  it('counts with the noun', () => {
    expect(formatCount(1, 'bolt')).toBe('1 bolt')
    expect(formatCount(6, 'bolt')).toBe('6 bolts')
    expect(formatCount(2, 'torque', 'torque')).toBe('2 torque')
  })

  it('never rounds a probability up to certainty', () => {
    expect(formatPercent(0.99999)).toBe('99.9 %')
    expect(formatPercent(1)).toBe('100.0 %')
    expect(formatPercent(0.974)).toBe('97.4 %')
  })

  it('keeps decimal points in line', () => {
    expect([41, 9, 30.24, 120, 0.452].map(formatEven)).toEqual(['41.0', '9.0', '30.2', '120.0', '0.452'])
  })

  it.each([[1, '1st'], [2, '2nd'], [3, '3rd'], [4, '4th'], [11, '11th'], [12, '12th'], [13, '13th'], [22, '22nd']])(
    '%d in order', (place, words) => expect(ordinal(place)).toBe(words),
  )
})
