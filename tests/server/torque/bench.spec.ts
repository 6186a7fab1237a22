import { describe, expect, it } from 'vitest'
import { roles } from '#shared/types/roles'
import { buildShop, buildUser } from '../../factories/shop'
import { useApi } from '../support/api'
import { useDatabase } from '../support/database'
import { ladder } from '../support/ladder'

useDatabase()
const api = useApi()

const absurd = [0, -1, 1e308, 1_000_001, '37', null, undefined, true, []]
const units = ['Nm', 'ft-lb', '', 'deg', 'x'.repeat(10_000), null, undefined]

ladder({
  api, method: 'POST', path: '/torque/convert', roles, status: 200,
  valid: () => ({ value: 37, unit: 'lbf.ft', to: 'N.m' }), spoil: { value: absurd, unit: units, to: units },
})
ladder({
  api, method: 'POST', path: '/torque/check', roles, status: 200,
  valid: () => ({ entered: 37, unit: 'lbf.ft', target: { value: 50, unit: 'N.m' }, tolerance: { kind: 'absolute', value: 2, unit: 'N.m' }, uncertaintyPercent: 2 }),
  spoil: {
    'entered': absurd,
    'unit': units,
    'target': [undefined, 0, -1, 1e308, '37', null, { value: 1e-300, unit: 'N.m' }],
    'tolerance': [10, '10 %'],
    'tolerance.kind': ['plus', undefined],
    'tolerance.value': [0, -2, 50, 1e308, '2', undefined],
    'uncertaintyPercent': [-1, 101, '2', null],
  },
})
ladder({
  api, method: 'POST', path: '/torque/setting', roles, status: 200,
  valid: () => ({
    target: { value: 50, unit: 'N.m' }, adapter: { extensionMm: 60, angleDeg: 0, effectiveLengthMm: 300 }, multiplierRatio: 1,
    graduation: { value: 0.5, unit: 'N.m' },
  }),
  spoil: {
    'target': [undefined, 50, null, { value: 1e-300, unit: 'N.m' }],
    'target.value': absurd,
    'target.unit': units,
    'adapter': [7, { extensionMm: 400, angleDeg: 180, effectiveLengthMm: 300 }, { extensionMm: 300, angleDeg: 180, effectiveLengthMm: 300 }],
    'adapter.extensionMm': [0, -1, 5001, '60', undefined],
    'adapter.angleDeg': [-1, 181, undefined],
    'adapter.effectiveLengthMm': [0, -300, undefined],
    'multiplierRatio': [0.5, 0, 201, '4'],
    'graduation': [0.5, { value: 1e-300, unit: 'N.m' }],
    'graduation.value': absurd,
  },
})
ladder({
  api, method: 'POST', path: '/torque/order', roles, status: 200, valid: () => ({ pattern: 'circle', count: 8 }),
  spoil: { pattern: ['star', '', null, undefined], count: [0, -1, 121, 4.5, '8', undefined, 1e308] },
})

async function caller(rules: Parameters<typeof buildShop>[0] = {}) {
  return api.as(await buildUser(await buildShop(rules), 'technician'))
}

it('converts at full precision', async () => {
  const { body } = await (await caller()).post('/torque/convert', { value: 37, unit: 'lbf.ft', to: 'N.m' })
  expect(body.value).toBeCloseTo(50.165264, 5)
  expect(body).toEqual({ value: body.value, unit: 'N.m', nm: body.value })
})

describe('the band check', () => {
  it('takes a bare target in the unit entered, and the shop\'s tolerance', async () => {
    const shopOfFive = await caller({ defaultTolerancePercent: 5 })
    const { body } = await shopOfFive.post('/torque/check', { entered: 105, unit: 'N.m', target: 100 })
    expect(body).toEqual({ nm: 105, limits: { targetNm: 100, lowerNm: 95, upperNm: 105 }, verdict: 'in_band', probabilityInBand: null })
    expect((await shopOfFive.post('/torque/check', { entered: 105.1, unit: 'N.m', target: 100, tolerance: null })).body.verdict).toBe('high')
  })

  it('takes limits without a target, and says how sure', async () => {
    const tolerance = { kind: 'limits', lower: { value: 12, unit: 'lbf.ft' }, upper: { value: 15, unit: 'lbf.ft' } }
    const { body } = await (await caller()).post('/torque/check', { entered: 13.5, unit: 'lbf.ft', tolerance, uncertaintyPercent: 4 })
    expect(body.verdict).toBe('in_band')
    expect(body.probabilityInBand).toBeGreaterThan(0.99)
    const near = await (await caller()).post('/torque/check', { entered: 12.1, unit: 'lbf.ft', tolerance, uncertaintyPercent: 4 })
    expect(near.body.verdict).toBe('edge')
  })

  it('refuses limits the wrong way round, beside the upper one', async () => {
    const tolerance = { kind: 'limits', lower: { value: 15, unit: 'N.m' }, upper: { value: 12, unit: 'N.m' } }
    const { status, body } = await (await caller()).post('/torque/check', { entered: 13, unit: 'N.m', tolerance })
    expect([status, body.data.issues[0].path]).toEqual([400, 'tolerance.upper'])
  })
})

it('sets the wrench: exact, to the nearest graduation, and what that gives', async () => {
  const { body } = await (await caller()).post('/torque/setting', {
    target: { value: 50, unit: 'N.m' }, adapter: { extensionMm: 60, angleDeg: 0, effectiveLengthMm: 300 }, graduation: { value: 0.5, unit: 'N.m' },
  })
  expect(body.setting.value).toBeCloseTo(41.6667, 4)
  expect(body.rounded).toEqual({ value: 41.5, unit: 'N.m' })
  expect(body.gives.nm).toBeCloseTo(49.8, 9)
  const plain = await (await caller()).post('/torque/setting', { target: { value: 37, unit: 'lbf.ft' }, adapter: null })
  expect(plain.body).toMatchObject({ setting: { unit: 'lbf.ft' }, gives: { unit: 'lbf.ft' } })
  expect(plain.body.setting.value).toBeCloseTo(37, 12)
})

it('orders the bolts of a pattern; two rows need an even count', async () => {
  const technician = await caller()
  expect((await technician.post('/torque/order', { pattern: 'circle', count: 4 })).body).toEqual({ order: [1, 3, 2, 4] })
  expect((await technician.post('/torque/order', { pattern: 'free', count: 3 })).body).toEqual({ order: [1, 2, 3] })
  const odd = await technician.post('/torque/order', { pattern: 'two_rows', count: 5 })
  expect([odd.status, odd.body.data.issues[0].path]).toEqual([400, 'count'])
})
