import { describe, expect, it } from 'vitest'
import { cautionsFor, type CautionedJoint } from '../../../utils/joint-cautions'

const plain: CautionedJoint = {
  component: 'Bracket', application: 'Body', stages: [{ kind: 'torque' }], threadCondition: null, preparation: [], leftHand: false, oneTimeUse: false, caution: null,
}
const all = (joint: Partial<CautionedJoint>, stage: 'torque' | 'angle' | null = 'torque') => cautionsFor({ ...plain, ...joint }, stage).join('\n')

describe('cautionsFor', () => {
  it('always says what governs, last', () => {
    expect(cautionsFor(plain, null)).toEqual(['The maker’s service information and local rules govern.'])
    expect(cautionsFor({ ...plain, caution: 'Long bolts in 3 and 6.' }, null)[0]).toBe('Long bolts in 3 and 6.')
  })

  it.each([
    ['Water pump to block', 'Hot coolant'], ['Thermostat cover', 'Hot coolant'], ['Alternator bracket', 'Battery'], ['Belt tensioner', 'Battery'],
    ['Airbag module', 'stay live'], ['Wheel nuts', '80 km'],
  ])('%s: %s', (component, words) => {
    expect(all({ component })).toContain(words)
  })

  it('does not see coolant where there is none', () => {
    expect(all({ component: 'Oil pump', application: 'Engine, lubrication' })).not.toContain('coolant')
  })

  it('speaks of dry threads, thread locker and blind holes', () => {
    expect(all({ threadCondition: 'clean and dry' })).toContain('oil on them over-tightens')
    expect(all({ threadCondition: 'wet' })).not.toContain('oil on them')
    expect(all({ threadCondition: 'thread locker' })).toContain('cure')
    expect(all({ preparation: [{ code: 'blind_holes_blown_out', text: 'Blown out' }] })).toContain('crack the casting')
  })

  it('warns of angle bolts before and at the angle stage', () => {
    const stages = [{ kind: 'torque' as const }, { kind: 'angle' as const }]
    expect(all({ stages })).toContain('used bolts only where the maker allows it')
    expect(all({ stages }, 'angle')).toContain('not by a torque setting')
  })
})
