import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { calibrationStatus, daysBetween, dueOn, type CalibrationStatusInput } from '#shared/wrench/due'

const inUse: CalibrationStatusInput = {
  state: 'in_use', dueOn: '2026-06-30', today: '2026-01-15', dueSoonDays: 14, cyclesSince: 0, intervalCycles: 5000,
}

describe('due date', () => {
  it.each([
    ['2025-03-14', 12, '2026-03-14'], ['2024-02-29', 12, '2025-02-28'], ['2025-01-31', 1, '2025-02-28'],
    ['2024-01-31', 1, '2024-02-29'], ['2025-08-31', 6, '2026-02-28'], ['2025-12-31', 0, '2025-12-31'],
  ])('%s and %d months: %s', (date, months, due) => {
    expect(dueOn(date, months)).toBe(due)
  })

  it('stays in the month it should be, on the same day or its last', () => {
    const day = fc.integer({ min: 0, max: 36_524 })
      .map(n => new Date(Date.UTC(2000, 0, 1 + n)).toISOString().slice(0, 10))
    fc.assert(fc.property(day, fc.integer({ min: 0, max: 120 }), (date, months) => {
      const due = dueOn(date, months)
      const monthOf = (text: string) => Number(text.slice(0, 4)) * 12 + Number(text.slice(5, 7))
      expect(monthOf(due)).toBe(monthOf(date) + months)
      const lastDay = new Date(Date.UTC(Number(due.slice(0, 4)), Number(due.slice(5, 7)), 0)).getUTCDate()
      expect(Number(due.slice(8))).toBe(Math.min(Number(date.slice(8)), lastDay))
      expect(daysBetween(date, due)).toBeGreaterThanOrEqual(28 * months)
    }))
  })

  it.each(['2025-02-30', '2025-13-01', '14.03.2025', '2025-3-14', '', '2025-03-14T00:00'])('refuses %j', (date) => {
    expect(() => dueOn(date, 12)).toThrow(RangeError)
    expect(() => daysBetween('2025-01-01', date)).toThrow(RangeError)
  })

  it('refuses months that are not whole', () => {
    for (const months of [-1, 1.5, Number.NaN]) expect(() => dueOn('2025-03-14', months)).toThrow(RangeError)
  })

  it('counts days over a change of the clock', () => {
    expect(daysBetween('2025-03-29', '2025-03-31')).toBe(2)
    expect(daysBetween('2025-10-27', '2025-10-25')).toBe(-2)
  })
})

describe('calibration status', () => {
  it.each<[string, Partial<CalibrationStatusInput>, string, number | null]>([
    ['is valid', {}, 'valid', 166],
    ['is due soon within the days', { today: '2026-06-16' }, 'due_soon', 14],
    ['is valid a day before that', { today: '2026-06-15' }, 'valid', 15],
    ['is still good on the day', { today: '2026-06-30' }, 'due_soon', 0],
    ['is overdue the day after', { today: '2026-07-01' }, 'overdue', -1],
    ['is due soon at 90 % of the cycles', { cyclesSince: 4500 }, 'due_soon', 166],
    ['is valid just below', { cyclesSince: 4499 }, 'valid', 166],
    ['is overdue when the cycles are reached', { cyclesSince: 5000 }, 'overdue', 166],
    ['does not count cycles without a limit', { cyclesSince: 1e6, intervalCycles: null }, 'valid', 166],
    ['has none', { dueOn: null }, 'none', null],
    ['is quarantined before anything else', { state: 'quarantined', today: '2026-07-01' }, 'quarantined', -1],
    ['is at the laboratory', { state: 'at_laboratory', dueOn: null }, 'at_laboratory', null],
    ['is lost', { state: 'lost' }, 'lost', 166],
    ['is retired', { state: 'retired' }, 'retired', 166],
  ])('%s', (_, change, status, daysLeft) => {
    expect(calibrationStatus({ ...inUse, ...change })).toEqual({ status, daysLeft })
  })
})
