import type { GroupAnswer } from '#shared/schemas/repair-orders'
import type { WrenchAnswer } from '#shared/schemas/wrenches'
import { stagesOf, type StageSpec } from '#shared/torque/stages'

export const limits = { targetNm: 41, lowerNm: 36.9, upperNm: 45.1 }

/** Four bolts of 41 N·m ± 10 %; `signed` are covered at stage 1 by a sign-off. */
export function buildJoint({ stages, signed = [] }: { stages?: StageSpec[], signed?: number[] } = {}): Pick<GroupAnswer, 'positions' | 'order' | 'stages' | 'signOffs'> {
  return {
    positions: [1, 2, 3, 4].map(position => ({
      position, x: null, y: null, long: false, label: null,
      covered: signed.includes(position) ? [{ stage: 1, signOffId: 'earlier' }] : [],
    })),
    order: [1, 3, 2, 4],
    stages: stagesOf(limits, stages),
    signOffs: [],
  }
}

type Judging = Pick<WrenchAnswer, 'kind' | 'figures' | 'permissiblePercent' | 'graduation' | 'range'>

/** 10 to 60 N·m in steps of 0.5, W′ 2 % at every point. */
export function buildWrench(kind: Judging['kind'] = 'setting'): Judging {
  return {
    kind,
    permissiblePercent: 4,
    range: { min: 10, max: 60, unit: 'N.m', minNm: 10, maxNm: 60 },
    graduation: { value: 0.5, unit: 'N.m', nm: 0.5 },
    figures: [12, 36, 60].map(targetNm => ({ phase: 'as_found', direction: null, targetNm, meanDeviationPercent: 0.5, wPercent: 1.5, wPrimePercent: 2 })),
  }
}
