import { describe, expect, it } from 'vitest'
import {
  capabilityIndex, conformanceProbability, globalFalseAccept, guardBandMultiplier, guardedAcceptance,
  nonBinaryAcceptance, provenConformity, simpleAcceptance,
} from '#shared/torque/decision-rule'

describe('decision rules', () => {
  it('work with one limit only', () => {
    expect(simpleAcceptance({ value: 5, lower: null, upper: 5 })).toBe('pass')
    expect(simpleAcceptance({ value: 4.9, lower: 5, upper: null })).toBe('fail')
    expect(guardedAcceptance({ value: 4, lower: null, upper: 5 }, 1)).toBe('pass')
    expect(nonBinaryAcceptance({ value: 5.5, lower: null, upper: 5 }, 1)).toBe('conditional fail')
    expect(provenConformity({ value: 5, lower: null, upper: 6 }, 1).acceptance).toEqual([null, 5.175])
    expect(conformanceProbability({ value: 5, lower: null, upper: null }, 1)).toBe(1)
  })

  it('prove both ways', () => {
    const verdict = (value: number) => provenConformity({ value, lower: -4, upper: 4 }, 1).verdict
    expect([0, 4, 4.8, 4.9].map(verdict))
      .toEqual(['proven conforming', 'not proven conforming', 'not proven conforming', 'proven non-conforming'])
  })

  it('need no guard from a ratio of 4.6', () => {
    expect(guardBandMultiplier(4.5)).toBeGreaterThan(0)
    expect(guardBandMultiplier(4.6)).toBe(0)
  })

  it('accept 3.56 % falsely at a ratio of 1.5 and 85 % in tolerance', () => {
    const risk = globalFalseAccept({ tolerance: 1, acceptance: 1, expandedUncertainty: 1 / 1.5, inTolerance: 0.85 })
    expect(risk).toBeCloseTo(0.0356, 4)
  })

  it('have a capability index', () => {
    expect(capabilityIndex(-4, 4, 0.5)).toBe(4)
  })
})
