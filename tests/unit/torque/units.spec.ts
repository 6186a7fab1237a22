import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { convertTorque, fromNm, isTorqueUnit, toNm, torqueUnits } from '#shared/torque/units'

const unit = fc.constantFrom(...torqueUnits)
const torque = fc.double({ min: 1e-6, max: 1e6, noNaN: true })

describe('torque units', () => {
  it('keeps full precision', () => {
    expect(toNm({ value: 37, unit: 'lbf.ft' })).toBe(50.165264088261814)
    expect(convertTorque(12, 'lbf.in', 'lbf.ft')).toBeCloseTo(1, 14)
    expect(convertTorque(2.5, 'kN.m', 'kN.m')).toBe(2.5)
    expect(convertTorque(0, 'N.m', 'lbf.ft')).toBe(0)
    expect(toNm({ value: Number.NaN, unit: 'lbf.ft' })).toBeNaN()
  })

  it('knows its units and nothing else', () => {
    expect(torqueUnits.every(isTorqueUnit)).toBe(true)
    for (const other of ['deg', 'lbf', 'n.m', 'Nm', '', 'constructor', 37, null, undefined]) {
      expect(isTorqueUnit(other)).toBe(false)
    }
  })

  it('comes back to where it began, through N·m and between any two units', () => {
    fc.assert(fc.property(torque, unit, unit, (value, from, to) => {
      expect(fromNm(toNm({ value, unit: from }), from) / value).toBeCloseTo(1, 13)
      expect(convertTorque(convertTorque(value, from, to), to, from) / value).toBeCloseTo(1, 13)
      expect(toNm({ value: convertTorque(value, from, to), unit: to }) / toNm({ value, unit: from })).toBeCloseTo(1, 13)
    }))
  })
})

describe('the short way to N·m and back', () => {
  it('agrees with the converter to the last bits, in every unit', () => {
    fc.assert(fc.property(fc.constantFrom(...torqueUnits), fc.double({ min: 1e-3, max: 1e6, noNaN: true }), (unit, value) => {
      const close = (a: number, b: number) => Math.abs(a - b) <= 4 * Number.EPSILON * Math.abs(b)
      expect(close(toNm({ value, unit }), convertTorque(value, unit, 'N.m'))).toBe(true)
      expect(close(fromNm(value, unit), convertTorque(value, 'N.m', unit))).toBe(true)
    }))
  })
})
