import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { deriveGroup, type GroupFacts, type SignOffFacts } from '../../../server/services/fastener-groups/state'

const signOff = (overrides: Partial<SignOffFacts> = {}): SignOffFacts => ({
  id: 'a', sequence: 10, technicianId: 't', technicianName: 'T', signedAt: '2026-01-01T00:00:00Z', verdict: 'in_band',
  exceptions: [], voided: false, superseded: false, checked: false, covers: [{ position: 1, stage: 1 }, { position: 2, stage: 1 }], ...overrides,
})
const facts = (overrides: Partial<GroupFacts> = {}): GroupFacts => ({
  id: 'g', repairOrderId: 'o', name: 'Water pump', component: 'Water pump', jointClass: 'sealing', revisionStatus: 'approved', shopValue: false,
  secondCheckRequired: false, boltCount: 2, stageCount: 1, targetNm: 41, lowerNm: 36.9, upperNm: 45.1, targetValue: 41, targetUnit: 'N.m',
  notDisturbed: false, disturbedSequence: null, concededSequence: null, signOffs: [], ...overrides,
})
const stateOf = (overrides: Partial<GroupFacts>) => deriveGroup(facts(overrides)).state

describe('the state of a group', () => {
  it.each<[string, Partial<GroupFacts>]>([
    ['open', {}],
    ['not_disturbed', { notDisturbed: true }],
    ['in_progress', { signOffs: [signOff({ covers: [{ position: 1, stage: 1 }] })] }],
    ['in_progress', { stageCount: 2, signOffs: [signOff()] }],
    ['signed', { signOffs: [signOff()] }],
    ['signed', { notDisturbed: true, signOffs: [signOff()] }],
    ['exception', { signOffs: [signOff({ exceptions: ['out_of_band'] })] }],
    ['exception', { revisionStatus: 'draft', signOffs: [signOff({ exceptions: ['late_entry'] })] }],
    ['conceded', { concededSequence: 11, signOffs: [signOff({ exceptions: ['out_of_band'] })] }],
    ['exception', { concededSequence: 9, signOffs: [signOff({ exceptions: ['out_of_band'] })] }],
    ['pending_approval', { revisionStatus: 'draft', signOffs: [signOff()] }],
    ['second_check_waiting', { secondCheckRequired: true, signOffs: [signOff()] }],
    ['signed', { secondCheckRequired: true, signOffs: [signOff({ checked: true })] }],
    ['second_check_waiting', { secondCheckRequired: true, concededSequence: 11, signOffs: [signOff({ exceptions: ['late_entry'] })] }],
    ['disturbed', { disturbedSequence: 11, signOffs: [signOff()] }],
    ['signed', { disturbedSequence: 9, signOffs: [signOff()] }],
    ['open', { signOffs: [signOff({ voided: true })] }],
    ['open', { signOffs: [signOff({ superseded: true })] }],
  ])('is %s', (state, overrides) => expect(stateOf(overrides)).toBe(state))

  it('is never better for a void more, whichever sign-off it takes', () => {
    const places = fc.subarray([1, 2, 3].flatMap(position => [1, 2].map(stage => ({ position, stage }))), { minLength: 1 })
    const some = fc.array(fc.record({ covers: places, voided: fc.boolean() }), { minLength: 1, maxLength: 5 })
    fc.assert(fc.property(some, fc.nat(4), (list, index) => {
      const signOffs = list.map((item, sequence) => signOff({ ...item, sequence: sequence + 1 }))
      const before = deriveGroup(facts({ boltCount: 3, stageCount: 2, signOffs })).positionsDone
      const voided = signOffs.map((item, at) => at === index % list.length ? { ...item, voided: true } : item)
      expect(deriveGroup(facts({ boltCount: 3, stageCount: 2, signOffs: voided })).positionsDone).toBeLessThanOrEqual(before)
    }))
  })
})
