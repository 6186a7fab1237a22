import { formatNumber } from '../torque/quantity'
import type { CalibrationStatus, WrenchKind } from '../types/words'

export const fitnessCodes = [
  'overdue', 'not_calibrated', 'quarantined', 'at_laboratory', 'lost', 'retired',
  'below_range', 'above_range', 'uncertainty_too_large', 'wrong_direction',
  'uncertainty_large', 'low_in_range', 'high_in_range', 'graduation_coarse',
] as const

export type FitnessCode = typeof fitnessCodes[number]

export interface FitnessReason {
  code: FitnessCode
  text: string
  /** A hard reason makes the wrench unfit; the others are hints. */
  hard: boolean
}

export interface FitnessInput {
  status: CalibrationStatus
  kind: WrenchKind
  rangeMinNm: number
  rangeMaxNm: number
  /** The range a certificate covers; null or absent without one. */
  calibratedRange?: { minNm: number, maxNm: number } | null
  graduationNm?: number | null
  bandLowerNm: number
  bandUpperNm: number
  targetNm: number
  /** Torque at the fastener over torque shown, as adapterFactor gives it. */
  factor: number
  /** W′ of the certificate at this torque, percent; null without one. */
  wPrimePercent: number | null
  /** Stands in for W′ where there is none, percent. */
  permissiblePercent: number
  /** The directions the wrench measures in, clockwise and anticlockwise; nothing is said when absent. */
  directions?: readonly string[] | null
  leftHand?: boolean
}

/** Below this share of its maximum an uncertified wrench is not trusted. Source: US Army TM 1-1500-204-23-9. */
const lowestShare = 0.2
const bestShares = { from: 0.3, to: 0.8 }
const bestUse = 'a wrench is best between 30 and 80 % of its maximum.'
const coarsestShare = 0.1

const unusable: Partial<Record<CalibrationStatus, { code: FitnessCode, text: string }>> = {
  overdue: { code: 'overdue', text: 'Its calibration is overdue.' },
  none: { code: 'not_calibrated', text: 'It has no calibration.' },
  quarantined: { code: 'quarantined', text: 'It is quarantined.' },
  at_laboratory: { code: 'at_laboratory', text: 'It is at the laboratory.' },
  lost: { code: 'lost', text: 'It is lost.' },
  retired: { code: 'retired', text: 'It is retired.' },
}

const nm = (value: number) => `${formatNumber(Number(value.toPrecision(12)))} N·m`

function* rangeReasons(input: FitnessInput, settingNm: number): Generator<FitnessReason> {
  const { rangeMaxNm, rangeMinNm, calibratedRange } = input
  const lowest = calibratedRange?.minNm ?? Math.max(rangeMinNm, lowestShare * rangeMaxNm)
  const highest = calibratedRange?.maxNm ?? rangeMaxNm
  const what = `A ${input.kind === 'setting' ? 'setting' : 'reading'} of ${nm(settingNm)}`
  const whose = calibratedRange ? 'its calibrated range' : 'its usable range'
  // A setting at the very end of the range is inside it; the last bits of a conversion must not decide.
  if (settingNm < lowest * (1 - 1e-9)) {
    yield { code: 'below_range', text: `${what} is below ${whose}, which begins at ${nm(lowest)}.`, hard: true }
  } else if (settingNm > highest * (1 + 1e-9)) {
    yield { code: 'above_range', text: `${what} is above ${whose}, which ends at ${nm(highest)}.`, hard: true }
  } else if (settingNm < bestShares.from * rangeMaxNm * (1 - 1e-9)) {
    yield { code: 'low_in_range', text: `Low in its range: ${bestUse}`, hard: false }
  } else if (settingNm > bestShares.to * rangeMaxNm * (1 + 1e-9)) {
    yield { code: 'high_in_range', text: `High in its range: ${bestUse}`, hard: false }
  }
}

function* uncertaintyReasons(input: FitnessInput): Generator<FitnessReason> {
  const halfWidthNm = (input.bandUpperNm - input.bandLowerNm) / 2
  const uNm = input.targetNm * (input.wPrimePercent ?? input.permissiblePercent) / 100
  const figure = `${input.wPrimePercent === null ? 'permissible deviation' : 'W′'} of ${nm(uNm)}`
  const band = `the ±${nm(halfWidthNm)} of the band`
  if (uNm >= halfWidthNm * (1 - 1e-9)) {
    yield { code: 'uncertainty_too_large', text: `Its ${figure} uses up ${band}.`, hard: true }
  } else if (uNm > halfWidthNm / 2 * (1 + 1e-9)) {
    yield { code: 'uncertainty_large', text: `Its ${figure} is more than half of ${band}.`, hard: false }
  }
}

/**
 * Whether a wrench suits a joint, with every reason in plain words. Hard: not valid, outside the calibrated range
 * (without a certificate: below 20 % of its maximum), W′ at or above half the band's width, a left-hand thread and a
 * wrench that measures clockwise only. Hints never make it unfit: W′ above half of that, outside 30–80 % of the
 * maximum, a graduation above 10 % of the torque. Torques in N·m; limits and target at the fastener, ranges on the
 * wrench.
 * Source: US Army TM 1-1500-204-23-9 Table 8-1 for the shares; the rest own rule.
 */
export function wrenchFitness(input: FitnessInput): { fit: boolean, reasons: FitnessReason[] } {
  const settingNm = input.targetNm / input.factor
  const reasons: FitnessReason[] = []
  const state = unusable[input.status]
  if (state) reasons.push({ ...state, hard: true })
  reasons.push(...rangeReasons(input, settingNm), ...uncertaintyReasons(input))
  if (input.leftHand && input.directions && !input.directions.includes('anticlockwise')) {
    const text = 'The thread is left-hand and it measures clockwise only.'
    reasons.push({ code: 'wrong_direction', text, hard: true })
  }
  if (input.graduationNm && input.graduationNm > coarsestShare * settingNm * (1 + 1e-9)) {
    const text = `Its graduation of ${nm(input.graduationNm)} is more than 10 % of the setting.`
    reasons.push({ code: 'graduation_coarse', text, hard: false })
  }
  return { fit: reasons.every(reason => !reason.hard), reasons }
}
