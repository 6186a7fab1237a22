import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import {
  counterpartUnit, formatBoth, formatNumber, formatQuantity, parseQuantity, unitLabel,
} from '#shared/torque/quantity'
import { toNm, torqueUnits, type TorqueUnit } from '#shared/torque/units'

const typed: [text: string, value: number, unit: TorqueUnit][] = [
  ['37 ft-lb', 37, 'lbf.ft'],
  ['37 lb·ft', 37, 'lbf.ft'],
  ['37 lbf ft', 37, 'lbf.ft'],
  ['37 lbf⋅ft', 37, 'lbf.ft'],
  ['37 lbf.ft', 37, 'lbf.ft'],
  ['37ft lbs.', 37, 'lbf.ft'],
  ['37 FT LBS', 37, 'lbf.ft'],
  ['37 foot-pounds', 37, 'lbf.ft'],
  ['37 pound feet', 37, 'lbf.ft'],
  ['37 ft/lbs', 37, 'lbf.ft'],
  ['450 in lbs', 450, 'lbf.in'],
  ['450 in-lb', 450, 'lbf.in'],
  ['450 inch pounds', 450, 'lbf.in'],
  ['40 oz-in', 40, 'ozf.in'],
  ['40 ozf·in', 40, 'ozf.in'],
  ['50Nm', 50, 'N.m'],
  ['50 n-m', 50, 'N.m'],
  ['50 N•m', 50, 'N.m'],
  ['50 N m', 50, 'N.m'],
  ['50 newton metres', 50, 'N.m'],
  ['  50 N·m  ', 50, 'N.m'],
  ['50 N‑m', 50, 'N.m'],
  ['50\u00A0N·m', 50, 'N.m'],
  ['５０ Nm', 50, 'N.m'],
  ['+50 Nm', 50, 'N.m'],
  ['5,1 kgm', 5.1, 'kgf.m'],
  ['5.1 m·kg', 5.1, 'kgf.m'],
  ['5.1 kpm', 5.1, 'kgf.m'],
  ['51 kgf cm', 51, 'kgf.cm'],
  ['900 cNm', 900, 'cN.m'],
  ['900 Ncm', 900, 'cN.m'],
  ['90 dNm', 90, 'dN.m'],
  ['1.2 kNm', 1.2, 'kN.m'],
  ['.5 Nm', 0.5, 'N.m'],
  ['50. Nm', 50, 'N.m'],
  ['37.ft-lb', 37, 'lbf.ft'],
  ['0,125 kgm', 0.125, 'kgf.m'],
  ['12,75 Nm', 12.75, 'N.m'],
  ['1.234,5 Nm', 1234.5, 'N.m'],
  ['1,234.5 Nm', 1234.5, 'N.m'],
  ['1e2 Nm', 100, 'N.m'],
]

const refused: [text: string, message: RegExp][] = [
  ['', /Write a number/],
  ['   ', /Write a number/],
  ['ft-lb', /Begin with a number/],
  ['NaN Nm', /Begin with a number/],
  ['Infinity Nm', /Begin with a number/],
  ['-∞', /Begin with a number/],
  ['.', /Begin with a number/],
  ['0 Nm', /greater than zero/],
  ['0,0 Nm', /greater than zero/],
  ['-5 Nm', /greater than zero/],
  ['−5 Nm', /greater than zero/],
  ['1e308 Nm', /more than any/],
  ['1e999 Nm', /more than any/],
  ['99999999 Nm', /more than any/],
  ['1e-9 Nm', /too small/],
  ['37', /unit/],
  ['37 furlongs', /do not know the unit “furlongs”/],
  ['37 N/m', /do not know the unit/],
  ['37 mNm', /do not know the unit/],
  ['5 daNm', /do not know the unit/],
  ['37 38 Nm', /do not know the unit/],
  ['1,234 ft-lb', /two ways.*1234 or 1\.234/],
  ['1.2.3 Nm', /not a number/],
  ['1,2,3 Nm', /not a number/],
  ['1,23.4,5 Nm', /not a number/],
  [`${'9'.repeat(10_000)} Nm`, /Too long/],
]

describe('a torque as people type it', () => {
  it.each(typed)('reads %j', (text, value, unit) => {
    expect(parseQuantity(text)).toEqual({ ok: true, value, unit, text: text.trim() })
  })

  it.each(refused)('refuses %.40j', (text, message) => {
    expect(parseQuantity(text)).toEqual({ ok: false, message: expect.stringMatching(message) })
  })

  it('takes the fallback unit for a number alone, and the typed unit before it', () => {
    expect(parseQuantity('37', 'lbf.ft')).toMatchObject({ value: 37, unit: 'lbf.ft' })
    expect(parseQuantity('37 Nm', 'lbf.ft')).toMatchObject({ value: 37, unit: 'N.m' })
  })

  it('never throws and never yields a torque that is not positive', () => {
    fc.assert(fc.property(fc.string({ unit: 'grapheme', maxLength: 45 }), (text) => {
      const result = parseQuantity(text, 'N.m')
      expect(result.ok ? toNm(result) > 0 : result.message.length > 0).toBe(true)
    }))
  })

  it('reads back what it shows', () => {
    const value = fc.integer({ min: 1, max: 999_999 }).map(n => n / 1000)
    fc.assert(fc.property(value, fc.constantFrom(...torqueUnits), (value, unit) => {
      expect(parseQuantity(formatQuantity({ value, unit }))).toMatchObject({ ok: true, value, unit })
    }))
  })
})

describe('a torque as it is shown', () => {
  it('leaves what a person wrote and rounds what was computed', () => {
    expect(formatNumber(37)).toBe('37')
    expect(formatNumber(12.75)).toBe('12.75')
    expect(formatNumber(50.165264088)).toBe('50.2')
    expect(formatNumber(1234.5678)).toBe('1235')
    expect(formatNumber(0.0123456)).toBe('0.0123')
    expect(formatNumber(50.165, 0)).toBe('50')
    expect(formatNumber(50, 2)).toBe('50')
    expect(formatNumber(Number.NaN)).toBe('–')
  })

  it('labels every unit', () => {
    expect(torqueUnits.map(unitLabel)).toEqual([
      'N·m', 'ft·lb', 'in·lb', 'oz·in', 'kgf·m', 'kgf·cm', 'cN·m', 'dN·m', 'kN·m',
    ])
  })

  it('sets the other system beside each unit', () => {
    expect(counterpartUnit('N.m')).toBe('lbf.ft')
    expect(counterpartUnit('N.m', 50)).toBe('lbf.ft')
    expect(counterpartUnit('N.m', 19.9)).toBe('lbf.in')
    expect(counterpartUnit('lbf.ft', 5)).toBe('N.m')
    expect(counterpartUnit('lbf.in')).toBe('N.m')
  })

  it('shows both', () => {
    const both = (value: number, unit: TorqueUnit) => formatBoth(toNm({ value, unit }), { value, unit })
    expect(both(37, 'lbf.ft')).toEqual({ printed: '37 ft·lb', other: '50.2 N·m' })
    expect(both(50, 'N.m')).toEqual({ printed: '50 N·m', other: '36.9 ft·lb' })
    expect(both(8, 'N.m')).toEqual({ printed: '8 N·m', other: '70.8 in·lb' })
    expect(both(4.1, 'kgf.m')).toEqual({ printed: '4.1 kgf·m', other: '40.2 N·m, 29.7 ft·lb' })
  })
})
