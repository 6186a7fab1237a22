import { describe, expect, it } from 'vitest'
import { limitsOf } from '#shared/torque/tolerance'
import type { Quantity } from '#shared/torque/units'

const nm = (value: number): Quantity => ({ value, unit: 'N.m' })
const limits = (lower: number, upper: number) => ({ kind: 'limits', lower: nm(lower), upper: nm(upper) }) as const

describe('limits of a spec', () => {
  it('takes the shop’s default without a tolerance', () => {
    expect(limitsOf(nm(50), null, 10)).toEqual({ targetNm: 50, lowerNm: 45, upperNm: 55 })
  })

  it('takes percent, absolute and printed limits', () => {
    expect(limitsOf(nm(50), { kind: 'percent', value: 4 }, 10)).toEqual({ targetNm: 50, lowerNm: 48, upperNm: 52 })
    expect(limitsOf(nm(50), { kind: 'absolute', value: 300, unit: 'cN.m' }, 10))
      .toEqual({ targetNm: 50, lowerNm: 47, upperNm: 53 })
    expect(limitsOf(nm(50), limits(44, 58), 10)).toEqual({ targetNm: 50, lowerNm: 44, upperNm: 58 })
  })

  it('takes the midpoint of limits without a target', () => {
    const result = limitsOf(null, {
      kind: 'limits', lower: { value: 12, unit: 'lbf.ft' }, upper: { value: 15, unit: 'lbf.ft' },
    }, 10)
    expect(result.targetNm).toBeCloseTo(18.303542302473904, 12)
  })

  it('allows a target on a limit', () => {
    expect(limitsOf(nm(44), limits(44, 58), 10).targetNm).toBe(44)
  })

  it.each([
    ['neither target nor limits', null, null, /Give a target/],
    ['a target of zero', nm(0), null, /greater than zero/],
    ['a target of NaN', nm(Number.NaN), null, /greater than zero/],
    ['an infinite target', nm(Infinity), null, /greater than zero/],
    ['equal limits', null, limits(50, 50), /below the upper/],
    ['exchanged limits', null, limits(55, 45), /below the upper/],
    ['a lower limit of zero', null, limits(0, 45), /lower limit/],
    ['a target outside', nm(60), limits(45, 55), /outside/],
    ['0 percent', nm(50), { kind: 'percent', value: 0 } as const, /percent/],
    ['100 percent', nm(50), { kind: 'percent', value: 100 } as const, /percent/],
    ['a margin as large as the target', nm(5), { kind: 'absolute', value: 5, unit: 'N.m' } as const, /smaller/],
    ['a negative margin', nm(5), { kind: 'absolute', value: -1, unit: 'N.m' } as const, /greater than zero/],
  ])('refuses %s', (_, target, tolerance, message) => {
    expect(() => limitsOf(target, tolerance, 10)).toThrow(RangeError)
    expect(() => limitsOf(target, tolerance, 10)).toThrow(message)
  })
})
