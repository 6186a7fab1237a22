import { describe, expect, it } from 'vitest'
import { readPrintedOrder, readPositions } from '../../../utils/bolt-numbers'
import { emptySpecForm, quantityEntry } from '../../../utils/torque-spec-form'
import { liveTorque } from '../../../utils/torque-spec-live'
import { appliesToWords, explainMismatch, mismatchesOf, retorqueWords, specSourceWords, toleranceWords } from '../../../utils/torque-spec-words'

describe('explainMismatch', () => {
  it.each([
    [{ value: 20, unit: 'lbf.ft' }, { value: 25, unit: 'N.m' }, '20 ft·lb is 27.1 N·m; 25 N·m printed beside it is 2.1 N·m off, more than rounding explains.'],
    [{ value: 120, unit: 'lbf.in' }, { value: 15, unit: 'N.m' }, '120 in·lb is 13.6 N·m; 15 N·m printed beside it is 1.4 N·m off, more than rounding explains.'],
    [{ value: 300, unit: 'lbf.ft' }, { value: 408, unit: 'N.m' }, '300 ft·lb is 406.7 N·m; 408 N·m printed beside it is 1.3 N·m off, more than rounding explains.'],
  ] as const)('says of %j and %j how far apart they are', (first, second, text) => {
    expect(explainMismatch(first, second)).toEqual({ text, swapped: false })
  })

  it('knows columns that changed places', () => {
    expect(explainMismatch({ value: 50, unit: 'lbf.ft' }, { value: 37, unit: 'N.m' })?.swapped).toBe(true)
  })

  it('is silent where rounding explains it', () => {
    expect(explainMismatch({ value: 17, unit: 'lbf.ft' }, { value: 23, unit: 'N.m' })).toBeNull()
  })

  it('holds a range lower against lower and upper against upper', () => {
    const lower = { value: 25, unit: 'lbf.ft' } as const
    const upper = { value: 35, unit: 'lbf.ft' } as const
    const found = mismatchesOf({
      target: null, printed: null, tolerance: { kind: 'limits', lower, upper },
      printedLimits: { lower: { value: 3.5, unit: 'kgf.m' }, upper: { value: 9, unit: 'kgf.m' } },
    })
    expect(found.map(one => one.text)).toEqual(['35 ft·lb is 4.84 kgf·m; 9 kgf·m printed beside it is 40.8 N·m off, more than rounding explains.'])
  })
})

describe('words of a spec', () => {
  it.each([
    [null, 'none printed: the shop’s own ± 10 %'],
    [{ kind: 'percent', value: 7.5 }, '± 7.5 %'],
    [{ kind: 'absolute', value: 5, unit: 'N.m' }, '± 5 N·m'],
    [{ kind: 'limits', lower: { value: 12, unit: 'lbf.ft' }, upper: { value: 15, unit: 'lbf.ft' } }, '12 to 15 ft·lb'],
  ] as const)('tolerance %j', (tolerance, words) => {
    expect(toleranceWords(tolerance, 10)).toBe(words)
  })

  it('cites the source in one line', () => {
    expect(specSourceWords({ title: 'Manual 7', section: 'paragraph 4-46A', page: '4-95', date: null })).toBe('Manual 7, paragraph 4-46A, page 4-95')
  })

  it('names the vehicles', () => {
    expect(appliesToWords({ make: 'Ardent', model: 'Mule', yearFrom: 2018, yearTo: 2022, engine: '3.2 D' })).toBe('Ardent Mule, 2018–2022, 3.2 D')
    expect(appliesToWords({ yearTo: 2020 })).toBe('up to 2020')
    expect(appliesToWords(null)).toBeNull()
  })

  it('says when to tighten again', () => {
    expect(retorqueWords({ afterKm: 80, afterDays: 1, note: 'cold' })).toBe('after 80 km or 1 day; cold')
    expect(retorqueWords(null)).toBeNull()
  })
})

describe('bolt numbers', () => {
  it.each([
    ['1 4 2 5 3 6', 6, 'circle', [1, 4, 2, 5, 3, 6]],
    ['1-3-2-4', 4, 'circle', [1, 3, 2, 4]],
    ['a1, b2 A2 B1', 4, 'two_rows', [1, 4, 2, 3]],
    ['', null, '', []],
  ] as const)('reads %j', (text, count, pattern, positions) => {
    expect(readPrintedOrder(text, count, pattern)).toEqual({ ok: true, positions })
  })

  it.each([
    ['1 2 2', 3, 'Bolt 2 stands twice.'],
    ['1 2 9', 3, 'There is no bolt 9 among 3.'],
    ['1 2', 4, 'Bolts 3, 4 are missing.'],
    ['1 2', null, 'Say how many bolts there are, then the order can be checked.'],
    ['1 x', 3, '“x” is no bolt number.'],
  ] as const)('refuses %j of %j', (text, count, message) => {
    expect(readPrintedOrder(text, count, 'circle')).toEqual({ ok: false, message })
  })

  it('needs no count for a few positions', () => {
    expect(readPositions('2 5', null, '')).toEqual({ ok: true, positions: [2, 5] })
  })
})

describe('the torque while it is typed', () => {
  const form = { ...emptySpecForm('lbf.ft'), target: quantityEntry({ value: 20, unit: 'lbf.ft' }) }

  it('has the shop’s band without a tolerance of its own', () => {
    const { limits } = liveTorque(form, 10)
    expect(limits?.lowerNm).toBeCloseTo(24.4047, 4)
    expect(limits?.upperNm).toBeCloseTo(29.828, 4)
  })

  it('tells a mismatch at once', () => {
    expect(liveTorque({ ...form, printed: quantityEntry({ value: 25, unit: 'N.m' }) }, 10).mismatches).toHaveLength(1)
  })

  it('is silent while it is incomplete and says what makes no band', () => {
    expect(liveTorque(emptySpecForm(), 10)).toEqual({ limits: null, problem: null, mismatches: [] })
    expect(liveTorque({ ...form, toleranceKind: 'absolute', margin: quantityEntry({ value: 90, unit: 'N.m' }) }, 10).problem)
      .toBe('The tolerance must be smaller than the target.')
  })
})
