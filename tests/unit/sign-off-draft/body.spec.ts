import { describe, expect, it } from 'vitest'
import { correctionBody, signOffBody } from '#shared/schemas/sign-offs'
import { bodyOf, requestOf } from '../../../utils/sign-off-body'
import { enter, newDraft, type SignOffDraft } from '../../../utils/sign-off-draft'
import { judgeWith, rangeDoubt, wrenchSettingFor } from '../../../utils/sign-off-judge'
import { progressOf } from '../../../utils/sign-off-progress'
import { signBlock, signLabel } from '../../../utils/sign-off-summary'
import { stagesOf } from '#shared/torque/stages'
import { buildJoint, buildWrench, limits } from './joint'

const groupId = '01938f00-0000-7000-8000-000000000001'
const wrenchId = '01938f00-0000-7000-8000-000000000002'
const straight = { adapter: null, multiplierRatio: null }
const judge = judgeWith(buildWrench(), straight, false)
const now = new Date('2026-12-01T09:00:00Z')
const [stage = stagesOf(limits)[0]] = stagesOf(limits)
const about = { groupId, timeZone: 'Europe/Berlin', now }
const clicked = (positions: number[], draft: SignOffDraft = { ...newDraft(wrenchId), prep: { threads_clean_dry: true, new_gasket: false } }) =>
  enter(draft, { positions, stage: 1, value: 41, unit: 'N.m' })
const bodyFor = (draft: SignOffDraft, signed: number[] = []) => bodyOf(draft, progressOf(buildJoint({ signed }), draft.acts, judge), about)

describe('bodyOf', () => {
  it('is what the route takes', () => {
    const draft = { ...clicked([1, 3, 2, 4]), note: ' tight fit ', parts: [{ name: 'Gasket', partNumber: '', lot: '7' }, { name: ' ', partNumber: '', lot: '' }], tightenedAt: '2026-12-01T08:30' }
    const { path, method, body } = requestOf(draft, bodyFor(draft).body, '739164')
    expect([path, method]).toEqual([`/sign-offs/${draft.id}`, 'PUT'])
    expect(signOffBody.parse(JSON.parse(JSON.stringify(body)))).toMatchObject({
      attestedInOrder: true, prep: { threads_clean_dry: true }, note: 'tight fit', parts: [{ name: 'Gasket', lot: '7' }],
      tightenedAt: '2026-12-01T07:30:00.000Z', signedAt: now.toISOString(), capturedOffline: false,
    })
    expect(Object.keys(body.prep)).toEqual(['threads_clean_dry'])
  })

  it('goes to the corrections of the sign-off it stands in for', () => {
    const draft = { ...clicked([1]), corrects: { id: groupId, reason: 'wrong wrench' } }
    const { path, method, body } = requestOf(draft, bodyFor(draft).body, '739164')
    expect([path, method]).toEqual([`/sign-offs/${groupId}/corrections`, 'POST'])
    expect(correctionBody.parse(JSON.parse(JSON.stringify(body)))).toMatchObject({ id: draft.id, reason: 'wrong wrench' })
  })

  it('keeps the time of a try without an answer, as long as nothing was changed', () => {
    const draft = clicked([1])
    const { sent } = bodyFor(draft)
    const later = { ...about, now: new Date('2026-12-01T09:20:00Z') }
    const again = (changed: SignOffDraft) => bodyOf(changed, progressOf(buildJoint(), changed.acts, judge), later).body.signedAt
    expect(again({ ...draft, sent })).toBe(now.toISOString())
    expect(again({ ...draft, sent, note: 'changed' })).toBe(later.now.toISOString())
  })

  it('sends every attempt, and nothing that is signed already', () => {
    const draft = clicked([1], clicked([1], clicked([3])))
    expect(bodyFor(draft, [3]).body.readings).toEqual([
      { position: 1, stage: 1, attempt: 1, value: 41, unit: 'N.m' }, { position: 1, stage: 1, attempt: 2, value: 41, unit: 'N.m' },
    ])
  })

  it('attests an order only where all were entered in one go', () => {
    expect(bodyFor(clicked([1])).body.attestedInOrder).toBe(false)
  })
})

describe('what the sign button says', () => {
  const say = (draft: SignOffDraft) => signLabel(progressOf(buildJoint(), draft.acts, judge))

  it('names all, a part, or what is to come', () => {
    expect(say(newDraft())).toBe('Sign when all 4 are done')
    expect(say(clicked([1, 3, 2]))).toBe('Sign bolts 1–3, leave the rest')
    expect(say(clicked([1, 3, 2, 4]))).toBe('Sign all 4 bolts')
  })

  it('says what stands in the way', () => {
    const block = (draft: SignOffDraft, is = { wrench: true, prepared: true }) => signBlock(draft, progressOf(buildJoint(), draft.acts, judge), is)
    expect(block(newDraft())).toBe('nothing is entered yet')
    expect(block(clicked([1]), { wrench: true, prepared: false })).toBe('preparation first')
    expect(block(enter(newDraft(), { positions: [1], stage: 1, value: 20, unit: 'N.m' }))).toBe('a bolt is out of band')
    expect(block(enter(newDraft(), { positions: [1], stage: 1, value: 20, unit: 'N.m', kept: true }))).toBe('say why it stays')
    expect(block(clicked([1]))).toBe('')
  })
})

describe('wrenchSettingFor', () => {
  it('is the nearest graduation in the wrench\'s own unit', () => {
    const crowfoot = { adapter: { extensionMm: 40, angleDeg: 0, effectiveLengthMm: 320 }, multiplierRatio: null }
    expect(stage && wrenchSettingFor(stage, buildWrench(), crowfoot)).toEqual({ value: 36.5, unit: 'N.m' })
    const inFeet = { ...buildWrench(), graduation: { value: 1, unit: 'lbf.ft' as const, nm: 1.356 } }
    expect(stage && wrenchSettingFor(stage, inFeet, straight)).toEqual({ value: 30, unit: 'lbf.ft' })
  })

  it('shows an indicating wrench the exact figure', () => {
    expect(stage && wrenchSettingFor({ ...stage, targetNm: 41.26 }, buildWrench('indicating'), straight)).toEqual({ value: 41.26, unit: 'N.m' })
  })
})

describe('rangeDoubt', () => {
  it('says when an adapter takes the setting out of the calibrated range', () => {
    expect(rangeDoubt(stagesOf(limits), buildWrench(), straight)).toBeNull()
    expect(rangeDoubt(stagesOf(limits), buildWrench(), { adapter: null, multiplierRatio: 5 })).toContain('needs 8.2, outside the 12 to 60 N·m')
  })
})
