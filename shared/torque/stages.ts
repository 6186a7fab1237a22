import type { Limits, Tolerance } from './tolerance'
import { toNm, type Quantity } from './units'

/** A stage as printed in the spec. */
export type StageSpec
  = | { kind: 'snug', target?: Quantity }
    | { kind: 'torque', target: Quantity }
    | { kind: 'percent', percent: number }
    | { kind: 'angle', angleDeg: number, toleranceDeg?: number }

export type StageKind = StageSpec['kind']

/** A stage as it is tightened and judged. Torques in N·m; null where the stage has none. */
export interface Stage {
  number: number
  kind: StageKind
  targetNm: number | null
  lowerNm: number | null
  upperNm: number | null
  angleDeg: number | null
  toleranceDeg: number | null
}

const blank = { targetNm: null, lowerNm: null, upperNm: null, angleDeg: null, toleranceDeg: null }

function scaled(limits: Limits, factor: number): Limits {
  if (!(factor > 0 && Number.isFinite(factor))) throw new RangeError('A stage must have a torque greater than zero.')
  return { targetNm: limits.targetNm * factor, lowerNm: limits.lowerNm * factor, upperNm: limits.upperNm * factor }
}

/** The spec's tolerance about a stage's own target; printed limits, and margins too wide, shrink in proportion. */
function aboutTarget(targetNm: number, limits: Limits, tolerance: Tolerance | null): Limits {
  const marginNm = tolerance?.kind === 'absolute' ? toNm(tolerance) : Infinity
  if (targetNm === limits.targetNm || !(marginNm < targetNm)) return scaled(limits, targetNm / limits.targetNm)
  return { targetNm, lowerNm: targetNm - marginNm, upperNm: targetNm + marginNm }
}

function stageOf(spec: StageSpec, number: number, limits: Limits, tolerance: Tolerance | null): Stage {
  const start = { ...blank, number, kind: spec.kind }
  switch (spec.kind) {
    case 'snug':
      return { ...start, targetNm: spec.target ? toNm(spec.target) : null }
    case 'torque':
      return { ...start, ...aboutTarget(toNm(spec.target), limits, tolerance) }
    case 'percent':
      return { ...start, ...scaled(limits, spec.percent / 100) }
    case 'angle':
      return { ...start, angleDeg: spec.angleDeg, toleranceDeg: spec.toleranceDeg ?? null }
  }
}

/**
 * The stages of a spec, numbered from 1; a spec without has one torque stage with the spec's limits. Snug has no limits
 * and is never judged; a percent stage's target and limits are the spec's times percent/100; an angle has no torque.
 * A torque stage with the spec's own target has the spec's limits; another target takes the same tolerance.
 * @throws RangeError when a stage's torque or percent is not greater than zero.
 */
export function stagesOf(
  limits: Limits,
  stages?: readonly StageSpec[] | null,
  tolerance: Tolerance | null = null,
): Stage[] {
  if (!stages || stages.length === 0) return [{ ...blank, number: 1, kind: 'torque', ...limits }]
  return stages.map((spec, index) => stageOf(spec, index + 1, limits, tolerance))
}

/**
 * The torque of each round, in the unit of `target`.
 * Source: ASME PCC-1 rounds of 20–30 %, 50–70 % and 100 %, then once round at 100 % [memory].
 */
export function passesFor(target: number, percents: readonly number[] = [30, 70, 100]): number[] {
  return percents.map(percent => target * percent / 100)
}

const straightToTargetNm = toNm({ value: 30, unit: 'lbf.ft' })

/**
 * Without printed stages: up to 30 lbf·ft (41 N·m) in one go, above it first to 70 %. N·m.
 * Source: US Army technical manuals, torque limits work package.
 */
export function customaryPasses(targetNm: number): number[] {
  return targetNm > straightToTargetNm * (1 + 1e-12) ? passesFor(targetNm, [70, 100]) : [targetNm]
}
