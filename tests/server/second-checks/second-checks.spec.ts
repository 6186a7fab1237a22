import { describe, expect, it } from 'vitest'
import { uuidv7 } from '#shared/ids/uuid'
import { buildGarage, buildJoint, buildWrench, sign } from '../../factories/joint'
import { PIN } from '../../factories/shop'
import { useApi } from '../support/api'
import { useDatabase } from '../support/database'
import { ladder } from '../support/ladder'

useDatabase()
const api = useApi()

const checked = { secondCheckRequired: true }
const witness = (signOffId: string) => ({ signOffId, method: 'witness', at: new Date().toISOString(), pin: PIN, capturedOffline: false })

ladder({
  api,
  method: 'PUT',
  path: '/second-checks/:id',
  roles: ['technician', 'foreman'],
  scene: async (shop) => {
    const garage = await buildGarage(api, {}, shop)
    return { id: uuidv7(), signOff: await sign(garage, await buildJoint(garage, { spec: checked })) }
  },
  valid: scene => witness(scene.signOff.id),
  spoil: {
    signOffId: [undefined, 'x'], method: [undefined, 'guess'], at: [undefined, 'now'], capturedOffline: [undefined, 1], pin: ['1', undefined],
    readings: ['x', [{ position: 0 }]].map(value => value === 'x' ? value : 7),
  },
  log: 'second_checks.create',
})
ladder({ api, method: 'GET', path: '/second-checks', roles: ['technician', 'foreman', 'quality_lead', 'advisor', 'administrator'], spoilQuery: { state: ['x'], limit: ['0'] } })

describe('a second check', () => {
  it('is somebody else\'s, stands in the waiting list until then, and lets the vehicle go', async () => {
    const garage = await buildGarage(api)
    const joint = await buildJoint(garage, { spec: checked })
    const signOff = await sign(garage, joint)
    const waiting = await garage.colleague.get('/second-checks?state=waiting')
    expect(waiting.body.items).toEqual([expect.objectContaining({ fastenerGroup: { id: joint.groupId, name: expect.any(String) }, can: { check: true }, positions: [1, 2, 3, 4] })])
    expect((await garage.technician.get('/second-checks')).body.items[0].can).toEqual({ check: false })

    const own = await garage.technician.put(`/second-checks/${uuidv7()}`, witness(signOff.id))
    expect([own.status, own.body.data.code]).toEqual([403, 'same_person'])
    const id = uuidv7()
    const body = witness(signOff.id)
    const done = await garage.colleague.put(`/second-checks/${id}`, body)
    expect([done.status, done.body.verdict]).toEqual([201, null])
    const again = await garage.colleague.put(`/second-checks/${id}`, body)
    expect([again.status, again.text]).toEqual([200, done.text])
    expect((await garage.foreman.put(`/second-checks/${uuidv7()}`, witness(signOff.id))).body.data.code).toBe('already_decided')
    expect((await garage.foreman.get('/second-checks')).body.items).toEqual([])
    expect((await garage.foreman.get(`/repair-orders/${joint.orderId}`)).body.holds).toEqual([])
  })

  it('by setting shows only that a bolt was not below, and does not count when one turned', async () => {
    const garage = await buildGarage(api)
    const joint = await buildJoint(garage, { spec: checked })
    const signOff = await sign(garage, joint)
    const wrenchId = await buildWrench(garage)
    const bySetting = (turned: boolean) => ({ ...witness(signOff.id), method: 'setting', wrenchId, readings: [{ position: 2, value: 41, unit: 'N.m', turned }] })
    expect((await garage.colleague.put(`/second-checks/${uuidv7()}`, { ...bySetting(true), wrenchId: undefined })).status).toBe(400)
    expect((await garage.colleague.put(`/second-checks/${uuidv7()}`, bySetting(true))).body.verdict).toBe('low')
    expect((await garage.colleague.get(`/fastener-groups/${joint.groupId}`)).body.state).toBe('second_check_waiting')
    expect((await garage.colleague.put(`/second-checks/${uuidv7()}`, bySetting(false))).body.verdict).toBeNull()
    expect((await garage.colleague.get(`/fastener-groups/${joint.groupId}`)).body.state).toBe('signed')
    const outside = await garage.colleague.put(`/second-checks/${uuidv7()}`, { ...bySetting(false), readings: [{ position: 9, value: 41, unit: 'N.m' }] })
    expect(outside.status).toBe(409)
  })

  it('is refused by setting or residual torque after an angle stage and on thread locker', async () => {
    const garage = await buildGarage(api)
    const wrenchId = await buildWrench(garage, { kind: 'indicating' })
    const angle = await buildJoint(garage, { spec: { ...checked, stages: [{ kind: 'torque', target: { value: 41, unit: 'N.m' } }, { kind: 'angle', angleDeg: 90 }] } })
    const locked = await buildJoint(garage, { spec: { ...checked, threadCondition: 'thread locker', preparation: [{ code: 'thread_locker', text: 'Thread locker applied', required: true }] } })
    const signed = [
      await sign(garage, angle, { readings: [{ position: 1, stage: 1, value: 41, unit: 'N.m' }, { position: 1, stage: 2, value: 90, unit: 'deg' }] }),
      await sign(garage, locked, { prep: { thread_locker: true } }),
    ]
    for (const { id } of signed) {
      for (const method of ['setting', 'residual']) {
        const answer = await garage.colleague.put(`/second-checks/${uuidv7()}`, { ...witness(id), method, wrenchId, readings: [{ position: 1, value: 41, unit: 'N.m' }] })
        expect([answer.status, answer.body.data.code], method).toEqual([422, 'method'])
      }
      expect((await garage.colleague.put(`/second-checks/${uuidv7()}`, witness(id))).status).toBe(201)
    }
  })
})
