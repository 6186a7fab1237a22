import type { SpecDetail, SpecRevisionAnswer } from '#shared/schemas/torque-specs'

const person = { id: '00000000-0000-4000-8000-0000000000aa', name: 'Noor Haddad' }

/** A draft printed as 20 ft·lb beside 25 N·m, which rounding does not explain. */
export const flaggedRevision: SpecRevisionAnswer = {
  id: '00000000-0000-4000-8000-000000000001', number: 1, status: 'draft', jointClass: 'sealing', boltCount: 6, pattern: 'circle',
  places: [], thread: 'M8', leftHand: false, propertyClass: '8.8', threadCondition: 'dry', runningTorque: null,
  preparation: [{ code: 'new_gasket', text: 'New gasket', required: true }],
  target: { value: 20, unit: 'lbf.ft', nm: 27.116358966628 }, printed: { value: 25, unit: 'N.m', nm: 25 }, printedLimits: null,
  tolerance: null,
  stages: [{ number: 1, kind: 'torque', targetNm: 27.116, lowerNm: 24.4, upperNm: 29.8, angleDeg: null, toleranceDeg: null }],
  order: null, secondCheckRequired: false, oneTimeUse: false, retorque: null, caution: null,
  source: { title: 'Demo manual', section: null, page: '3-105', date: null },
  limits: { targetNm: 27.116358966628, lowerNm: 24.404723069965, upperNm: 29.827994863291 },
  flags: [{ code: 'dual_unit_mismatch', message: 'Target: 20 ft·lb and 25 N·m differ.', diffNm: 2.116, limitNm: 1.178, swapped: false }],
  governs: null, shopValue: false, reasoning: null, createdBy: person, createdAt: '2026-11-01T08:00:00Z', approvedBy: null,
  approvedAt: null, withdrawnReason: null,
}

export const flaggedSpec: SpecDetail = {
  id: '00000000-0000-4000-8000-000000000002', kind: 'joint', component: 'Oil pump cover', application: 'engine', appliesTo: null,
  createdAt: '2026-11-01T08:00:00Z', revision: flaggedRevision, revisions: [flaggedRevision],
  can: { revise: true, approve: true, withdraw: false },
}
