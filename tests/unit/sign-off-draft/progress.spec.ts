import { describe, expect, it } from 'vitest'
import type { StageSpec } from '#shared/torque/stages'
import { enter, keepAsIs, newDraft, restart } from '../../../utils/sign-off-draft'
import { judgeWith } from '../../../utils/sign-off-judge'
import { paintOf, progressOf } from '../../../utils/sign-off-progress'
import { buildJoint, buildWrench } from './joint'

const judge = judgeWith(buildWrench('indicating'), { adapter: null, multiplierRatio: null }, false)
const reading = (position: number, value: number, stage = 1) => ({ positions: [position], stage, value, unit: 'N.m' as const })
const turn = (position: number, value: number, stage: number) => ({ positions: [position], stage, value, unit: 'deg' as const })
const staged: StageSpec[] = [{ kind: 'snug' }, { kind: 'percent', percent: 50 }, { kind: 'torque', target: { value: 41, unit: 'N.m' } }]
const angled: StageSpec[] = [{ kind: 'torque', target: { value: 41, unit: 'N.m' } }, { kind: 'angle', angleDeg: 90, toleranceDeg: 5 }]

describe('progressOf', () => {
  it('goes in tightening order', () => {
    const progress = progressOf(buildJoint(), enter(newDraft(), reading(1, 41)).acts, judge)
    expect(progress.todo).toEqual([3, 2, 4])
    expect(progress.entered).toEqual([1])
    expect(progress.complete).toBe(false)
  })

  it('is complete when every bolt is in band', () => {
    const { acts } = enter(newDraft(), { positions: [1, 3, 2, 4], stage: 1, value: 41, unit: 'N.m' })
    expect(progressOf(buildJoint(), acts, judge)).toMatchObject({ complete: true, stage: null, unsettled: false, finished: [1, 3, 2, 4] })
  })

  it('takes a low bolt again, and counts the second attempt', () => {
    const low = enter(newDraft(), reading(1, 30))
    expect(progressOf(buildJoint(), low.acts, judge)).toMatchObject({ todo: [1, 3, 2, 4], unsettled: true })
    expect(progressOf(buildJoint(), low.acts, judge).stateOf(1, 1)).toBe('again')
    const second = progressOf(buildJoint(), enter(low, reading(1, 41)).acts, judge)
    expect(second.stateOf(1, 1)).toBe('done')
    expect(second.attempts.map(({ attempt, judged }) => [attempt, judged?.verdict])).toEqual([[1, 'low'], [2, 'in_band']])
  })

  it('takes a high bolt out and begins again at the first stage with it', () => {
    const all = (stage: number, value: number | null) => ({ positions: [1, 3, 2, 4], stage, value, unit: value === null ? null : 'N.m' as const })
    const high = [all(1, null), all(2, 20.5), reading(1, 50, 3)].reduce(enter, newDraft())
    const joint = buildJoint({ stages: staged })
    expect(progressOf(joint, high.acts, judge).stateOf(1, 3)).toBe('restart')
    const again = progressOf(joint, restart(high, 1).acts, judge)
    expect([again.stage, again.todo]).toEqual([1, [1]])
    expect([2, 3].map(stage => again.stateOf(1, stage))).toEqual(['waiting', 'waiting'])
    expect(again.unsettled).toBe(true)
  })

  it('never tightens again past an angle', () => {
    const joint = buildJoint({ stages: angled })
    const acts = [reading(1, 41), turn(1, 70, 2)].reduce(enter, newDraft()).acts
    expect(progressOf(joint, acts, judge).stateOf(1, 2)).toBe('replace')
    const afterAngle = buildJoint({ stages: [...angled, { kind: 'torque', target: { value: 41, unit: 'N.m' } }] })
    const low = [reading(1, 41), turn(1, 90, 2), reading(1, 30, 3)].reduce(enter, newDraft()).acts
    expect(progressOf(afterAngle, low, judge).stateOf(1, 3)).toBe('replace')
  })

  it('lets a bolt out of band stay with a reason', () => {
    const kept = keepAsIs(enter(newDraft(), reading(1, 50)), 1, 1, 'the maker allows it')
    const progress = progressOf(buildJoint(), kept.acts, judge)
    expect([progress.stateOf(1, 1), progress.unsettled]).toEqual(['done', false])
    expect(paintOf(buildJoint(), progress, 1, null)[1]).toBe('out')
  })

  it('keeps stages one after another, and lets a ready bolt go ahead', () => {
    const joint = buildJoint({ stages: staged })
    const { acts } = enter(newDraft(), { positions: [1], stage: 1, value: null, unit: null })
    expect(progressOf(joint, acts, judge).stage).toBe(1)
    expect(progressOf(joint, acts, judge).stateOf(3, 2)).toBe('waiting')
    expect(progressOf(joint, acts, judge, { picked: 2 })).toMatchObject({ stage: 2, todo: [1] })
    expect(progressOf(joint, acts, judge, { picked: 3 }).stage).toBe(1)
  })

  it('leaves out what somebody else signed, and keeps what was typed for it', () => {
    const joint = buildJoint({ signed: [1, 3] })
    expect(progressOf(joint, [], judge).todo).toEqual([2, 4])
    const progress = progressOf(joint, enter(newDraft(), reading(1, 41)).acts, judge)
    expect(progress.attempts[0]?.covered).toBe(true)
    expect([progress.entered, progress.todo]).toEqual([[], [2, 4]])
    expect(progressOf(joint, [], judge, { correctsId: 'earlier' }).todo).toEqual([1, 3, 2, 4])
  })
})

describe('paintOf', () => {
  it('is hollow for what is entered, broken for what is out of band', () => {
    const progress = progressOf(buildJoint(), [reading(1, 41), reading(3, 50)].reduce(enter, newDraft()).acts, judge)
    expect(paintOf(buildJoint(), progress, 1, null)).toEqual({ 1: 'tightened', 2: 'none', 3: 'out', 4: 'none' })
  })
})
