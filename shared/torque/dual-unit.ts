import { toNm, type Quantity } from './units'

export interface DualUnits {
  first: Quantity
  second: Quantity
  /** The step the first value was rounded to; by default its last printed digit. */
  firstStep?: number
  /** The step the second value was rounded to; by default its last printed digit. */
  secondStep?: number
}

export interface DualUnitCheck {
  /** First minus second, N·m. */
  diffNm: number
  /** The largest difference that rounding of both values explains, N·m. */
  limitBothNm: number
  explained: boolean
  verdict: 'rounding (from first)' | 'rounding (from second)' | 'rounding (both sides)' | 'NOT explained'
  /** The values do not agree as printed, but would if they changed places. */
  swapped: boolean
}

/** Room for the last bits of floating point, so that a value exactly on a limit counts as inside. */
const slack = 1 + 1e-9

/** The place of the last digit of `value` in its shortest decimal text: 4.1 gives 0.1, 55 gives 1. Source: own rule. */
export function printedStep(value: number): number {
  const [digits = '', exponent = '0'] = String(value).split('e')
  const decimals = (digits.split('.')[1] ?? '').length - Number(exponent)
  return decimals > 0 ? Number(`1e-${decimals}`) : 1
}

function compare({ first, second, firstStep, secondStep }: Required<DualUnits>) {
  const diffNm = toNm(first) - toNm(second)
  const firstHalfNm = toNm({ value: firstStep, unit: first.unit }) / 2
  const secondHalfNm = toNm({ value: secondStep, unit: second.unit }) / 2
  const within = (limitNm: number) => Math.abs(diffNm) <= limitNm * slack
  const limitBothNm = firstHalfNm + secondHalfNm
  const verdict: DualUnitCheck['verdict'] = within(secondHalfNm)
    ? 'rounding (from first)'
    : within(firstHalfNm)
      ? 'rounding (from second)'
      : within(limitBothNm) ? 'rounding (both sides)' : 'NOT explained'
  return { diffNm, limitBothNm, explained: within(limitBothNm), verdict }
}

/**
 * Whether two printed values of one torque differ by no more than rounding explains. Either value may be the source of
 * the other, or both may be rounded from a third that nobody sees; beyond that somebody must say which one is right.
 * A range is checked lower with lower and upper with upper. Source: own rule, provable.
 */
export function checkDualUnits(pair: DualUnits): DualUnitCheck {
  const { first, second } = pair
  const firstStep = pair.firstStep ?? printedStep(first.value)
  const secondStep = pair.secondStep ?? printedStep(second.value)
  const asPrinted = compare({ first, second, firstStep, secondStep })
  const exchanged = {
    first: { value: second.value, unit: first.unit },
    second: { value: first.value, unit: second.unit },
    firstStep: secondStep,
    secondStep: firstStep,
  }
  return { ...asPrinted, swapped: !asPrinted.explained && compare(exchanged).explained }
}
