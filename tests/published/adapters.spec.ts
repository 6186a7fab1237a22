import { describe, expect, it } from 'vitest'
import { torqueAtFastener, wrenchSetting } from '#shared/torque/adapter'
import { toNm, type TorqueUnit } from '#shared/torque/units'

/** Lengths as printed; `mm` says how many millimetres one of them is. */
interface Row {
  target: number
  unit: TorqueUnit
  length: number
  extension: number
  angleDeg: number
  mm: number
  expected: number
  source: string
  mark: string
}

const rows: Row[] = [
  {
    target: 300, unit: 'lbf.in', length: 10, extension: 4, angleDeg: 0, mm: 25.4,
    expected: 214.285714285714,
    source: 'US Army TM 1-1500-204-23-9 §8-5 (prints 214)',
    mark: '[seen: tpub.com]+recomputed',
  },
  {
    target: 40, unit: 'lbf.ft', length: 12, extension: 4, angleDeg: 0, mm: 25.4,
    expected: 30,
    source: 'US Army TM 9-2350-277-40&P (prints 30)',
    mark: '[seen: TM page]+recomputed',
  },
  {
    target: 100, unit: 'lbf.in', length: 12, extension: 6, angleDeg: 0, mm: 25.4,
    expected: 66.6666666666667,
    source: 'US Navy training manual (prints 66.7)',
    mark: '[seen: tpub.com]+recomputed',
  },
  {
    target: 80, unit: 'N.m', length: 400, extension: 50, angleDeg: 0, mm: 1,
    expected: 71.1111111111111,
    source: 'public example (prints 71.1 for 40 cm + 5 cm)',
    mark: '[seen]+recomputed',
  },
  {
    target: 80, unit: 'N.m', length: 400, extension: 50, angleDeg: 90, mm: 1,
    expected: 80,
    source: '90°: no change',
    mark: '[seen: rule]+recomputed',
  },
  {
    target: 50, unit: 'N.m', length: 450, extension: 60, angleDeg: 45, mm: 1,
    expected: 45.6921068530053,
    source: 'cosine rule TM 9-254 fig. 4-6',
    mark: '[seen: rule]+recomputed',
  },
]

describe('the setting with an adapter', () => {
  it.each(rows)('$target $unit, L $length, E $extension, $angleDeg°: set $expected ($source) $mark', (row) => {
    const adapter = {
      extensionMm: row.extension * row.mm,
      angleDeg: row.angleDeg,
      effectiveLengthMm: row.length * row.mm,
    }
    const targetNm = toNm({ value: row.target, unit: row.unit })
    const { setting } = wrenchSetting({ targetNm, adapter, unit: row.unit })
    expect(setting.value).toBeCloseTo(row.expected, 9)
    expect(setting.unit).toBe(row.unit)
  })

  it('gives 70 in·lb at a setting of 60, L 12 in, E 2 in (US Army TM 9-254 §4-1d prints 70) [seen: tpub.com]', () => {
    const adapter = { extensionMm: 2 * 25.4, angleDeg: 0, effectiveLengthMm: 12 * 25.4 }
    expect(torqueAtFastener(60, adapter)).toBeCloseTo(70, 12)
  })
})
