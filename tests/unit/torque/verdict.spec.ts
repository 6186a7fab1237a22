import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { limitsOf } from '#shared/torque/tolerance'
import { toNm } from '#shared/torque/units'
import { verdictOf, verdictRank, verdicts, worstVerdict, type Verdict } from '#shared/torque/verdict'

const band = { lowerNm: 45, upperNm: 55 }
const reading = (verdict: Verdict, nm: number) => ({ verdict, nm, ...band })

describe('verdict of a reading', () => {
  it.each([
    [44.999, 2, 'low'], [45, 0, 'in_band'], [45, 2, 'edge'], [46.999, 2, 'edge'], [47, 2, 'in_band'],
    [50, 2, 'in_band'], [53, 2, 'in_band'], [53.001, 2, 'edge'], [55, 0, 'in_band'], [55, 2, 'edge'],
    [55.001, 2, 'high'],
  ] as const)('%d N·m with U %d: %s', (nm, uNm, verdict) => {
    expect(verdictOf({ nm, uNm, ...band })).toBe(verdict)
  })

  it('counts a value on the limit as inside, in whatever unit it was read', () => {
    const limits = limitsOf({ value: 37, unit: 'lbf.ft' }, null, 10)
    const at = (value: number) => verdictOf({ nm: toNm({ value, unit: 'lbf.ft' }), uNm: 0, ...limits })
    expect([at(33.3), at(40.7), at(33.2999), at(40.7001)]).toEqual(['in_band', 'in_band', 'low', 'high'])
  })

  it('refuses to judge what is not a number', () => {
    expect(() => verdictOf({ nm: Number.NaN, uNm: 0, ...band })).toThrow(RangeError)
    expect(() => verdictOf({ nm: 50, uNm: Number.NaN, ...band })).toThrow(RangeError)
  })

  it('only goes low, edge, in band, edge, high as the torque rises', () => {
    const place = { low: 0, edge: 1, in_band: 1, high: 2 }
    const nm = fc.double({ min: 0, max: 200, noNaN: true })
    fc.assert(fc.property(nm, nm, fc.double({ min: 0, max: 5, noNaN: true }), (a, b, uNm) => {
      const [low, high] = [Math.min(a, b), Math.max(a, b)].map(nm => place[verdictOf({ nm, uNm, ...band })])
      expect(low).toBeLessThanOrEqual(high ?? Number.NaN)
    }))
  })

  it('never gets better with a larger U', () => {
    const u = fc.double({ min: 0, max: 5, noNaN: true })
    fc.assert(fc.property(fc.double({ min: 45, max: 55, noNaN: true }), u, u, (nm, a, b) => {
      const [small, large] = [Math.min(a, b), Math.max(a, b)].map(uNm => verdictRank(verdictOf({ nm, uNm, ...band })))
      expect(small).toBeLessThanOrEqual(large ?? Number.NaN)
    }))
  })
})

describe('verdict of several readings', () => {
  it('ranks as lists are sorted', () => {
    expect(verdicts.map(verdictRank)).toEqual([0, 1, 2, 3])
  })

  it.each([
    [[], null],
    [[reading('in_band', 50), reading('edge', 46)], 'edge'],
    [[reading('low', 44), reading('edge', 46)], 'low'],
    [[reading('low', 40), reading('high', 56)], 'low'],
    [[reading('low', 44), reading('high', 57)], 'high'],
    [[reading('high', 56), reading('low', 44)], 'high'],
    [[reading('low', 44), reading('high', 56)], 'high'],
    [[reading('in_band', 50), { verdict: null, nm: 12, lowerNm: null, upperNm: null }], 'in_band'],
    [[{ verdict: null, nm: 12, lowerNm: null, upperNm: null }], null],
    [[reading('in_band', 50), { verdict: 'low', nm: null, lowerNm: null, upperNm: null }], 'low'],
  ] as const)('%j: %s', (readings, verdict) => {
    expect(worstVerdict(readings)).toBe(verdict)
  })
})
