import { describe, expect, it } from 'vitest'
import type { Shop } from '../../../server/context'
import { calibrationInForce } from '../../../server/services/wrenches/inForce'
import { inTransaction } from '../../../server/transaction'
import { buildGarage, buildJoint, buildWrench, daysAgo, sign } from '../../factories/joint'
import { unique } from '../../factories/shop'
import { useApi } from '../support/api'
import { useDatabase } from '../support/database'
import { ladder } from '../support/ladder'

useDatabase()
const api = useApi()

const everyone = ['technician', 'foreman', 'quality_lead', 'advisor', 'administrator'] as const
const wrench = () => ({
  assetTag: unique('W'), serial: 'S-1', kind: 'setting', toolClass: 'II-A', range: { min: 10, max: 60, unit: 'N.m' },
  graduation: { value: 0.5, unit: 'N.m' }, gripLengthMm: 320, drive: '3/8 in', directions: ['clockwise'], permissiblePercent: 3,
  intervalMonths: 12, intervalCycles: 5000,
})
const point = (target: number, share = 1.001) => ({ target: { value: target, unit: 'N.m' }, readings: [1, 2, 3, 4, 5].map(() => ({ indicated: target, reference: target * share })) })
const calibration = () => ({
  performedOn: daysAgo(1), laboratory: 'Invented laboratory', certificateNumber: unique('C'), reference: { uncertaintyPercent: 0.6 },
  asFound: [point(12), point(36), point(60)], adjusted: false,
})
const one = async (shop: Shop) => ({ id: await buildWrench(await buildGarage(api, {}, shop)) })

ladder({
  api, method: 'POST', path: '/wrenches', roles: ['quality_lead'], valid: wrench, log: 'wrenches.create',
  spoil: {
    'assetTag': [undefined, '', 't'.repeat(41), 7],
    'serial': [undefined, ''],
    'kind': [undefined, 'hammer'],
    'toolClass': ['III-A'],
    'range': [undefined, 'x'],
    'range.min': [0, -1, 1e308, 'x'],
    'range.max': [0, 5, 'x'],
    'range.unit': ['stone', undefined],
    'graduation.value': [0, 60, 'x'],
    'permissiblePercent': [0, 21],
    'intervalMonths': [undefined, 0, 1.5, 121],
    'intervalCycles': [0, 1.5],
    'directions': [[]],
    'directions.0': ['sideways', 7],
  },
})
ladder({
  api, method: 'GET', path: '/wrenches', roles: everyone,
  spoilQuery: { sort: ['colour'], limit: ['0', '201'], status: ['x'], kind: ['x'], fitFor: ['x'], cursor: ['x'] },
})
ladder({ api, method: 'GET', path: '/wrenches/:id', roles: everyone, scene: one })
ladder({
  api, method: 'PATCH', path: '/wrenches/:id', roles: ['quality_lead', 'foreman', 'technician'], scene: one,
  valid: () => ({ state: 'quarantined', stateReason: 'It was dropped' }), spoil: { state: ['gone'], stateReason: [undefined, 'x'] }, log: 'wrenches.update',
})
ladder({
  api, method: 'POST', path: '/wrenches/:id/calibrations', roles: ['quality_lead'], scene: one, valid: calibration, log: 'calibrations.create',
  spoil: {
    'performedOn': [undefined, 'yesterday', '2026-02-30'],
    'laboratory': [undefined, ''],
    'certificateNumber': [undefined, ''],
    'reference.uncertaintyPercent': [undefined, -1, 21],
    'asFound': [undefined, [], 'x'],
    'asFound.0.readings': [[], 'x'],
    'asFound.0.readings.0.indicated': [0, -1, 'x', 1e308],
    'asFound.0.readings.0.reference': [0, -1, 'x'],
    'asFound.0.target.value': [0, 'x'],
    'adjusted': [undefined, 'yes'],
  },
})

describe('the crib', () => {
  it('knows a tag once', async () => {
    const garage = await buildGarage(api)
    const body = wrench()
    expect((await garage.quality.post('/wrenches', body)).status).toBe(201)
    const again = await garage.quality.post('/wrenches', body)
    expect([again.status, again.body.data.code, again.body.data.issues[0].path]).toEqual([409, 'id_taken', 'assetTag'])
  })

  it('takes the stricter of the class and the maker', async () => {
    const garage = await buildGarage(api)
    expect((await garage.quality.post('/wrenches', { ...wrench(), permissiblePercent: 3 })).body.permissiblePercent).toBe(3)
    expect((await garage.quality.post('/wrenches', { ...wrench(), permissiblePercent: 6 })).body.permissiblePercent).toBe(4)
  })

  it('lets a technician quarantine and nothing else', async () => {
    const garage = await buildGarage(api)
    const id = await buildWrench(garage)
    expect((await garage.technician.patch(`/wrenches/${id}`, { location: 'my box' })).status).toBe(403)
    expect((await garage.technician.patch(`/wrenches/${id}`, { state: 'in_use' })).status).toBe(403)
    const taken = await garage.technician.patch(`/wrenches/${id}`, { state: 'quarantined', stateReason: 'It was dropped' })
    expect(taken.body.calibration.status).toBe('quarantined')
    const back = await garage.quality.post(`/wrenches/${id}/calibrations`, calibration())
    expect(back.body.result).toBe('pass')
    expect((await garage.quality.get(`/wrenches/${id}`)).body.calibration.status).toBe('valid')
  })

  it('says of each wrench whether it fits a joint, the fit ones first', async () => {
    const garage = await buildGarage(api)
    const joint = await buildJoint(garage)
    await buildWrench(garage, { assetTag: 'A-small', range: { min: 1, max: 20, unit: 'N.m' } }, null)
    await buildWrench(garage, { assetTag: 'A-late' }, { performedOn: daysAgo(500) })
    const { body } = await garage.technician.get(`/wrenches?fitFor=${joint.groupId}`)
    expect(body.items.map((item: { fit: boolean }) => item.fit)).toEqual([true, false, false])
    const codes = Object.fromEntries(body.items.map((item: { assetTag: string, reasons: { code: string }[] }) => [item.assetTag, item.reasons.map(reason => reason.code)]))
    expect(codes['A-small']).toEqual(expect.arrayContaining(['not_calibrated', 'above_range']))
    expect(codes['A-late']).toContain('overdue')
    expect((await garage.technician.get('/wrenches?fitFor=01a22b8a-1780-79e9-af5d-1c5076b2c610')).status).toBe(404)
  })

  it('counts the cycles signed since the calibration', async () => {
    const garage = await buildGarage(api)
    const joint = await buildJoint(garage, { wrench: { intervalCycles: 4 } })
    await sign(garage, joint)
    expect((await garage.quality.get(`/wrenches/${joint.wrenchId}`)).body.calibration).toMatchObject({ cyclesSince: 4, status: 'overdue' })
  })

  it('pages through itself without losing or repeating a wrench', async () => {
    const garage = await buildGarage(api)
    for (let made = 0; made < 5; made += 1) await buildWrench(garage, {}, null)
    const seen: string[] = []
    let cursor: string | null = ''
    while (cursor !== null) {
      const { body }: { body: { items: { id: string }[], nextCursor: string | null } } = await garage.quality.get(`/wrenches?sort=-assetTag&limit=2${cursor && `&cursor=${cursor}`}`)
      seen.push(...body.items.map(item => item.id))
      cursor = body.nextCursor
    }
    expect([seen.length, new Set(seen).size]).toEqual([5, 5])
  })
})

describe('a calibration', () => {
  it('shows each deviation with the standard\'s sign and divisor, W and W′ from their components', async () => {
    const garage = await buildGarage(api)
    const id = await buildWrench(garage, {}, null)
    const readings = [60.6, 60.9, 60.5, 60.8, 60.7].map(reference => ({ indicated: 60, reference }))
    const { body } = await garage.quality.post(`/wrenches/${id}/calibrations`, { ...calibration(), asFound: [{ target: { value: 60, unit: 'N.m' }, readings }] })
    const [first] = body.points
    // −0.990099… = (60 − 60.6) / 60.6, and so on; w_md 0.3, w_r 0.240563, w_re 0.116492 (ISO 6789-2 structure [memory], recomputed).
    expect(first.deviationsPercent[0]).toBeCloseTo(-0.990099, 6)
    expect(first.meanDeviationPercent).toBeCloseTo(-1.152676, 6)
    expect(first.wPercent).toBeCloseTo(2 * Math.hypot(0.3, 0.240562612, 0.116492056), 6)
    expect(first.wPrimePercent).toBeCloseTo(1.152676 + first.wPercent, 5)
    expect([first.limitPercent, first.verdict, body.result, body.usable]).toEqual([4, 'pass', 'pass', true])
  })

  it('fails by one reading, quarantines the wrench, and is mended by as left', async () => {
    const garage = await buildGarage(api)
    const id = await buildWrench(garage)
    const bad = { ...point(36), readings: [...point(36).readings.slice(1), { indicated: 36, reference: 34.5 }] }
    const failed = await garage.quality.post(`/wrenches/${id}/calibrations`, { ...calibration(), asFound: [point(12), bad, point(60)] })
    expect([failed.body.result, failed.body.usable]).toEqual(['fail', false])
    expect((await garage.quality.get(`/wrenches/${id}`)).body.calibration.status).toBe('quarantined')
    const mended = await garage.quality.post(`/wrenches/${id}/calibrations`, { ...calibration(), asFound: [bad], adjusted: true, asLeft: [point(12), point(36), point(60)] })
    expect([mended.body.result, mended.body.usable]).toEqual(['fail', true])
    const now = await garage.quality.get(`/wrenches/${id}`)
    expect(now.body.calibration.status).toBe('valid')
    expect(now.body.figures.map((figure: { phase: string }) => figure.phase)).toEqual(['as_left', 'as_left', 'as_left'])
  })

  it('says what does not go together, each beside its field', async () => {
    const garage = await buildGarage(api)
    const id = await buildWrench(garage)
    const path = `/wrenches/${id}/calibrations`
    const { asFound, ...without } = calibration()
    const paths = async (body: object) => (await garage.quality.post(path, body)).body.data.issues.map((issue: { path: string }) => issue.path)
    expect(await paths(without)).toEqual(['asFound'])
    expect(await paths({ ...without, asFound, asFoundUnavailable: { reason: 'Broken' } })).toEqual(['asFoundUnavailable'])
    expect(await paths({ ...without, asFound, adjusted: true })).toEqual(['asLeft'])
    const future = await garage.quality.post(path, { ...calibration(), performedOn: daysAgo(-2) })
    expect([future.status, future.body.data.code]).toEqual([422, 'performed_on'])
    const first = calibration()
    expect((await garage.quality.post(path, first)).status).toBe(201)
    const twice = await garage.quality.post(path, { ...calibration(), certificateNumber: first.certificateNumber })
    expect([twice.status, twice.body.data.code]).toEqual([409, 'id_taken'])
  })

  it('counts on its day in the shop\'s zone, and an older one recorded later changes nothing now', async () => {
    const garage = await buildGarage(api, { timeZone: 'Pacific/Auckland' })
    const id = await buildWrench(garage, {}, { performedOn: '2026-03-31', certificateNumber: 'first' })
    const stand = (at: string) => inTransaction({ actor: garage.people.quality, shop: garage.shop, now: new Date(at) }, ctx => calibrationInForce(ctx, id, new Date(at)))
    // 2026-03-31 begins in Auckland at 11:00 UTC of the day before.
    expect((await stand('2026-03-30T10:59:00Z'))?.status).toBe('none')
    expect((await stand('2026-03-30T11:01:00Z'))?.status).toBe('valid')
    expect((await stand('2027-03-31T10:00:00Z'))?.status).toBe('due_soon')
    expect((await stand('2027-03-31T12:00:00Z'))?.status).toBe('overdue')
    await garage.quality.post(`/wrenches/${id}/calibrations`, { ...calibration(), performedOn: '2025-03-01', asFound: [point(12, 1.1)] })
    expect((await stand('2026-06-01T00:00:00Z'))?.calibration?.performedOn).toBe('2026-03-31')
    expect((await stand('2025-06-01T00:00:00Z'))?.status).toBe('quarantined')
  })
})
