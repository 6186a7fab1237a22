import { describe, expect, it } from 'vitest'
import { assessPoint, deliveredLimits, deviationPercent } from '#shared/wrench/calibration'
import { permissiblePercent, type ToolClass } from '#shared/wrench/classes'
import { calibrationStatus, dueOn } from '#shared/wrench/due'
import { budget } from '#shared/wrench/uncertainty'

// Source: ISO 6789-1:2017 cl. 5.1.5 tables [memory]; the split of II-A at 10 N·m [seen: public tool manual quoting it].
const permissible: { toolClass: ToolClass, maxNm: number, expected: number }[] = [
  { toolClass: 'I-A', maxNm: 200, expected: 6 },
  { toolClass: 'I-B', maxNm: 8, expected: 6 },
  { toolClass: 'I-C', maxNm: 100, expected: 4 },
  { toolClass: 'II-A', maxNm: 10, expected: 6 },
  { toolClass: 'II-A', maxNm: 200, expected: 4 },
  { toolClass: 'II-D', maxNm: 5, expected: 6 },
  { toolClass: 'II-C', maxNm: 50, expected: 4 },
]

// Source: ISO 6789-1:2017 cl. 7, a_s = (x_a − x_r)/x_r·100 [memory], recomputed.
const deviations = [
  { indicated: 100, reference: 104, expected: -3.84615384615385 },
  { indicated: 100, reference: 96, expected: 4.16666666666667 },
  { indicated: 60, reference: 61.2, expected: -1.96078431372549 },
]

// Source: ISO 6789-1:2017 cl. 5.3, 12 months or 5 000 cycles where the user has no procedure of his own [memory].
const dues = [
  {
    firstUse: '2025-03-14',
    months: 12,
    cycles: 1200,
    cycleLimit: 5000,
    expected: { dueDate: '2026-03-14', dueByCycles: false },
  },
  {
    firstUse: '2024-02-29',
    months: 12,
    cycles: 4999,
    cycleLimit: 5000,
    expected: { dueDate: '2025-02-28', dueByCycles: false },
  },
  {
    firstUse: '2025-06-30',
    months: 12,
    cycles: 5000,
    cycleLimit: 5000,
    expected: { dueDate: '2026-06-30', dueByCycles: true },
  },
]

describe('ISO 6789-1', () => {
  it.each(permissible)('class $toolClass to $maxNm N·m may deviate by $expected % (cl. 5.1.5 [memory])', (row) => {
    expect(permissiblePercent(row.toolClass, row.maxNm)).toBe(row.expected)
  })

  it.each(deviations)('$indicated shown, $reference measured: $expected % (cl. 7 [memory])', (row) => {
    expect(deviationPercent(row.indicated, row.reference)).toBeCloseTo(row.expected, 9)
  })

  it('judges every reading of a 60 N·m point (cl. 7 [memory] rule, recomputed)', () => {
    const readings = [60.6, 60.9, 60.5, 60.8, 60.7].map(reference => ({ indicated: 60, reference }))
    const result = assessPoint({ targetNm: 60, readings, limitPercent: 4 })
    const expected = [-0.990099009900992, -1.47783251231527, -0.826446280991736, -1.31578947368421, -1.15321252059309]
    expected.forEach((deviation, index) => expect(result.deviationsPercent[index]).toBeCloseTo(deviation, 9))
    expect(result.deviationsPercent).toHaveLength(expected.length)
    expect(result.meanDeviationPercent).toBeCloseTo(-1.15267595949706, 9)
    expect(result.verdict).toBe('pass')
  })

  it('delivers 96.154 to 104.167 at 100 within 4 % (algebra of a_s, recomputed)', () => {
    const { low, high } = deliveredLimits(100, 4)
    expect(low).toBeCloseTo(96.1538461538461, 9)
    expect(high).toBeCloseTo(104.166666666667, 9)
  })

  it.each(dues)('first used $firstUse, after $cycles cycles: due $expected.dueDate (cl. 5.3 [memory])', (row) => {
    const due = dueOn(row.firstUse, row.months)
    expect(due).toBe(row.expected.dueDate)
    const { status } = calibrationStatus({
      state: 'in_use',
      dueOn: due,
      today: row.firstUse,
      dueSoonDays: 14,
      cyclesSince: row.cycles,
      intervalCycles: row.cycleLimit,
    })
    expect(status === 'overdue').toBe(row.expected.dueByCycles)
  })
})

describe('ISO 6789-2', () => {
  // Structure of the budget after cl. 6–7 [memory], recomputed; own data.
  it('adds up a whole budget at 60 N·m', () => {
    const result = budget({
      target: 60,
      readings: [60.6, 60.9, 60.5, 60.8, 60.7].map(reference => ({ indicated: 60, reference })),
      uncertaintyPercent: 0.6,
      graduation: 0.5,
      reproducibility: 0.3,
      outputDrive: 0.4,
      interfaceSpread: 0.35,
      loadingPoint: 0.25,
      referenceErrorPercent: 0.1,
    })
    const expected = {
      meanReference: 60.7,
      standardDeviation: 0.158113883008418,
      meanDeviationPercent: -1.15267595949706,
      wMd: 0.3,
      wR: 0.240562612162344,
      wRep: 0.144337567297406,
      wOd: 0.192450089729875,
      wInt: 0.168393828513641,
      wL: 0.120281306081172,
      wRe: 0.116492056208656,
      w: 0.511991419825113,
      wPercent: 1.02398283965023,
      wPrimePercent: 2.27665879914728,
    }
    expect(Object.keys(result).sort()).toEqual(Object.keys(expected).sort())
    for (const [name, value] of Object.entries(expected)) {
      expect(result, name).toHaveProperty(name, expect.closeTo(value, 9))
    }
  })
})
