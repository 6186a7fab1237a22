import { describe, expect, it } from 'vitest'
import { wrenchFitness, type FitnessInput } from '#shared/wrench/fitness'

// 50 N·m ± 10 % with a certified 20–100 N·m wrench: nothing to say against it.
const good: FitnessInput = {
  status: 'valid',
  kind: 'setting',
  rangeMinNm: 20,
  rangeMaxNm: 100,
  calibratedRange: { minNm: 20, maxNm: 100 },
  graduationNm: 1,
  bandLowerNm: 45,
  bandUpperNm: 55,
  targetNm: 50,
  factor: 1,
  wPrimePercent: 2,
  permissiblePercent: 4,
  directions: ['clockwise'],
  leftHand: false,
}

function codes(change: Partial<FitnessInput>) {
  const { fit, reasons } = wrenchFitness({ ...good, ...change })
  expect(fit).toBe(reasons.every(reason => !reason.hard))
  expect(reasons.every(reason => reason.text.endsWith('.'))).toBe(true)
  return reasons.map(reason => `${reason.hard ? 'hard' : 'hint'}: ${reason.code}`)
}

const target = (nm: number): Partial<FitnessInput> => ({ targetNm: nm, bandLowerNm: nm * 0.9, bandUpperNm: nm * 1.1 })
const uncertified = { calibratedRange: null, wPrimePercent: null, permissiblePercent: 4 }

describe('fitness of a wrench', () => {
  it('has nothing to say against a good one', () => {
    expect(wrenchFitness(good)).toEqual({ fit: true, reasons: [] })
    expect(codes({ status: 'due_soon' })).toEqual([])
  })

  it.each([
    ['overdue', 'overdue'], ['none', 'not_calibrated'], ['quarantined', 'quarantined'],
    ['at_laboratory', 'at_laboratory'], ['lost', 'lost'], ['retired', 'retired'],
  ] as const)('is unfit when %s', (status, code) => {
    expect(codes({ status })).toEqual([`hard: ${code}`])
  })

  it.each<[string, Partial<FitnessInput>, string[]]>([
    ['below the calibrated range', target(19.9), ['hard: below_range']],
    ['at its beginning', target(20), ['hint: low_in_range']],
    ['at 30 %', target(30), []],
    ['at 80 %', target(80), []],
    ['above 80 %', target(81), ['hint: high_in_range']],
    ['at its end', target(100), ['hint: high_in_range']],
    ['above the calibrated range', target(100.1), ['hard: above_range']],
    ['certified from 10 % on', { ...target(12), calibratedRange: { minNm: 10, maxNm: 100 } }, ['hint: low_in_range']],
    ['below 20 % without a certificate', { ...target(19.9), ...uncertified, rangeMinNm: 5 }, ['hard: below_range']],
    ['below its lowest mark, uncertified', { ...target(24), ...uncertified, rangeMinNm: 25 }, ['hard: below_range']],
    ['reached by an adapter', { ...target(110), factor: 1.25 }, ['hint: high_in_range']],
    ['lost by an adapter', { ...target(24), factor: 1.25 }, ['hard: below_range']],
    ['W′ at half the band', { wPrimePercent: 5 }, []],
    ['W′ above half the band', { wPrimePercent: 5.1 }, ['hint: uncertainty_large']],
    ['W′ at the band', { wPrimePercent: 10 }, ['hard: uncertainty_too_large']],
    ['permissible deviation for W′', { wPrimePercent: null, permissiblePercent: 6 }, ['hint: uncertainty_large']],
    ['a narrow band', { bandLowerNm: 49, bandUpperNm: 51 }, ['hard: uncertainty_too_large']],
    ['a graduation of 10 %', { graduationNm: 5 }, []],
    ['a coarse graduation', { graduationNm: 6 }, ['hint: graduation_coarse']],
    ['no graduation', { graduationNm: null }, []],
    ['left-hand thread, clockwise only', { leftHand: true }, ['hard: wrong_direction']],
    ['left-hand thread, both ways', { leftHand: true, directions: ['clockwise', 'anticlockwise'] }, []],
    ['left-hand thread, directions unknown', { leftHand: true, directions: null }, []],
  ])('%s', (_, change, expected) => {
    expect(codes(change)).toEqual(expected)
  })

  it('says why in plain words', () => {
    const { reasons } = wrenchFitness({ ...good, ...target(10), status: 'overdue', kind: 'indicating' })
    expect(reasons.map(reason => reason.text)).toEqual([
      'Its calibration is overdue.',
      'A reading of 10 N·m is below its calibrated range, which begins at 20 N·m.',
    ])
    expect(wrenchFitness({ ...good, wPrimePercent: 12 }).reasons[0]?.text)
      .toBe('Its W′ of 6 N·m uses up the ±5 N·m of the band.')
  })
})
