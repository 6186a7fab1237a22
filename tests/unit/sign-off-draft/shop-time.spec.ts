import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { instantIn, wallTimeIn } from '../../../utils/shop-time'

describe('instantIn', () => {
  it('reads wall time in the shop\'s zone, in summer and in winter', () => {
    expect(instantIn('2026-12-01T08:30', 'Europe/Berlin')).toBe('2026-12-01T07:30:00.000Z')
    expect(instantIn('2026-07-01T08:30', 'Europe/Berlin')).toBe('2026-07-01T06:30:00.000Z')
    expect(instantIn('2026-07-01T08:30', 'America/Chicago')).toBe('2026-07-01T13:30:00.000Z')
  })

  it('refuses what is no time', () => {
    for (const text of ['', '2026-12-01', '2026-13-01T08:30', 'soon']) expect(instantIn(text, 'UTC')).toBeNull()
  })

  it('is the way back of wallTimeIn', () => {
    fc.assert(fc.property(fc.integer({ min: 0, max: 400 * 24 * 60 }), fc.constantFrom('UTC', 'Asia/Kolkata', 'America/New_York'), (minutes, zone) => {
      const wall = wallTimeIn(new Date(Date.UTC(2026, 0, 1) + minutes * 60_000), zone)
      const back = instantIn(wall, zone)
      expect(back && wallTimeIn(new Date(back), zone)).toBe(wall)
    }))
  })
})
