import { describe, expect, it } from 'vitest'
import { customaryPasses, passesFor, stagesOf, type StageSpec } from '#shared/torque/stages'
import { limitsOf, type Tolerance } from '#shared/torque/tolerance'
import { toNm, type Quantity } from '#shared/torque/units'

const nm = (value: number): Quantity => ({ value, unit: 'N.m' })
const limits = { targetNm: 50, lowerNm: 45, upperNm: 55 }
const noAngle = { angleDeg: null, toleranceDeg: null }

describe('stages', () => {
  it.each([undefined, null, []])('is one torque stage without any (%j)', (stages) => {
    expect(stagesOf(limits, stages)).toEqual([{ number: 1, kind: 'torque', ...limits, ...noAngle }])
  })

  it('numbers snug, percent, torque and angle', () => {
    const stages: StageSpec[] = [
      { kind: 'snug' },
      { kind: 'snug', target: nm(10) },
      { kind: 'percent', percent: 60 },
      { kind: 'torque', target: nm(50) },
      { kind: 'angle', angleDeg: 90 },
      { kind: 'angle', angleDeg: 45, toleranceDeg: 5 },
    ]
    const none = { targetNm: null, lowerNm: null, upperNm: null }
    expect(stagesOf(limits, stages, { kind: 'percent', value: 10 })).toEqual([
      { number: 1, kind: 'snug', ...none, ...noAngle },
      { number: 2, kind: 'snug', ...none, targetNm: 10, ...noAngle },
      { number: 3, kind: 'percent', targetNm: 30, lowerNm: 27, upperNm: 33, ...noAngle },
      { number: 4, kind: 'torque', ...limits, ...noAngle },
      { number: 5, kind: 'angle', ...none, angleDeg: 90, toleranceDeg: null },
      { number: 6, kind: 'angle', ...none, angleDeg: 45, toleranceDeg: 5 },
    ])
  })

  it.each<[string, Tolerance | null, number, number, number]>([
    ['percent', { kind: 'percent', value: 10 }, 20, 18, 22],
    ['the shop’s default', null, 20, 18, 22],
    ['absolute', { kind: 'absolute', value: 5, unit: 'N.m' }, 20, 15, 25],
    ['absolute, too wide for the stage', { kind: 'absolute', value: 5, unit: 'N.m' }, 5, 4.5, 5.5],
    ['limits', { kind: 'limits', lower: nm(45), upper: nm(55) }, 20, 18, 22],
  ])('gives a stage with its own target the same tolerance: %s', (_, tolerance, target, lowerNm, upperNm) => {
    const [stage] = stagesOf(limitsOf(nm(50), tolerance, 10), [{ kind: 'torque', target: nm(target) }], tolerance)
    expect(stage?.targetNm).toBeCloseTo(target, 12)
    expect(stage?.lowerNm).toBeCloseTo(lowerNm, 12)
    expect(stage?.upperNm).toBeCloseTo(upperNm, 12)
  })

  it('gives the last stage exactly the printed limits, symmetrical or not', () => {
    const tolerance: Tolerance = { kind: 'limits', lower: nm(47), upper: nm(58) }
    const printed = limitsOf(nm(50), tolerance, 10)
    const specs: StageSpec[] = [{ kind: 'torque', target: nm(20) }, { kind: 'torque', target: nm(50) }]
    const stages = stagesOf(printed, specs, tolerance)
    expect(stages[1]).toEqual({ number: 2, kind: 'torque', targetNm: 50, lowerNm: 47, upperNm: 58, ...noAngle })
  })

  it('refuses a stage without a torque', () => {
    expect(() => stagesOf(limits, [{ kind: 'percent', percent: 0 }])).toThrow(RangeError)
    expect(() => stagesOf(limits, [{ kind: 'torque', target: nm(Number.NaN) }])).toThrow(RangeError)
  })
})

describe('passes', () => {
  it('goes by 30, 70 and 100 % unless told otherwise', () => {
    expect(passesFor(50)).toEqual([15, 35, 50])
    expect(passesFor(50, [50, 100])).toEqual([25, 50])
  })

  it('goes straight to the target up to 30 lbf·ft', () => {
    expect(customaryPasses(toNm({ value: 30, unit: 'lbf.ft' }))).toHaveLength(1)
    expect(customaryPasses(41)).toEqual([expect.closeTo(28.7, 12), 41])
  })
})
