import type { CheckAnswer, CheckBody, ConvertBody, SettingBody } from '#shared/schemas/torque'
import { adapterFactor, wrenchSetting, type WrenchSetting } from '#shared/torque/adapter'
import { orderFor, type Pattern } from '#shared/torque/order'
import { simpleProbability } from '#shared/torque/probability'
import { smallestNm } from '#shared/torque/quantity'
import { bandIssues, specLimits } from '#shared/torque/spec-rules'
import { convertTorque, toNm, type TorqueUnit } from '#shared/torque/units'
import { verdictOf } from '#shared/torque/verdict'
import type { ReadContext } from '../../context'
import { invalid } from '../../refusal'

/** A torque in another unit, and in N·m. */
export function convert({ value, unit, to }: ConvertBody): { value: number, unit: TorqueUnit, nm: number } {
  return { value: convertTorque(value, unit, to), unit: to, nm: toNm({ value, unit }) }
}

/** Whether a torque lies in a band, and how surely; `edge` where it is nearer to a limit than its uncertainty. */
export function check(ctx: Pick<ReadContext, 'shop'>, body: CheckBody): CheckAnswer {
  const { entered, unit, uncertaintyPercent } = body
  const target = typeof body.target === 'number' ? { value: body.target, unit } : body.target
  const said = { target, tolerance: body.tolerance }
  const issues = bandIssues(said)
  if (issues.length > 0) throw invalid(issues.map(({ path, message }) => ({ path: path.join('.'), message })))
  const limits = specLimits(said, ctx.shop.rules.defaultTolerancePercent)
  const nm = toNm({ value: entered, unit })
  return {
    nm,
    limits,
    verdict: verdictOf({ nm, ...limits, uNm: nm * (uncertaintyPercent ?? 0) / 100 }),
    probabilityInBand: simpleProbability({ nm, ...limits, uncertaintyPercent }),
  }
}

/**
 * What to set on the wrench so that the fastener gets the target.
 * @throws Refusal 400 for an adapter that turns the torque round
 */
export function setting({ target, adapter, multiplierRatio, graduation }: SettingBody): WrenchSetting {
  for (const [path, quantity] of Object.entries({ target, graduation })) {
    if (quantity && toNm(quantity) < smallestNm) throw invalid([{ path, message: 'That is too small for a torque.' }])
  }
  try {
    adapterFactor(adapter, multiplierRatio)
  } catch (error) {
    if (error instanceof RangeError) throw invalid([{ path: 'adapter', message: error.message }])
    throw error
  }
  return wrenchSetting({ targetNm: toNm(target), unit: target.unit, adapter, multiplierRatio, graduation })
}

/** The product's own tightening order. @throws Refusal 400 for two rows of an odd count */
export function order({ pattern, count }: { pattern: Pattern, count: number }): { order: number[] } {
  if (pattern === 'two_rows' && count % 2 === 1) {
    throw invalid([{ path: 'count', message: 'Two rows need an even number of bolts.' }])
  }
  return { order: orderFor(pattern, count) }
}
