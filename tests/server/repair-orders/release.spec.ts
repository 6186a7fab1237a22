import { describe, expect, it } from 'vitest'
import { uuidv7 } from '#shared/ids/uuid'
import { buildGarage, buildJoint, buildOrder, sign } from '../../factories/joint'
import { PIN, unique } from '../../factories/shop'
import { useApi } from '../support/api'
import { useDatabase } from '../support/database'
import { ladder } from '../support/ladder'

useDatabase()
const api = useApi()

ladder({
  api,
  method: 'POST',
  path: '/repair-orders',
  roles: ['foreman', 'technician', 'advisor'],
  scene: async (shop) => {
    const garage = await buildGarage(api, {}, shop)
    const { body } = await garage.foreman.post('/vehicles', { make: 'Invented', model: 'Shuttle', unitNumber: unique('S') })
    return { vehicleId: body.id, number: unique('26') }
  },
  valid: ({ vehicleId, number }) => ({ number, vehicleId, complaint: 'Coolant on the floor', odometer: 120_300, bay: '2' }),
  spoil: {
    number: [undefined, '', 'n'.repeat(41), 7],
    vehicleId: [undefined, 'x', null],
    complaint: ['', 'c'.repeat(2001)],
    odometer: [-1, 1.5, 'x', 1e308],
    bay: ['', 7],
  },
  log: 'repair_orders.create',
})
const readOrder = { api, path: '/repair-orders/:id', scene: async (shop: Parameters<typeof buildGarage>[2]) => ({ id: await buildOrder(await buildGarage(api, {}, shop)) }) }
ladder({ ...readOrder, method: 'GET', roles: ['technician', 'foreman', 'quality_lead', 'advisor', 'administrator'] })
ladder({
  ...readOrder, method: 'PATCH', roles: ['foreman', 'technician', 'advisor'], valid: () => ({ bay: '4' }),
  spoil: { bay: ['', 7], odometer: [-1], complaint: [7] }, log: 'repair_orders.update',
})
ladder({
  api, method: 'GET', path: '/repair-orders', roles: ['technician', 'foreman', 'quality_lead', 'advisor', 'administrator'],
  spoilQuery: { sort: ['colour'], limit: ['0', '201', 'x'], state: ['x'], vehicleId: ['x'], cursor: ['x'] },
})
ladder({
  api,
  method: 'POST',
  path: '/repair-orders/:id/release',
  roles: ['foreman'],
  scene: async (shop) => {
    const garage = await buildGarage(api, {}, shop)
    const joint = await buildJoint(garage)
    await sign(garage, joint)
    return { id: joint.orderId }
  },
  valid: () => ({ pin: PIN }),
  spoil: { pin: [undefined, '12', 739164] },
  status: 200,
  log: 'repair_orders.release',
})

describe('release', () => {
  it('is refused while a joint is not signed, and names it', async () => {
    const garage = await buildGarage(api)
    const joint = await buildJoint(garage)
    const { status, body } = await garage.foreman.post(`/repair-orders/${joint.orderId}/release`, { pin: PIN })
    expect([status, body.data.code]).toEqual([422, 'held'])
    expect(body.data.issues).toEqual([expect.objectContaining({ path: `fastenerGroups.${joint.groupId}`, code: 'open' })])
  })

  it('is done once, by somebody who signed no joint of it, and nothing is signed after', async () => {
    const garage = await buildGarage(api)
    const joint = await buildJoint(garage)
    const other = await buildJoint(garage, { orderId: joint.orderId })
    await sign(garage, joint)
    await garage.foreman.put(`/sign-offs/${uuidv7()}`, other.body)
    const own = await garage.foreman.post(`/repair-orders/${joint.orderId}/release`, { pin: PIN })
    expect([own.status, own.body.data.code]).toEqual([403, 'same_person'])
    const second = await buildGarage(api, {}, garage.shop)
    const done = await second.foreman.post(`/repair-orders/${joint.orderId}/release`, { pin: PIN })
    expect(done.status).toBe(200)
    expect(done.body).toMatchObject({ holds: [], release: { by: { name: 'Cleo Foreman' }, ownJoint: false } })
    expect((await second.foreman.post(`/repair-orders/${joint.orderId}/release`, { pin: PIN })).body.data.code).toBe('already_released')
    const late = await garage.technician.put(`/sign-offs/${uuidv7()}`, joint.body)
    expect([late.status, late.body.data.code]).toEqual([409, 'already_released'])
  })

  it('lets the only person of a shop release his own joint where the shop says so, and the record says it', async () => {
    const garage = await buildGarage(api, { releaseOwnJoint: true })
    const joint = await buildJoint(garage)
    await garage.foreman.put(`/sign-offs/${uuidv7()}`, joint.body)
    const done = await garage.foreman.post(`/repair-orders/${joint.orderId}/release`, { pin: PIN })
    expect(done.body.release.ownJoint).toBe(true)
  })

  it('never happens beside a sign-off in the same moment: one of the two is first', async () => {
    const garage = await buildGarage(api)
    const joint = await buildJoint(garage)
    await sign(garage, joint)
    const [release, disturbed] = await Promise.all([
      garage.foreman.post(`/repair-orders/${joint.orderId}/release`, { pin: PIN }),
      garage.technician.post(`/fastener-groups/${joint.groupId}/disturbed`, { reason: 'Gasket pinched' }),
    ])
    const order = await garage.foreman.get(`/repair-orders/${joint.orderId}`)
    if (release.status === 200) expect([disturbed.body.data?.code, order.body.holds]).toEqual(['already_released', []])
    else expect([release.body.data.code, order.body.release]).toEqual(['held', null])
  })
})

describe('what becomes of a joint', () => {
  it('accepts an exception with a reason, but not one\'s own and not a safety joint', async () => {
    const garage = await buildGarage(api)
    const out = { readings: [1, 2, 3, 4].map(position => ({ position, stage: 1, value: 46, unit: 'N.m' })), deviationReason: 'Bulletin in hand' }
    const joint = await buildJoint(garage)
    await sign(garage, joint, out)
    const decision = { reason: 'Checked against the bulletin', pin: PIN }
    expect((await garage.technician.post(`/fastener-groups/${joint.groupId}/concession`, decision)).status).toBe(403)
    const conceded = await garage.foreman.post(`/fastener-groups/${joint.groupId}/concession`, decision)
    expect(conceded.body).toMatchObject({ state: 'conceded', concession: { reason: decision.reason, by: { name: 'Cleo Foreman' } } })
    expect((await garage.foreman.post(`/fastener-groups/${joint.groupId}/concession`, decision)).body.data.code).toBe('already_decided')

    const own = await buildJoint(garage)
    await garage.foreman.put(`/sign-offs/${uuidv7()}`, { ...own.body, ...out })
    expect((await garage.foreman.post(`/fastener-groups/${own.groupId}/concession`, decision)).body.data.code).toBe('same_person')

    const safety = await buildJoint(garage, { spec: { jointClass: 'safety' } })
    await sign(garage, safety, out)
    expect((await garage.foreman.post(`/fastener-groups/${safety.groupId}/concession`, decision)).body.data.code).toBe('safety_joint')
  })

  it('is disturbed when it was opened again, and signed anew', async () => {
    const garage = await buildGarage(api)
    const joint = await buildJoint(garage)
    expect((await garage.technician.post(`/fastener-groups/${joint.groupId}/disturbed`, { reason: 'Gasket pinched' })).body.data.code).toBe('nothing_signed')
    await sign(garage, joint)
    const opened = await garage.colleague.post(`/fastener-groups/${joint.groupId}/disturbed`, { reason: 'Gasket pinched' })
    expect(opened.body).toMatchObject({ state: 'disturbed', disturbed: { reason: 'Gasket pinched' } })
    expect(opened.body.signOffs).toEqual([expect.objectContaining({ standing: false })])
    await sign(garage, joint)
    expect((await garage.technician.get(`/fastener-groups/${joint.groupId}`)).body.state).toBe('signed')
  })

  it('is marked as not disturbed only while nothing of it is signed', async () => {
    const garage = await buildGarage(api)
    const joint = await buildJoint(garage)
    const mark = { reason: 'Only listed, never opened', pin: PIN }
    expect((await garage.foreman.post(`/fastener-groups/${joint.groupId}/not-disturbed`, mark)).body.state).toBe('not_disturbed')
    expect((await garage.foreman.get(`/repair-orders/${joint.orderId}`)).body.holds).toEqual([])
    const signed = await buildJoint(garage)
    await sign(garage, signed)
    expect((await garage.foreman.post(`/fastener-groups/${signed.groupId}/not-disturbed`, mark)).body.data.code).toBe('already_signed')
  })

  it('waits for its draft spec to be approved, while the bay goes on', async () => {
    const garage = await buildGarage(api)
    const joint = await buildJoint(garage, { approve: false })
    await sign(garage, joint)
    expect((await garage.foreman.get(`/repair-orders/${joint.orderId}`)).body.holds).toEqual([{ fastenerGroupId: joint.groupId, code: 'pending_approval' }])
    await garage.foreman.post(`/torque-specs/${joint.specId}/approve`, {})
    expect((await garage.foreman.get(`/repair-orders/${joint.orderId}`)).body.holds).toEqual([])
  })

  it('is never tightened to a general table, and to a shop value only with approval and never a safety joint', async () => {
    const garage = await buildGarage(api)
    const orderId = await buildOrder(garage)
    const table = await garage.foreman.post('/torque-specs', {
      kind: 'general_table', component: 'Capscrew 3/8 in', application: 'General table', target: { value: 37, unit: 'lbf.ft' }, source: { title: 'Invented table' },
    })
    const refused = await garage.technician.post(`/repair-orders/${orderId}/fastener-groups`, { specRevisionId: table.body.revision.id, boltCount: 2 })
    expect([refused.status, refused.body.data.code]).toEqual([422, 'general_table'])
    const value = { noPublishedSpec: true, component: 'Idler pulley', boltCount: 1, target: { value: 37, unit: 'lbf.ft' }, reasoning: 'M10 8.8 dry, general table' }
    const group = await garage.technician.post(`/repair-orders/${orderId}/fastener-groups`, value)
    expect(group.body).toMatchObject({ state: 'open', specRevision: { shopValue: true, status: 'draft', target: { value: 37, unit: 'lbf.ft' } } })
    const safety = await garage.technician.post(`/repair-orders/${orderId}/fastener-groups`, { ...value, jointClass: 'safety' })
    expect(safety.body.data.code).toBe('safety_joint')
  })

  it('asks for the number of bolts where the spec does not say', async () => {
    const garage = await buildGarage(api)
    const orderId = await buildOrder(garage)
    const spec = await garage.foreman.post('/torque-specs', { component: 'Cover', application: 'Engine', target: { value: 20, unit: 'N.m' }, source: { title: 'Invented manual' } })
    const path = `/repair-orders/${orderId}/fastener-groups`
    const specRevisionId = spec.body.revision.id
    expect((await garage.technician.post(path, { specRevisionId })).body.data.code).toBe('bolt_count')
    const group = await garage.technician.post(path, { specRevisionId, boltCount: 5 })
    expect(group.body.order).toEqual([1, 3, 5, 2, 4])
  })
})
