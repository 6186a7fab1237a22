import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { checkDualUnits, printedStep } from '#shared/torque/dual-unit'
import { fromNm, toNm } from '#shared/torque/units'

describe('the step of a printed value', () => {
  it.each([
    [4.1, 0.1], [55, 1], [120, 1], [0.25, 0.01], [1e-7, 1e-7], [1.5e-7, 1e-8], [1e21, 1],
  ])('%d: %d', (value, step) => {
    expect(printedStep(value)).toBe(step)
  })
})

describe('two printed units', () => {
  it('tells a value rounded from the second', () => {
    const result = checkDualUnits({ first: { value: 21, unit: 'lbf.ft' }, second: { value: 29, unit: 'N.m' } })
    expect(result).toMatchObject({ explained: true, verdict: 'rounding (from second)', swapped: false })
  })

  it('sees swapped columns', () => {
    const result = checkDualUnits({ first: { value: 50, unit: 'lbf.ft' }, second: { value: 37, unit: 'N.m' } })
    expect(result).toMatchObject({ explained: false, verdict: 'NOT explained', swapped: true })
  })

  it('does not call a plain mistake swapped', () => {
    const result = checkDualUnits({ first: { value: 120, unit: 'lbf.in' }, second: { value: 15, unit: 'N.m' } })
    expect(result).toMatchObject({ explained: false, swapped: false })
  })

  it('counts a difference exactly at the limit as explained', () => {
    const result = checkDualUnits({ first: { value: 10, unit: 'N.m' }, second: { value: 1050, unit: 'cN.m' } })
    expect(result).toMatchObject({ explained: true, verdict: 'rounding (from second)' })
  })

  it('always explains a value that was rounded to a whole number', () => {
    fc.assert(fc.property(fc.integer({ min: 1, max: 5000 }), (value) => {
      const first = { value, unit: 'lbf.ft' } as const
      const second = { value: Math.max(1, Math.round(toNm(first))), unit: 'N.m' } as const
      expect(checkDualUnits({ first, second }).verdict).toBe('rounding (from first)')
      const back = { value: Math.max(1, Math.round(fromNm(value, 'lbf.ft'))), unit: 'lbf.ft' } as const
      expect(checkDualUnits({ first: back, second: { value, unit: 'N.m' } }).explained).toBe(true)
    }))
  })
})
