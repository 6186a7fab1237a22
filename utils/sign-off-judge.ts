import type { WrenchAnswer } from '#shared/schemas/wrenches'
import { adapterFactor, wrenchSetting, type Adapter } from '#shared/torque/adapter'
import { unitLabel } from '#shared/torque/quantity'
import type { Stage } from '#shared/torque/stages'
import { fromNm, toNm, type Quantity, type TorqueUnit } from '#shared/torque/units'
import { figuresAt } from '#shared/wrench/figures'
import { judgeReading } from '#shared/wrench/judge'
import type { Judge } from './sign-off-progress'

type JudgingWrench = Pick<WrenchAnswer, 'kind' | 'figures' | 'permissiblePercent' | 'graduation' | 'range'>

/** How the torque gets from the wrench to the bolt. */
export interface Reach {
  adapter: Adapter | null
  multiplierRatio: number | null
}

/** The unit of the wrench's own scale. */
export const scaleUnit = (wrench: Pick<JudgingWrench, 'graduation' | 'range'>): TorqueUnit => wrench.graduation?.unit ?? wrench.range.unit

/** Judges as the server will, by the wrench's calibration; answers null without a wrench. */
export function judgeWith(wrench: JudgingWrench | null, { adapter, multiplierRatio }: Reach, leftHand: boolean): Judge {
  return (stage, value, unit) => {
    if (!wrench || (unit === 'deg') !== (stage.kind === 'angle')) return null
    const figures = unit === 'deg' ? null : figuresAt(wrench.figures, toNm({ value, unit }), leftHand ? 'anticlockwise' : 'clockwise')
    const { permissiblePercent, graduation } = wrench
    return judgeReading({ value, unit, stage, adapter, multiplierRatio, figures, permissiblePercent, graduation })
  }
}

/** Torque at the bolt over torque on the wrench; null where the adapter gives no torque at all. */
export function factorOf({ adapter, multiplierRatio }: Reach): number | null {
  try {
    return adapterFactor(adapter, multiplierRatio)
  } catch (error) {
    if (error instanceof RangeError) return null
    throw error
  }
}

/**
 * What to set on the wrench, or what it should show, for a stage's target: in the wrench's own unit, at the nearest
 * graduation of a setting wrench. Null for a stage without a torque.
 */
export function wrenchSettingFor(stage: Stage, wrench: JudgingWrench, reach: Reach): Quantity | null {
  if (stage.targetNm === null || stage.kind === 'angle') return null
  const unit = scaleUnit(wrench)
  const { setting, rounded } = wrenchSetting({ targetNm: stage.targetNm, unit, ...reach, graduation: wrench.kind === 'setting' ? wrench.graduation : null })
  return rounded ?? { value: Number(setting.value.toPrecision(4)), unit }
}

/** Why a wrench that suits the joint does not with this adapter; null where it does, or there is none. */
export function rangeDoubt(stages: readonly Stage[], wrench: JudgingWrench, reach: Reach): string | null {
  const factor = factorOf(reach)
  if (factor === null || factor === 1) return null
  const points = wrench.figures.map(point => point.targetNm)
  const from = points.length > 0 ? Math.min(...points) : Math.max(wrench.range.minNm, wrench.range.maxNm / 5)
  const to = points.length > 0 ? Math.max(...points) : wrench.range.maxNm
  const outside = stages.find(({ kind, targetNm }) =>
    kind !== 'angle' && kind !== 'snug' && targetNm !== null && (targetNm / factor < from * (1 - 1e-9) || targetNm / factor > to * (1 + 1e-9)))
  if (!outside) return null
  const shown = (nm: number) => Number(fromNm(nm, scaleUnit(wrench)).toPrecision(3))
  return `With this adapter stage ${outside.number} needs ${shown((outside.targetNm ?? 0) / factor)}, outside the ${shown(from)} to ${shown(to)} ${unitLabel(scaleUnit(wrench))} it is good for. Choose another wrench.`
}
