import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { checkVin, modelYearOf } from '#shared/vehicle/vin'

describe('VIN', () => {
  it('takes small letters and the space around it', () => {
    expect(checkVin(' 1m8gdm9axkp042788 ')).toMatchObject({ ok: true, checkDigit: 'X', modelYear: 1989 })
  })

  it.each([
    ['', 'length', /has 0/],
    ['1M8GDM9AXKP0427889', 'length', /has 18/],
    ['1M8GDM9AXKPI42788', 'letters', /letter I/],
    ['1M8GDM9AXKPQ42788', 'letters', /letter Q/],
    ['1M8GDM9AXKP-42788', 'letters', /not “-”/],
    ['1M8GDM9AXKPÄ42788', 'letters', /not “Ä”/],
    ['2M8GDM9AXKP042788', 'check_digit', /is X, but \d is expected/],
  ])('%j: %s', (vin, problem, message) => {
    const result = checkVin(vin)
    expect(result).toMatchObject({ ok: false, problem, modelYear: null })
    expect(result.message).toMatch(message)
  })

  it('reads the year by position 7', () => {
    expect(modelYearOf('1234569890A123456')).toBeNull()
    expect(modelYearOf('123456789A1234567')).toBe(1980)
    expect(modelYearOf('123456A89A1234567')).toBe(2010)
    expect(modelYearOf('123456A8991234567')).toBe(2039)
    expect(modelYearOf('12345678991234567')).toBe(2009)
    for (const code of 'IOQUZ0') expect(modelYearOf(`123456789${code}1234567`)).toBeNull()
    expect(modelYearOf('')).toBeNull()
  })

  it('notices any one wrong digit', () => {
    const vin = '1M8GDM9AXKP042788'
    fc.assert(fc.property(fc.integer({ min: 0, max: 16 }), fc.integer({ min: 0, max: 9 }), (place, digit) => {
      const old = vin.charAt(place)
      fc.pre(/\d/.test(old) && old !== String(digit))
      expect(checkVin(vin.slice(0, place) + digit + vin.slice(place + 1)).ok).toBe(false)
    }))
  })
})
