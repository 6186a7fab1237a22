export type VinProblem = 'length' | 'letters' | 'check_digit'

export interface VinCheck {
  ok: boolean
  problem?: VinProblem
  /** Weighted sum of the characters; null where it cannot be formed. */
  sum: number | null
  /** The check digit that position 9 should hold. */
  checkDigit: string | null
  /** Null where position 10 is no year code, or the VIN does not follow the North American rule. */
  modelYear: number | null
  message: string
}

const vinLength = 17
const weights = [8, 7, 6, 5, 4, 3, 2, 10, 0, 9, 8, 7, 6, 5, 4, 3, 2]
const letterValues = new Map([
  ['A', 1], ['B', 2], ['C', 3], ['D', 4], ['E', 5], ['F', 6], ['G', 7], ['H', 8],
  ['J', 1], ['K', 2], ['L', 3], ['M', 4], ['N', 5], ['P', 7], ['R', 9],
  ['S', 2], ['T', 3], ['U', 4], ['V', 5], ['W', 6], ['X', 7], ['Y', 8], ['Z', 9],
])
const yearCodes = 'ABCDEFGHJKLMNPRSTVWXY123456789'

/**
 * Model year from the code in position 10: a digit in position 7 means 1980–2009, a letter 2010–2039. That holds
 * for passenger cars, multi-purpose vehicles and light trucks; heavier vehicles may be 30 years off.
 * Null where position 10 holds no year code. Source: 49 CFR 565.15(b).
 */
export function modelYearOf(vin: string): number | null {
  const index = yearCodes.indexOf(vin.charAt(9).toUpperCase() || ' ')
  if (index < 0) return null
  return (/\d/.test(vin.charAt(6)) ? 1980 : 2010) + index
}

/**
 * Checks a VIN by length, letters and check digit, in that order; small letters count as capitals. A wrong check digit
 * is a reason to look again, not proof: it is mandatory for North America only, and genuine VINs from elsewhere fail.
 * Source: 49 CFR 565, Tables III to V.
 */
export function checkVin(typed: string): VinCheck {
  const vin = typed.trim().toUpperCase()
  const unknown = { ok: false, sum: null, checkDigit: null, modelYear: null }
  if (vin.length !== vinLength) {
    return { ...unknown, problem: 'length', message: `A VIN has 17 characters; this one has ${vin.length}.` }
  }
  const wrong = /[^A-HJ-NPR-Z\d]/.exec(vin)?.[0]
  if (wrong !== undefined) {
    const message = /[IOQ]/.test(wrong)
      ? `A VIN never has the letter ${wrong}: look for 1 or 0.`
      : `A VIN has letters and digits only, not “${wrong}”.`
    return { ...unknown, problem: 'letters', message }
  }
  const sum = weights.reduce((total, weight, index) => {
    const character = vin.charAt(index)
    return total + weight * (letterValues.get(character) ?? Number(character))
  }, 0)
  const checkDigit = sum % 11 === 10 ? 'X' : String(sum % 11)
  if (vin.charAt(8) !== checkDigit) {
    const message = `Its check digit is ${vin.charAt(8)}, but ${checkDigit} is expected. Look for a mistyped letter; `
      + 'VINs from outside North America may be right all the same.'
    return { ok: false, problem: 'check_digit', sum, checkDigit, modelYear: null, message }
  }
  return { ok: true, sum, checkDigit, modelYear: modelYearOf(vin), message: 'The check digit agrees.' }
}
