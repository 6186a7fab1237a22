import { describe, expect, it } from 'vitest'
import {
  conformanceProbability, globalFalseAccept, guardBandMultiplier, guardedAcceptance, nonBinaryAcceptance,
  provenConformity, simpleAcceptance, specificRisk, testUncertaintyRatio,
} from '#shared/torque/decision-rule'

// Source: JCGM 106:2012 cl. 7.2–7.4 examples, which print 0.92, 0.99 and 0.66 [memory] data, recomputed.
const conformance = [
  {
    about: 'breakdown voltage, single upper limit',
    value: -5.47,
    u: 0.05,
    lower: null,
    upper: -5.4,
    expected: 0.919243340766227,
  },
  {
    about: 'burst pressure, single lower limit',
    value: 509.7,
    u: 8.6,
    lower: 490,
    upper: null,
    expected: 0.989009547384822,
  },
  { about: 'oil viscosity, two-sided', value: 13.6, u: 1.8, lower: 12.5, upper: 16.3, expected: 0.662629786495308 },
]

// Source: ILAC-G8:09/2019 cl. 4.2 [seen: summary pages], recomputed; guard band w = U.
const decisions = [
  {
    value: 3.2,
    expandedUncertainty: 1,
    lower: -4,
    upper: 4,
    expected: { simple: 'pass', guarded: 'fail', nonBinary: 'conditional pass' },
  },
  {
    value: 2.9,
    expandedUncertainty: 1,
    lower: -4,
    upper: 4,
    expected: { simple: 'pass', guarded: 'pass', nonBinary: 'pass' },
  },
  {
    value: 4.5,
    expandedUncertainty: 1,
    lower: -4,
    upper: 4,
    expected: { simple: 'fail', guarded: 'fail', nonBinary: 'conditional fail' },
  },
  {
    value: -5.2,
    expandedUncertainty: 1,
    lower: -4,
    upper: 4,
    expected: { simple: 'fail', guarded: 'fail', nonBinary: 'fail' },
  },
]

describe('JCGM 106 examples [memory]', () => {
  it.each(conformance)('$about conforms with $expected', ({ u, expected, ...measured }) => {
    expect(conformanceProbability(measured, u)).toBeCloseTo(expected, 12)
  })

  it('risks one half exactly at the limit (JCGM 106 cl. 7; ILAC-G8 “< 50 %”) [seen: summary], recomputed', () => {
    expect(specificRisk({ value: 4, lower: null, upper: 4 }, 0.5)).toBeCloseTo(0.5, 12)
  })

  it('risks 2.275 % at a limit guarded by U (ILAC-G8 “< 2.5 %”) [seen: summary], recomputed', () => {
    expect(specificRisk({ value: 3, lower: null, upper: 4 }, 0.5)).toBeCloseTo(0.0227501319481792, 12)
  })
})

describe('ILAC-G8 decision rules [seen: summary pages]', () => {
  it.each(decisions)('$value within $lower…$upper, U $expandedUncertainty: $expected.nonBinary', (row) => {
    expect(simpleAcceptance(row)).toBe(row.expected.simple)
    expect(guardedAcceptance(row, row.expandedUncertainty)).toBe(row.expected.guarded)
    expect(nonBinaryAcceptance(row, row.expandedUncertainty)).toBe(row.expected.nonBinary)
  })
})

describe('other rules', () => {
  it('proves conformity inside ±3.175 only (ISO 14253-1:2017, default 95 %) [memory], recomputed', () => {
    const result = provenConformity({ value: 3.2, lower: -4, upper: 4 }, 1)
    expect(result.acceptance[0]).toBeCloseTo(-3.175, 9)
    expect(result.acceptance[1]).toBeCloseTo(3.175, 9)
    expect(result.verdict).toBe('not proven conforming')
  })

  it('has a test uncertainty ratio of 4 (ANSI/NCSL Z540.3: tolerance span over 2·U95) [memory]', () => {
    expect(testUncertaintyRatio(-4, 4, 1)).toBe(4)
  })

  it('guards a ratio of 4 by 0.0531·U (Z540.3 Handbook method 6) [memory]', () => {
    expect(guardBandMultiplier(4)).toBeCloseTo(0.0531212980297386, 12)
  })

  it('falsely accepts 0.86 % at a ratio of 4 and 95 % in tolerance (bivariate-normal integral) recomputed', () => {
    const risk = globalFalseAccept({ tolerance: 1, acceptance: 1, expandedUncertainty: 0.25, inTolerance: 0.95 })
    expect(risk).toBeCloseTo(0.00858266480892311, 9)
  })
})
