import { describe, expect, it } from 'vitest'
import { checkVin } from '#shared/vehicle/vin'

const rows = [
  {
    vin: '1M8GDM9AXKP042788',
    expected: { ok: true, sum: 351, checkDigit: 'X', modelYear: 1989 },
    source: 'classic public example (encyclopaedia, many unit tests)',
    mark: '[seen: public unit tests]+recomputed',
  },
  {
    vin: '11111111111111111',
    expected: { ok: true, sum: 89, checkDigit: '1', modelYear: 2001 },
    source: 'all-ones test vector',
    mark: '[memory]+recomputed',
  },
  {
    vin: '1G4AH59H45G118341',
    expected: { ok: true, sum: 411, checkDigit: '4', modelYear: 2005 },
    source: '49 CFR 565 Table (sample calculation 411/11 → 4)',
    mark: '[seen: CFR text copy]+recomputed',
  },
  {
    vin: '1M8GDM9A1KP042788',
    expected: { ok: false, sum: 351, checkDigit: 'X', problem: 'check_digit' },
    source: 'altered check digit',
    mark: 'recomputed',
  },
  {
    vin: '1M8GDM9AXKPO42788',
    expected: { ok: false, problem: 'letters' },
    source: 'letter O',
    mark: 'recomputed',
  },
  {
    vin: '1M8GDM9AXKP04278',
    expected: { ok: false, problem: 'length' },
    source: '16 characters',
    mark: 'recomputed',
  },
  {
    vin: 'W0L000051T2123456',
    expected: { ok: false, sum: 236, checkDigit: '5', problem: 'check_digit' },
    source: 'European VIN: fails mod-11 although genuine',
    mark: '[seen: public unit test]+recomputed',
  },
]

describe('VIN (49 CFR 565)', () => {
  it.each(rows)('$vin: $source $mark', ({ vin, expected }) => {
    expect(checkVin(vin)).toMatchObject(expected)
  })

  it('says which check digit was expected, and what is wrong with a letter or the length', () => {
    expect(checkVin('1M8GDM9A1KP042788').message).toContain('is 1, but X is expected')
    expect(checkVin('1M8GDM9AXKPO42788').message).toContain('the letter O')
    expect(checkVin('1M8GDM9AXKP04278').message).toContain('this one has 16')
  })
})
