import { describe, expect, it } from 'vitest'
import { createSpecBody, specRevisionBody } from '#shared/schemas/torque-specs'
import { specIssues, specLimits, statedTarget, type SaidSpec } from '#shared/torque/spec-rules'

const nm = (value: number) => ({ value, unit: 'N.m' as const })
const range = (lower: number, upper: number) => ({ kind: 'limits' as const, lower: nm(lower), upper: nm(upper) })
const places = (count: number) => Array.from({ length: count }, (_, index) => ({ position: index + 1, x: index * 10, y: 5 }))

describe('specIssues', () => {
  it.each<[string, SaidSpec]>([
    ['a target alone', { target: nm(50) }],
    ['limits alone', { tolerance: range(40, 60) }],
    ['a target on a limit', { target: nm(40), tolerance: range(40, 60) }],
    ['the target of its last torque stage', { stages: [{ kind: 'torque', target: nm(20) }, { kind: 'angle', angleDeg: 90 }] }],
    ['percent stages of limits', { tolerance: range(40, 60), stages: [{ kind: 'percent', percent: 50 }, { kind: 'percent', percent: 100 }] }],
    ['a printed order', { target: nm(50), boltCount: 3, order: [2, 1, 3] }],
    ['an order without a count', { target: nm(50), order: [2, 1, 3] }],
    ['bolts drawn as they are', { target: nm(50), boltCount: 3, pattern: 'free', places: places(3) }],
    ['labels of some bolts', { target: nm(50), boltCount: 3, pattern: 'circle', places: [{ position: 2 }] }],
    ['a small tolerance', { target: nm(50), tolerance: { kind: 'absolute', value: 0.1, unit: 'N.m' } }],
  ])('accepts %s', (_, said) => {
    expect(specIssues(said)).toEqual([])
  })

  it.each<[string, SaidSpec, string]>([
    ['no torque at all', {}, 'target'],
    ['percent stages of nothing', { stages: [{ kind: 'percent', percent: 50 }] }, 'target'],
    ['limits the wrong way round', { tolerance: range(60, 40) }, 'tolerance.upper'],
    ['limits that are one value', { tolerance: range(60, 60) }, 'tolerance.upper'],
    ['a target outside the limits', { target: nm(61), tolerance: range(40, 60) }, 'target'],
    ['a tolerance as large as the target', { target: nm(50), tolerance: { kind: 'absolute', value: 50, unit: 'N.m' } }, 'tolerance.value'],
    ['a tolerance below the last bit', { target: nm(50), tolerance: { kind: 'percent', value: 1e-20 } }, 'tolerance.value'],
    ['a target too small', { target: nm(1e-9) }, 'target'],
    ['limits too small', { tolerance: range(1e-300, 40) }, 'tolerance.lower'],
    ['a tolerance too small', { target: nm(50), tolerance: { kind: 'absolute', value: 1e-200, unit: 'N.m' } }, 'tolerance.value'],
    ['a printed value too small', { target: nm(50), printed: nm(1e-9) }, 'printed'],
    ['a stage too small', { target: nm(50), stages: [{ kind: 'torque', target: nm(1e-9) }] }, 'stages.0.target'],
    ['printed limits the wrong way round', { target: nm(50), printedLimits: { lower: nm(5), upper: nm(4) } }, 'printedLimits.upper'],
    ['snug stages only', { target: nm(50), stages: [{ kind: 'snug' }] }, 'stages'],
    ['an order that leaves one out', { target: nm(50), boltCount: 4, order: [1, 2, 3] }, 'order'],
    ['an order that names one twice', { target: nm(50), boltCount: 4, order: [1, 2, 2, 4] }, 'order'],
    ['an order beyond the count', { target: nm(50), boltCount: 4, order: [1, 2, 3, 5] }, 'order'],
    ['an order with a gap', { target: nm(50), order: [1, 3] }, 'order'],
    ['two rows of an odd count', { target: nm(50), boltCount: 5, pattern: 'two_rows' }, 'boltCount'],
    ['a position drawn twice', { target: nm(50), boltCount: 3, places: [{ position: 1 }, { position: 1 }] }, 'places.1.position'],
    ['a position that is not there', { target: nm(50), boltCount: 3, places: [{ position: 4 }] }, 'places.0.position'],
    ['a free pattern without places', { target: nm(50), boltCount: 3, pattern: 'free' }, 'places'],
    ['a free pattern without one place', { target: nm(50), boltCount: 3, pattern: 'free', places: places(2) }, 'places'],
    ['a free pattern without a count', { target: nm(50), pattern: 'free', places: places(2) }, 'boltCount'],
    ['a step named twice', { target: nm(50), preparation: [{ code: 'a' }, { code: 'a' }] }, 'preparation.1.code'],
    ['years the wrong way round', { target: nm(50), appliesTo: { yearFrom: 2001, yearTo: 2000 } }, 'appliesTo.yearTo'],
    ['an empty retorque rule', { target: nm(50), retorque: {} }, 'retorque'],
  ])('refuses %s', (_, said, path) => {
    expect(specIssues(said).map(issue => issue.path.join('.'))).toEqual([path])
  })
})

describe('specLimits', () => {
  it('takes the shop\'s default without a tolerance', () => {
    expect(specLimits({ target: nm(50) }, 10)).toEqual({ targetNm: 50, lowerNm: 45, upperNm: 55 })
  })
  it('takes the midpoint of limits, whatever the stages say', () => {
    const said: SaidSpec = { tolerance: range(40, 60), stages: [{ kind: 'torque', target: nm(45) }] }
    expect(specLimits(said, 10)).toEqual({ targetNm: 50, lowerNm: 40, upperNm: 60 })
  })
  it('takes the last torque stage without a target', () => {
    const said: SaidSpec = { stages: [{ kind: 'torque', target: nm(20) }, { kind: 'torque', target: nm(40) }, { kind: 'angle', angleDeg: 90 }] }
    expect(statedTarget(said)).toEqual(nm(40))
    expect(specLimits(said, 5)).toEqual({ targetNm: 40, lowerNm: 38, upperNm: 42 })
  })
})

describe('the schemas', () => {
  it('say the rules beside their fields', () => {
    const body = { component: 'Water pump', application: 'cooling', source: { title: 'demo manual' }, boltCount: 4, order: [1, 2] }
    const result = createSpecBody.safeParse(body)
    expect(result.error?.issues.map(issue => issue.path.join('.'))).toEqual(['order', 'target'])
    const absurd = createSpecBody.safeParse({ ...body, target: { value: 1e308, unit: 'kN.m' }, tolerance: { kind: 'percent', value: -5 } })
    expect(absurd.error?.issues.map(issue => issue.path.join('.'))).toEqual(['target.value', 'tolerance.value'])
    expect(specRevisionBody.safeParse({ target: nm(5), source: { title: 'demo manual' } }).success).toBe(true)
  })
})
