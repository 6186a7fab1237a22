import { roles } from '#shared/types/roles'
import { buildApprovedSpec, buildSpecDraft, specBody } from '../../factories/spec'
import type { Shop } from '../../../server/context'
import { useApi } from '../support/api'
import { useDatabase } from '../support/database'
import { ladder } from '../support/ladder'

useDatabase()
const api = useApi()

const deciders = ['foreman', 'quality_lead'] as const
const draft = async (shop: Shop) => ({ id: (await buildSpecDraft(shop)).spec.id })
const approved = async (shop: Shop) => ({ id: (await buildApprovedSpec(shop)).spec.id })

const torque = (value: number) => ({ value, unit: 'N.m' as const })
const places = Array.from({ length: 4 }, (_, index) => ({ position: index + 1, x: index * 100, y: 500 }))
/** Says everything that a revision can say. */
const whole = () => {
  const { kind, component, application, ...revision } = specBody({
    pattern: 'free',
    places,
    thread: 'M10 × 1.5',
    leftHand: true,
    propertyClass: '10.9',
    threadCondition: 'clean and dry',
    runningTorque: { ...torque(3), rule: 'always_added' },
    preparation: [{ code: 'threads_clean_dry', text: 'Threads clean and dry', required: true }],
    printed: { value: 30, unit: 'lbf.ft' },
    printedLimits: { lower: { value: 27, unit: 'lbf.ft' }, upper: { value: 33, unit: 'lbf.ft' } },
    tolerance: { kind: 'limits', lower: torque(37), upper: torque(45) },
    stages: [{ kind: 'snug' }, { kind: 'torque', target: torque(20) }, { kind: 'percent', percent: 100 }, { kind: 'angle', angleDeg: 90, toleranceDeg: 5 }],
    order: [1, 3, 2, 4],
    secondCheckRequired: true,
    oneTimeUse: true,
    retorque: { afterKm: 50, afterDays: 7, note: 'cold' },
    caution: 'Let the engine cool first.',
  })
  return revision
}
const identity = { kind: 'joint', component: 'Water pump to block', application: 'engine', appliesTo: { make: 'Invented', model: 'Shuttle', engine: '2.4', yearFrom: 2010, yearTo: 2020 } }

const absurd = [0, -1, 1e308, 1_000_001, '41', null, true, [], {}]
const spoil = {
  'jointClass': ['', 'critical', 7, null],
  'boltCount': [0, -1, 121, 4.5, '4', null, 1e308],
  'pattern': ['', 'star', null],
  'places': ['x', {}, places.slice(1), [{ position: 1 }, { position: 2 }, { position: 3 }, { position: 4 }], Array.from({ length: 121 }, () => places[0])],
  'places.0.position': [0, 121, 1.5, '1', 5],
  'places.1.position': [1],
  'places.0.x': [-1, 1001, '5'],
  'places.0.label': ['', 'x'.repeat(21)],
  'thread': ['', 'x'.repeat(61), 10, null, 'M10\u0000'],
  'leftHand': ['true', 1, null],
  'propertyClass': ['', 'x'.repeat(61), 8.8],
  'threadCondition': ['', 'x'.repeat(81)],
  'runningTorque.value': absurd,
  'runningTorque.unit': ['Nm', '', null, undefined],
  'runningTorque.rule': ['sometimes', null, undefined],
  'preparation': [{}, 'x', Array.from({ length: 21 }, (_, index) => ({ code: `c${index}`, text: 'x', required: false }))],
  'preparation.0.code': ['', 'Threads', 'a b', 'x'.repeat(41), null, undefined],
  'preparation.0.text': ['', 'x'.repeat(201), undefined],
  'preparation.0.required': ['yes', undefined],
  'target': [null, 41, '41 N.m', torque(36), torque(46), torque(1e-12)],
  'target.value': absurd,
  'target.unit': ['Nm', 'ft-lb', '', 'x'.repeat(10_000), null, undefined, 'deg'],
  'target.more': [1],
  'printed.value': absurd,
  'printed.unit': ['Nm', undefined],
  'printedLimits.lower.value': absurd,
  'printedLimits.upper': [undefined, { value: 27, unit: 'lbf.ft' }, { value: 26, unit: 'lbf.ft' }],
  'tolerance': ['10 %', 10, []],
  'tolerance.kind': ['plus', undefined],
  'tolerance.lower': [undefined, null, 37],
  'tolerance.lower.value': absurd,
  'tolerance.upper': [torque(37), torque(30)],
  'stages': [[], [{ kind: 'snug' }], {}, Array.from({ length: 13 }, () => ({ kind: 'percent', percent: 100 }))],
  'stages.0.kind': ['loose', undefined],
  'stages.1.target': [undefined, 20],
  'stages.1.target.value': absurd,
  'stages.2.percent': [0, -1, 101, '50', undefined],
  'stages.3.angleDeg': [0, -90, 3601, '90', undefined],
  'stages.3.toleranceDeg': [0, -1],
  'order': [[1, 2, 3], [1, 2, 3, 3], [1, 2, 3, 5], [1, 2, 3, 4, 1], {}],
  'order.0': [0, 121, 1.5, '1'],
  'secondCheckRequired': ['true', null],
  'oneTimeUse': [1],
  'retorque': [{}, 50],
  'retorque.afterKm': [0, 100_001, 1.5],
  'retorque.afterDays': [0, 3651],
  'caution': ['', 'x'.repeat(2001)],
  'source': [undefined, null, 'a manual'],
  'source.title': ['', undefined, 'x'.repeat(201), 7],
  'source.section': ['', 'x'.repeat(201)],
  'source.page': ['', 'x'.repeat(41), 214],
  'source.date': [''],
}

ladder({
  api, method: 'GET', path: '/torque-specs', roles,
  spoilQuery: {
    limit: ['0', '201', 'x'], sort: ['thread', '--component'], cursor: ['x'], kind: ['table'], status: ['open'], jointClass: ['x'],
    flagged: ['yes'], q: ['x'.repeat(101)], other: ['1'],
  },
})
ladder({ api, method: 'GET', path: '/torque-specs/:id', roles, scene: approved })
ladder({
  api, method: 'POST', path: '/torque-specs', roles: [...deciders, 'technician'], valid: () => ({ ...identity, ...whole() }),
  log: 'torque_specs.create',
  spoil: {
    ...spoil,
    'kind': ['table', '', null],
    'component': ['', undefined, 'x'.repeat(121), 7, '\u0000'],
    'application': ['', undefined, 'x'.repeat(201)],
    'appliesTo': ['Shuttle', null],
    'appliesTo.make': ['', 'x'.repeat(81)],
    'appliesTo.yearFrom': [1899, 2101, '2010'],
    'appliesTo.yearTo': [2009],
  },
})
ladder({
  api, method: 'POST', path: '/torque-specs/:id/revisions', roles: deciders, scene: draft, valid: whole, log: 'torque_specs.revise', spoil,
})
ladder({
  api, method: 'POST', path: '/torque-specs/:id/approve', roles: deciders, status: 200, scene: draft, valid: () => ({}),
  log: 'torque_specs.approve', spoil: { governs: ['both', '', null, 1] },
})
ladder({
  api, method: 'POST', path: '/torque-specs/:id/withdraw', roles: deciders, status: 200, scene: approved,
  valid: () => ({ reason: 'The manual was corrected.' }), log: 'torque_specs.withdraw',
  spoil: { reason: [undefined, '', 'no', '   ', 7, null, 'x'.repeat(2001), 'no\u0000no'] },
})
ladder({
  api, method: 'POST', path: '/torque-specs/import', roles: deciders, accepts: 'text/csv',
  valid: () => 'component,application,target_value,target_unit,source_title\nPump,engine,41,N.m,Invented manual\n',
  log: 'torque_specs.import', subject: answer => answer.rows[0]?.id ?? '', spoilQuery: { partial: ['yes', '1', ''], other: ['1'] },
})
