import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { mean, normalCdf, normalPdf, normalQuantile, standardDeviation } from '#shared/statistics/normal'

describe('the normal distribution', () => {
  // Values to 16 figures, computed with arbitrary precision.
  it.each([
    [0, 0.5],
    [0.5, 0.6914624612740131],
    [1, 0.8413447460685429],
    [1.96, 0.9750021048517795],
    [2.8, 0.9974448696695721],
    [2.9, 0.9981341866996160],
    [4, 0.9999683287581669],
    [-1, 0.15865525393145705],
    [-3, 0.0013498980316300946],
    [-6, 9.865876450376981e-10],
    [-10, 7.619853024160527e-24],
  ])('Φ(%d) = %d', (x, expected) => {
    expect(Math.abs(normalCdf(x) - expected)).toBeLessThan(1e-15)
    expect(Math.abs(normalCdf(x) / expected - 1)).toBeLessThan(1e-12)
  })

  it('has its ends', () => {
    expect([normalCdf(-Infinity), normalCdf(Infinity), normalCdf(-50), normalCdf(50)]).toEqual([0, 1, 0, 1])
    expect(normalCdf(Number.NaN)).toBeNaN()
    expect(normalPdf(0)).toBeCloseTo(0.3989422804014327, 15)
  })

  it('is symmetrical and never falls', () => {
    const x = fc.double({ min: -40, max: 40, noNaN: true })
    fc.assert(fc.property(x, x, (a, b) => {
      expect(normalCdf(a) + normalCdf(-a)).toBeCloseTo(1, 15)
      expect(normalCdf(Math.min(a, b))).toBeLessThanOrEqual(normalCdf(Math.max(a, b)) + 1e-15)
    }))
  })

  it('has its inverse', () => {
    expect(normalQuantile(0.975)).toBeCloseTo(1.959963984540054, 12)
    expect(normalQuantile(0.5)).toBeCloseTo(0, 12)
    for (const p of [0, 1, -0.1, 1.1, Number.NaN]) expect(() => normalQuantile(p)).toThrow(RangeError)
    fc.assert(fc.property(fc.double({ min: 1e-9, max: 1 - 1e-9, noNaN: true }), (p) => {
      expect(Math.abs(normalCdf(normalQuantile(p)) - p)).toBeLessThan(1e-14)
    }))
  })
})

describe('mean and standard deviation', () => {
  it('are those of a sample', () => {
    expect(mean([60.6, 60.9, 60.5, 60.8, 60.7])).toBeCloseTo(60.7, 12)
    expect(standardDeviation([60.6, 60.9, 60.5, 60.8, 60.7])).toBeCloseTo(0.158113883008418, 12)
    expect(standardDeviation([5, 5])).toBe(0)
  })

  it('refuse too few values', () => {
    expect(() => mean([])).toThrow(RangeError)
    expect(() => standardDeviation([1])).toThrow(RangeError)
  })
})
