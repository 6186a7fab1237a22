import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { adapterFactor, nearestGraduation, torqueAtFastener, wrenchSetting } from '#shared/torque/adapter'
import { toNm } from '#shared/torque/units'

const crowfoot = (angleDeg: number) => ({ extensionMm: 50, angleDeg, effectiveLengthMm: 400 })

describe('adapter and multiplier', () => {
  it('changes nothing when there is none', () => {
    expect([adapterFactor(), adapterFactor(null), adapterFactor(null, null)]).toEqual([1, 1, 1])
  })

  it('lengthens straight on, does nothing at a right angle, shortens folded back', () => {
    expect([0, 90, 180, 270, -90].map(angle => adapterFactor(crowfoot(angle)))).toEqual([1.125, 1, 0.875, 1, 1])
  })

  it('multiplies by the ratio', () => {
    expect(adapterFactor(null, 4.5)).toBe(4.5)
    expect(torqueAtFastener(80, crowfoot(0), 2)).toBe(180)
  })

  it.each([
    ['a reach past the grip', { extensionMm: 400, angleDeg: 180, effectiveLengthMm: 400 }, 1],
    ['no length', { extensionMm: 50, angleDeg: 0, effectiveLengthMm: 0 }, 1],
    ['a negative extension', { extensionMm: -50, angleDeg: 0, effectiveLengthMm: 400 }, 1],
    ['an angle of NaN', { extensionMm: 50, angleDeg: Number.NaN, effectiveLengthMm: 400 }, 1],
    ['a ratio of zero', null, 0],
    ['an infinite ratio', null, Infinity],
  ] as const)('refuses %s', (_, adapter, ratio) => {
    expect(() => adapterFactor(adapter, ratio)).toThrow(RangeError)
  })
})

describe('the setting', () => {
  it.each([
    [71.111, 1, 71], [71.5, 1, 71], [71.51, 1, 72], [71.25, 0.5, 71], [71.26, 0.5, 71.5], [0.35, 0.1, 0.3],
    [0.3, 1, 1], [22.126, 0.25, 22.25], [0.7, 0.1, 0.7],
  ])('%d to the nearest %d: %d', (value, graduation, expected) => {
    expect(nearestGraduation(value, graduation)).toBe(expected)
  })

  it('says what the rounded setting gives at the fastener', () => {
    const result = wrenchSetting({
      targetNm: 80, unit: 'N.m', adapter: crowfoot(0), graduation: { value: 1, unit: 'N.m' },
    })
    expect(result.setting.value).toBeCloseTo(71.11111, 5)
    expect(result.rounded).toEqual({ value: 71, unit: 'N.m' })
    expect(result.gives).toEqual({ value: 79.875, unit: 'N.m', nm: 79.875 })
  })

  it('rounds in the wrench’s unit and answers in the asked one', () => {
    const targetNm = toNm({ value: 37, unit: 'lbf.ft' })
    const result = wrenchSetting({ targetNm, unit: 'lbf.ft', graduation: { value: 2.5, unit: 'N.m' } })
    expect(result.setting.value).toBeCloseTo(37, 12)
    expect(result.rounded).toEqual({ value: 50, unit: 'N.m' })
    expect(result.gives.unit).toBe('lbf.ft')
    expect(result.gives.value).toBeCloseTo(36.878107, 6)
    expect(result.gives.nm).toBe(50)
  })

  it('gives exactly the target without a graduation', () => {
    const result = wrenchSetting({ targetNm: 80, unit: 'N.m', adapter: crowfoot(45) })
    expect(result.rounded).toBeUndefined()
    expect(result.gives).toEqual({ value: 80, unit: 'N.m', nm: 80 })
  })

  it('refuses a target or graduation of zero', () => {
    expect(() => wrenchSetting({ targetNm: 0, unit: 'N.m' })).toThrow(RangeError)
    const graduation = { value: 0, unit: 'N.m' } as const
    expect(() => wrenchSetting({ targetNm: 80, unit: 'N.m', graduation })).toThrow(RangeError)
  })

  it('is undone by what the fastener gets', () => {
    const mm = (min: number, max: number) => fc.double({ min, max, noNaN: true })
    const adapters = fc.record({ extensionMm: mm(0, 200), angleDeg: mm(-360, 360), effectiveLengthMm: mm(201, 1000) })
    fc.assert(fc.property(mm(1, 1000), adapters, mm(0.2, 30), (targetNm, adapter, multiplierRatio) => {
      const { setting } = wrenchSetting({ targetNm, unit: 'N.m', adapter, multiplierRatio })
      expect(torqueAtFastener(setting.value, adapter, multiplierRatio) / targetNm).toBeCloseTo(1, 10)
    }))
  })

  it('lies within half a graduation, above the first', () => {
    const steps = fc.double({ min: 1, max: 1000, noNaN: true })
    fc.assert(fc.property(steps, fc.constantFrom(0.1, 0.25, 0.5, 1, 2, 5), (count, graduation) => {
      const rounded = nearestGraduation(count * graduation, graduation)
      expect(Math.abs(rounded - count * graduation)).toBeLessThanOrEqual(graduation / 2 * (1 + 1e-6))
    }))
  })
})
