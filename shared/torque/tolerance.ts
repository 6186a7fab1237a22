import { toNm, type Quantity, type TorqueUnit } from './units'

/** How far from the target a torque may lie. */
export type Tolerance
  = | { kind: 'percent', value: number }
    | { kind: 'absolute', value: number, unit: TorqueUnit }
    | { kind: 'limits', lower: Quantity, upper: Quantity }

/** Target and inclusive limits at the fastener, N·m. */
export interface Limits {
  targetNm: number
  lowerNm: number
  upperNm: number
}

function positiveNm(quantity: Quantity, name: string): number {
  const nm = toNm(quantity)
  if (!(nm > 0 && Number.isFinite(nm))) throw new RangeError(`The ${name} must be a torque greater than zero.`)
  return nm
}

function percentLimits(targetNm: number, percent: number): Limits {
  if (!(percent > 0 && percent < 100)) throw new RangeError('A tolerance in percent must be above 0 and below 100.')
  // (100 ± p)/100 keeps round values round: 50 N·m ± 10 % is 55, not 55.00000000000001.
  return { targetNm, lowerNm: targetNm * (100 - percent) / 100, upperNm: targetNm * (100 + percent) / 100 }
}

/**
 * The limits of a spec in N·m. Without a tolerance the shop's default percent stands; without a target the printed
 * limits' midpoint is the target.
 * @throws RangeError when there is neither target nor limits, lower is not below upper, the target lies outside the
 * limits, or the tolerance leaves no positive band.
 */
export function limitsOf(target: Quantity | null, tolerance: Tolerance | null, shopDefaultPercent: number): Limits {
  if (tolerance?.kind === 'limits') {
    const lowerNm = positiveNm(tolerance.lower, 'lower limit')
    const upperNm = positiveNm(tolerance.upper, 'upper limit')
    if (lowerNm >= upperNm) throw new RangeError('The lower limit must be below the upper limit.')
    const targetNm = target ? positiveNm(target, 'target') : (lowerNm + upperNm) / 2
    if (targetNm < lowerNm || targetNm > upperNm) throw new RangeError('The target lies outside the limits.')
    return { targetNm, lowerNm, upperNm }
  }
  if (!target) throw new RangeError('Give a target, or a lower and an upper limit.')
  const targetNm = positiveNm(target, 'target')
  if (tolerance?.kind !== 'absolute') return percentLimits(targetNm, tolerance?.value ?? shopDefaultPercent)
  const marginNm = positiveNm(tolerance, 'tolerance')
  if (marginNm >= targetNm) throw new RangeError('The tolerance must be smaller than the target.')
  return { targetNm, lowerNm: targetNm - marginNm, upperNm: targetNm + marginNm }
}
