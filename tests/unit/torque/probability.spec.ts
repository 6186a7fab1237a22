import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { adapterFactor } from '#shared/torque/adapter'
import { certaintyWord, probabilityInBand, simpleProbability, type ProbabilityInput } from '#shared/torque/probability'
import { normalCdf } from '#shared/statistics/normal'

const plain: ProbabilityInput = {
  shownNm: 50,
  factor: 1,
  lowerNm: 45,
  upperNm: 55,
  biasPercent: 0,
  wPercent: 2,
  wPrimeOnly: false,
  permissiblePercent: 4,
  graduationNm: null,
  adapter: null,
}

const probability = (change: Partial<ProbabilityInput>) => probabilityInBand({ ...plain, ...change }) ?? Number.NaN

describe('probability in band', () => {
  it('takes half of W as the standard uncertainty', () => {
    expect(probability({ shownNm: 54 })).toBeCloseTo(normalCdf(1 / 0.54) - normalCdf(-9 / 0.54), 14)
  })

  it('corrects the bias: what reads 4 % high delivered less', () => {
    const appliedNm = 46 / 1.04
    expect(probability({ shownNm: 46, biasPercent: 4 })).toBeCloseTo(1 - normalCdf((45 - appliedNm) / 0.46), 12)
    expect(probability({ shownNm: 46, biasPercent: 4 })).toBeLessThan(0.05)
  })

  it('adds the resolution', () => {
    const u = Math.hypot(54 * 0.01, 2 / Math.sqrt(12))
    expect(probability({ shownNm: 54, graduationNm: 2 })).toBeCloseTo(normalCdf(1 / u) - normalCdf(-9 / u), 14)
  })

  it('adds the hand’s place with an adapter, and carries all to the fastener', () => {
    const adapter = { extensionMm: 100, angleDeg: 0, effectiveLengthMm: 400 }
    const factor = adapterFactor(adapter)
    const u = 43 * Math.hypot(0.01, 0.02 * 100 / 500) * factor
    const expected = normalCdf((55 - 43 * factor) / u) - normalCdf((45 - 43 * factor) / u)
    expect(probability({ shownNm: 43, factor, adapter })).toBeCloseTo(expected, 14)
  })

  it('takes no hand’s place at a right angle', () => {
    const adapter = { extensionMm: 100, angleDeg: 90, effectiveLengthMm: 400 }
    expect(probability({ shownNm: 54, adapter })).toBe(probability({ shownNm: 54 }))
  })

  it('goes by the permissible deviation without certificate figures, uncorrected and rectangular', () => {
    const u = 54 * 0.04 / Math.sqrt(3)
    const expected = normalCdf(1 / u) - normalCdf(-9 / u)
    expect(probability({ shownNm: 54, biasPercent: null, wPercent: null, graduationNm: 2 })).toBeCloseTo(expected, 14)
    expect(probability({ shownNm: 54, biasPercent: 3, wPercent: null })).toBeCloseTo(expected, 14)
  })

  it('says nothing where W′ alone is known', () => {
    expect(probabilityInBand({ ...plain, wPercent: null, wPrimeOnly: true })).toBeNull()
  })

  it('is certain without uncertainty', () => {
    const at = (shownNm: number) => probability({ shownNm, wPercent: 0 })
    expect([at(45), at(50), at(55), at(44.9), at(55.1)]).toEqual([1, 1, 1, 0, 0])
  })

  it('is about one half exactly at a limit', () => {
    expect(probability({ shownNm: 55 })).toBeCloseTo(0.5, 12)
  })

  it('always lies between 0 and 1', () => {
    const percent = fc.double({ min: -50, max: 50, noNaN: true })
    const positive = fc.double({ min: 1e-3, max: 1e3, noNaN: true })
    const numbers = fc.tuple(positive, positive, percent, positive, positive)
    fc.assert(fc.property(numbers, ([shownNm, factor, biasPercent, wPercent, graduationNm]) => {
      const p = probability({ shownNm, factor, biasPercent, wPercent, graduationNm })
      expect(p).toBeGreaterThanOrEqual(0)
      expect(p).toBeLessThanOrEqual(1)
    }))
  })
})

describe('probability of an entered torque', () => {
  it('takes half of the expanded uncertainty, uncorrected', () => {
    const u = 54 * 0.02
    expect(simpleProbability({ nm: 54, lowerNm: 45, upperNm: 55, uncertaintyPercent: 4 }))
      .toBeCloseTo(normalCdf(1 / u) - normalCdf(-9 / u), 14)
  })

  it('is 1 or 0 with no uncertainty, null when none is given', () => {
    const band = { lowerNm: 45, upperNm: 55 }
    expect(simpleProbability({ nm: 55, ...band, uncertaintyPercent: 0 })).toBe(1)
    expect(simpleProbability({ nm: 56, ...band, uncertaintyPercent: 0 })).toBe(0)
    expect(simpleProbability({ nm: 56, ...band, uncertaintyPercent: undefined })).toBeNull()
  })
})

describe('the word for it', () => {
  it.each([
    [1, 'sure'], [0.99, 'sure'], [0.9899, 'nearly sure'], [0.9, 'nearly sure'], [0.8999, 'not sure'], [0, 'not sure'],
    [null, null],
  ] as const)('%d: %s', (p, word) => {
    expect(certaintyWord(p)).toBe(word)
  })
})
