import { describe, expect, it } from 'vitest'
import { createSpecBody, specRevisionBody, type SpecDetail, type SpecRevisionAnswer } from '#shared/schemas/torque-specs'
import { ApiError } from '../../../utils/api-error'
import { issueAt, issuesElsewhere, readForm } from '../../../utils/form-issues'
import { emptySpecForm, moved, newStage, quantityEntry, type SpecForm } from '../../../utils/torque-spec-form'
import { specFormFrom } from '../../../utils/torque-spec-prefill'
import { preparationCode, readSpecForm } from '../../../utils/torque-spec-read'

const typed = (text: string, unit: SpecForm['target']['unit'] = 'N.m') => ({ text, value: null, unit })

function filled(change: Partial<SpecForm> = {}): SpecForm {
  return {
    ...emptySpecForm('lbf.ft'), component: ' Water pump to block ', application: 'engine, cooling system',
    target: quantityEntry({ value: 37, unit: 'lbf.ft' }), sourceTitle: 'Demo manual', ...change,
  }
}

const bodyOf = (change: Partial<SpecForm> = {}) => readForm(createSpecBody, readSpecForm(filled(change)))

function issuesOf(change: Partial<SpecForm>) {
  try {
    bodyOf(change)
  } catch (error) {
    if (error instanceof ApiError) return error.issues
  }
  return []
}

describe('a spec form', () => {
  it('says no more than what is filled in', () => {
    expect(bodyOf()).toEqual({
      kind: 'joint', component: 'Water pump to block', application: 'engine, cooling system', jointClass: 'general',
      target: { value: 37, unit: 'lbf.ft' }, tolerance: null, secondCheckRequired: false, source: { title: 'Demo manual' },
    })
  })

  it('reads bolts, order, long bolts and preparation', () => {
    const body = bodyOf({
      boltCount: '6', pattern: 'circle', order: '1 4 2 5 3 6', longBolts: '2, 5',
      preparation: [{ key: 1, code: '', text: 'New gasket', required: true }, { key: 2, code: '', text: '2 drops of sealer', required: false }],
    })
    expect(body.order).toEqual([1, 4, 2, 5, 3, 6])
    expect(body.places).toEqual([{ position: 2, long: true }, { position: 5, long: true }])
    expect(body.preparation?.map(step => step.code)).toEqual(['new_gasket', 'drops_of_sealer'])
  })

  it('places every bolt of a pattern drawn as it is', () => {
    const body = bodyOf({ boltCount: '2', pattern: 'free', places: [{ position: 1, x: 10, y: 20 }] })
    expect(body.places).toEqual([{ position: 1, x: 10, y: 20 }, { position: 2, x: 500, y: 900 }])
  })

  it('reads a printed range in two units', () => {
    const body = bodyOf({
      target: emptySpecForm().target, toleranceKind: 'limits',
      lower: quantityEntry({ value: 25, unit: 'lbf.ft' }), upper: quantityEntry({ value: 35, unit: 'lbf.ft' }),
      printedLower: quantityEntry({ value: 3.5, unit: 'kgf.m' }), printedUpper: quantityEntry({ value: 4.8, unit: 'kgf.m' }),
    })
    expect(body.target).toBeUndefined()
    expect(body.tolerance).toEqual({ kind: 'limits', lower: { value: 25, unit: 'lbf.ft' }, upper: { value: 35, unit: 'lbf.ft' } })
    expect(body.printedLimits).toEqual({ lower: { value: 3.5, unit: 'kgf.m' }, upper: { value: 4.8, unit: 'kgf.m' } })
  })

  it('reads stages by their kind', () => {
    const stage = { ...newStage([], 'N.m'), percent: '50', angleDeg: '90', toleranceDeg: '5,5' }
    const target = quantityEntry({ value: 20, unit: 'N.m' })
    const body = bodyOf({
      stages: [{ ...stage, kind: 'snug' }, { ...stage, kind: 'torque', target }, { ...stage, kind: 'percent' }, { ...stage, kind: 'angle' }],
    })
    expect(body.stages).toEqual([
      { kind: 'snug' }, { kind: 'torque', target: { value: 20, unit: 'N.m' } },
      { kind: 'percent', percent: 50 }, { kind: 'angle', angleDeg: 90, toleranceDeg: 5.5 },
    ])
  })

  it('does not name the joint again in a revision', () => {
    const body = readForm(specRevisionBody, readSpecForm(filled(), true))
    expect(Object.keys(body)).not.toContain('component')
    expect(body.target).toEqual({ value: 37, unit: 'lbf.ft' })
  })

  it.each([
    ['target', { target: typed('a lot') }],
    ['target', { target: typed('') }],
    ['boltCount', { boltCount: 'six' }],
    ['order', { boltCount: '4', order: '1 3 2' }],
    ['order', { order: '1 2' }],
    ['places', { boltCount: '4', longBolts: '9' }],
    ['tolerance.value', { toleranceKind: 'percent' as const, percent: 'ten' }],
    ['tolerance.lower', { toleranceKind: 'limits' as const }],
    ['stages.0.target', { stages: [newStage([], 'N.m')] }],
    ['source.title', { sourceTitle: ' ' }],
    ['component', { component: '' }],
  ])('says what is wrong at %s, once', (path, change) => {
    expect(issuesOf(change).filter(issue => issueAt([issue], path)).length).toBe(1)
  })

  it('tells issues that stand at no field', () => {
    const issues = [{ path: 'source.title', message: 'a' }, { path: '', message: 'b' }]
    expect(issuesElsewhere(issues, ['source'])).toEqual([{ path: '', message: 'b' }])
  })
})

describe('the small things of the form', () => {
  it('moves an entry one place, never off the list', () => {
    expect(moved([1, 2, 3], 0, 1)).toEqual([2, 1, 3])
    expect(moved([1, 2, 3], 2, -1)).toEqual([1, 3, 2])
    expect(moved([1, 2, 3], 0, -1)).toEqual([1, 2, 3])
    expect(moved([1, 2, 3], 2, 1)).toEqual([1, 2, 3])
  })

  it('makes codes that are valid and not taken', () => {
    expect(preparationCode('Threads clean and dry', [])).toBe('threads_clean_dry')
    expect(preparationCode('Clean!', ['clean'])).toBe('clean_2')
    expect(preparationCode('清', [])).toBe('step')
  })
})

const noted = (value: number, unit: 'lbf.ft' | 'N.m', nm: number) => ({ value, unit, nm })
const person = { id: '00000000-0000-4000-8000-000000000001', name: 'A. Person' }
const targetNm = 50.165264088265

const revision: SpecRevisionAnswer = {
  id: person.id, number: 2, status: 'approved', jointClass: 'safety', boltCount: 4, pattern: 'circle',
  places: [{ position: 3, long: true }], thread: 'M10', leftHand: true, propertyClass: '8.8', threadCondition: 'dry',
  runningTorque: { value: 2, unit: 'N.m', rule: 'always_added' }, preparation: [{ code: 'own_code', text: 'Clean', required: true }],
  target: noted(37, 'lbf.ft', targetNm), printed: noted(50, 'N.m', 50), printedLimits: null,
  tolerance: { kind: 'absolute', value: 5, unit: 'N.m' },
  stages: [
    { number: 1, kind: 'torque', targetNm: 20 * 1.3558179483314, lowerNm: 1, upperNm: 2, angleDeg: null, toleranceDeg: null },
    { number: 2, kind: 'percent', targetNm: targetNm * 0.7, lowerNm: 1, upperNm: 2, angleDeg: null, toleranceDeg: null },
    { number: 3, kind: 'angle', targetNm: null, lowerNm: null, upperNm: null, angleDeg: 90, toleranceDeg: 5 },
  ],
  order: [1, 3, 2, 4], secondCheckRequired: true, oneTimeUse: true, retorque: { afterKm: 80 }, caution: 'Hot.',
  source: { title: 'Demo manual', section: '3', page: null, date: '2024' }, limits: { targetNm, lowerNm: 45, upperNm: 55 },
  flags: [], governs: null, shopValue: false, reasoning: null, createdBy: person, createdAt: '2026-11-01T08:00:00Z',
  approvedBy: person, approvedAt: '2026-11-02T08:00:00Z', withdrawnReason: null,
}
const spec: SpecDetail = {
  id: person.id, kind: 'joint', component: 'Hub', application: 'front axle', appliesTo: { make: 'Ardent', yearFrom: 2018 },
  createdAt: '2026-11-01T08:00:00Z', revision, revisions: [revision], can: {},
}

describe('a form from a revision', () => {
  it('says again what the revision says', () => {
    const body = readForm(createSpecBody, readSpecForm(specFormFrom(spec, revision)))
    expect(body).toEqual({
      kind: 'joint', component: 'Hub', application: 'front axle', appliesTo: { make: 'Ardent', yearFrom: 2018 },
      jointClass: 'safety', boltCount: 4, pattern: 'circle', places: [{ position: 3, long: true }], thread: 'M10',
      leftHand: true, propertyClass: '8.8', threadCondition: 'dry', runningTorque: revision.runningTorque,
      preparation: revision.preparation, target: { value: 37, unit: 'lbf.ft' }, printed: { value: 50, unit: 'N.m' },
      tolerance: revision.tolerance,
      stages: [{ kind: 'torque', target: { value: 20, unit: 'lbf.ft' } }, { kind: 'percent', percent: 70 }, { kind: 'angle', angleDeg: 90, toleranceDeg: 5 }],
      order: [1, 3, 2, 4], secondCheckRequired: true, oneTimeUse: true, retorque: { afterKm: 80 }, caution: 'Hot.',
      source: { title: 'Demo manual', section: '3', date: '2024' },
    })
  })

  it('knows the one stage that a spec without stages has', () => {
    const stages: SpecRevisionAnswer['stages'] = [{ number: 1, kind: 'torque', targetNm, lowerNm: 45, upperNm: 55, angleDeg: null, toleranceDeg: null }]
    expect(specFormFrom(spec, { ...revision, stages }).stages).toEqual([])
  })
})
