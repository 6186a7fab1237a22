import { describe, expect, it } from 'vitest'
import { assessPoint, deliveredLimits, deviationPercent } from '#shared/wrench/calibration'
import { budget } from '#shared/wrench/uncertainty'

const point = (references: number[], indicated = 100) => references.map(reference => ({ indicated, reference }))

describe('a calibration point', () => {
  it('fails by one reading though the mean is good', () => {
    const result = assessPoint({ targetNm: 100, readings: point([100, 100, 95]), limitPercent: 4 })
    expect(Math.abs(result.meanDeviationPercent)).toBeLessThan(4)
    expect(result.verdict).toBe('fail')
  })

  it('passes a reading exactly on the limit and fails one just beyond', () => {
    const { low, high } = deliveredLimits(100, 4)
    const verdict = (...references: number[]) =>
      assessPoint({ targetNm: 100, readings: point(references), limitPercent: 4 }).verdict
    expect(verdict(low, high)).toBe('pass')
    expect(verdict(low * 0.99999)).toBe('fail')
    expect(verdict(high * 1.00001)).toBe('fail')
    expect(verdict(96)).toBe('fail')
  })

  it('answers means in the unit of the readings', () => {
    const result = assessPoint({ targetNm: 100, readings: point([99, 101]), limitPercent: 4 })
    expect(result).toMatchObject({ targetNm: 100, meanReference: 100, limitPercent: 4 })
    expect(result.deviationsPercent).toHaveLength(2)
  })

  it('refuses a reference of zero and no readings', () => {
    expect(() => deviationPercent(100, 0)).toThrow(RangeError)
    expect(() => assessPoint({ targetNm: 100, readings: [], limitPercent: 4 })).toThrow(RangeError)
  })
})

describe('the uncertainty budget', () => {
  it('counts as zero what is not given', () => {
    const result = budget({ target: 60, readings: point([60.6, 60.9, 60.5, 60.8, 60.7], 60), uncertaintyPercent: 0.6 })
    expect(result).toMatchObject({ wMd: 0.3, wR: 0, wRep: 0, wOd: 0, wInt: 0, wL: 0 })
    expect(result.w).toBeCloseTo(Math.hypot(0.3, result.wRe), 12)
    expect(result.wPercent).toBeCloseTo(2 * result.w, 12)
    expect(result.wPrimePercent).toBeCloseTo(1.15267595949706 + result.wPercent, 12)
  })

  it('takes the resolution once', () => {
    const result = budget({ target: 60, readings: point([60, 60], 60), uncertaintyPercent: 0, graduation: 0.5 })
    expect(result.wR).toBeCloseTo(0.25 / Math.sqrt(3) * 100 / 60, 12)
    expect(result.w).toBe(result.wR)
  })

  it('sees no scatter in a single reading', () => {
    const result = budget({ target: 60, readings: point([60.6], 60), uncertaintyPercent: 1 })
    expect(result).toMatchObject({ wRe: 0, wPercent: 1 })
  })

  it('refuses a test torque of zero and no readings', () => {
    expect(() => budget({ target: 0, readings: point([60]), uncertaintyPercent: 1 })).toThrow(RangeError)
    expect(() => budget({ target: 60, readings: [], uncertaintyPercent: 1 })).toThrow(RangeError)
  })
})
