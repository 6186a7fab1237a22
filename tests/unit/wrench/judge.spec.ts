import { describe, expect, it } from 'vitest'
import { stagesOf, type StageSpec } from '#shared/torque/stages'
import { probabilityInBand } from '#shared/torque/probability'
import { decisionRuleText } from '#shared/torque/verdict'
import { judgeReading, type ReadingInput } from '#shared/wrench/judge'

const limits = { targetNm: 50, lowerNm: 45, upperNm: 55 }

function stage(spec?: StageSpec) {
  const [first] = stagesOf(limits, spec ? [spec] : null)
  if (!first) throw new Error('a spec has at least one stage')
  return first
}

const reading: ReadingInput = {
  value: 50, unit: 'N.m', kind: 'setting', stage: stage(), figures: null, permissiblePercent: 4, graduation: null,
}
const judge = (change: Partial<ReadingInput>) => judgeReading({ ...reading, ...change })

describe('judging a reading', () => {
  it('takes the permissible deviation as U without a certificate', () => {
    expect(judge({})).toEqual({
      nm: 50,
      verdict: 'in_band',
      probabilityInBand: expect.closeTo(0.99998516, 5),
      uNm: 2,
      biasPercent: null,
      wPercent: null,
      wPrimePercent: null,
      decisionRule: decisionRuleText,
    })
    expect([44.9, 45, 46.8, 47, 52.8, 55, 55.1].map(value => judge({ value }).verdict))
      .toEqual(['low', 'edge', 'edge', 'in_band', 'in_band', 'edge', 'high'])
  })

  it('takes W′ as U, on the uncorrected torque', () => {
    const figures = { biasPercent: 4, wPercent: 1, wPrimePercent: 5 }
    const result = judge({ value: 46, figures })
    expect(result).toMatchObject({ nm: 46, verdict: 'edge', uNm: 2.3, ...figures })
    expect(result.probabilityInBand).toBe(probabilityInBand({
      shownNm: 46, factor: 1, ...limits, biasPercent: 4, wPercent: 1, wPrimeOnly: false, permissiblePercent: 4,
      graduationNm: null, adapter: null,
    }))
    expect(judge({ figures: { ...figures, wPrimePercent: null } }).uNm).toBe(2.5)
  })

  it('gives no probability where W′ alone is known', () => {
    const result = judge({ figures: { biasPercent: 1, wPercent: null, wPrimePercent: 3 } })
    expect(result).toMatchObject({ uNm: 1.5, verdict: 'in_band', probabilityInBand: null })
  })

  it('carries value, U and unit through adapter and multiplier', () => {
    const adapter = { extensionMm: 50, angleDeg: 0, effectiveLengthMm: 400 }
    expect(judge({ value: 71 / 2, adapter, multiplierRatio: 1.25 })).toMatchObject({
      nm: expect.closeTo(49.921875, 12), uNm: expect.closeTo(1.996875, 12), verdict: 'in_band',
    })
    expect(judge({ value: 37, unit: 'lbf.ft', graduation: { value: 1, unit: 'lbf.ft' } }).nm).toBe(50.165264088261814)
  })

  it('judges a percent stage by its own limits', () => {
    expect(judge({ value: 33, stage: stage({ kind: 'percent', percent: 60 }) }).verdict).toBe('edge')
    expect(judge({ value: 33.1, stage: stage({ kind: 'percent', percent: 60 }) }).verdict).toBe('high')
  })

  it('never judges snug', () => {
    expect(judge({ value: 12, stage: stage({ kind: 'snug' }) }))
      .toMatchObject({ nm: 12, verdict: null, probabilityInBand: null, decisionRule: 'not judged' })
  })

  it('judges an angle only by a printed tolerance, and never gives it a torque', () => {
    const free = stage({ kind: 'angle', angleDeg: 90 })
    const bound = stage({ kind: 'angle', angleDeg: 90, toleranceDeg: 5 })
    const unknown = { nm: null, probabilityInBand: null, uNm: null }
    expect(judge({ value: 120, unit: 'deg', stage: free })).toMatchObject({ ...unknown, verdict: null })
    const verdictAt = (value: number) => judge({ value, unit: 'deg', stage: bound }).verdict
    expect([84.9, 85, 90, 95, 95.1].map(verdictAt)).toEqual(['low', 'in_band', 'in_band', 'in_band', 'high'])
    expect(judge({ value: 90, unit: 'deg', stage: bound })).toMatchObject(unknown)
  })

  it('refuses a unit that is not the stage’s, and what is no number', () => {
    expect(() => judge({ unit: 'deg' })).toThrow(RangeError)
    expect(() => judge({ stage: stage({ kind: 'angle', angleDeg: 90 }) })).toThrow(RangeError)
    expect(() => judge({ value: Number.NaN })).toThrow(RangeError)
  })
})
