import { randomUUID } from 'node:crypto'
import { describe, expect, it } from 'vitest'
import { uuidv7 } from '#shared/ids/uuid'
import { buildGarage, buildJoint, daysAgo, sign, signOffBody } from '../../factories/joint'
import { PIN } from '../../factories/shop'
import { useApi } from '../support/api'
import { useDatabase } from '../support/database'
import { ladder } from '../support/ladder'

useDatabase()
const api = useApi()

const minutesFromNow = (minutes: number) => new Date(Date.now() + minutes * 60_000).toISOString()

ladder({
  api,
  method: 'PUT',
  path: '/sign-offs/:id',
  roles: ['technician', 'foreman'],
  scene: async shop => ({ id: uuidv7(), ...await buildJoint(await buildGarage(api, {}, shop)) }),
  valid: scene => scene.body,
  spoil: {
    'fastenerGroupId': [undefined, 'x', 7, null],
    'wrenchId': [undefined, 'x', 7],
    'readings': [undefined, [], 'x', {}],
    'readings.0.position': [0, -1, 1.5, 'x', undefined, 1e9],
    'readings.0.stage': [0, -1, 1.5, undefined],
    'readings.0.attempt': [0, 1.5, 'x'],
    'readings.0.value': [0, -1, 1e308, 'x', null, undefined, '9'.repeat(10_000)],
    'readings.0.unit': ['furlong', '', 7, 'deg', undefined],
    'adapter.extensionMm': [0, -1, 'x'],
    'prep': [undefined, 'x', 7],
    'deviationReason': ['', 'x', 'y'.repeat(2001)],
    'signedAt': [undefined, 'yesterday', 7, '2026-02-30T00:00:00Z'],
    'tightenedAt': ['x', 7],
    'capturedOffline': [undefined, 'yes'],
    'pin': ['12345', '1234567', 'abcdef', undefined, 739164],
    'note': ['', 'n'.repeat(2001)],
  },
  log: 'sign_offs.create',
})

describe('a signed joint', () => {
  it('answers verdict, probability, log number and hash as the contract says', async () => {
    const garage = await buildGarage(api)
    const joint = await buildJoint(garage)
    const id = uuidv7()
    const { status, body } = await garage.technician.put(`/sign-offs/${id}`, joint.body)
    expect(status).toBe(201)
    expect(body).toMatchObject({ id, verdict: 'in_band', exceptions: [], limits: { targetNm: 41, lowerNm: 36.9, upperNm: 45.1 } })
    expect(body.readings).toHaveLength(4)
    expect(body.readings[0]).toMatchObject({ position: 1, stage: 1, attempt: 1, nm: 41, verdict: 'in_band' })
    expect(body.readings[0].probabilityInBand).toBeGreaterThan(0.999)
    expect(body.hash).toMatch(/^[0-9a-f]{64}$/)
    expect(body.calibration).toMatchObject({ status: 'valid' })
    const group = await garage.technician.get(`/fastener-groups/${joint.groupId}`)
    expect(group.body.state).toBe('signed')
  })

  it('answers the same again to the same content, with 200, PIN or not, and nothing twice', async () => {
    const garage = await buildGarage(api)
    const { body } = await buildJoint(garage)
    const path = `/sign-offs/${uuidv7()}`
    const first = await garage.technician.put(path, body)
    const { pin, ...unsigned } = body
    expect(pin).toBe(PIN)
    const again = await garage.technician.put(path, unsigned)
    expect(again.status).toBe(200)
    expect(again.text).toBe(first.text)
    const other = await garage.technician.put(path, { ...body, note: 'something else' })
    expect([other.status, other.body.data.code]).toEqual([409, 'id_taken'])
    const stranger = await garage.colleague.put(path, body)
    expect([stranger.status, stranger.body.data.code]).toEqual([409, 'id_taken'])
    const list = await garage.technician.get('/sign-offs')
    expect(list.body.items).toHaveLength(1)
  })

  it('is recorded once when the same request comes ten times at once', async () => {
    const garage = await buildGarage(api)
    const { body } = await buildJoint(garage)
    const path = `/sign-offs/${uuidv7()}`
    const answers = await Promise.all(Array.from({ length: 10 }, () => garage.technician.put(path, body)))
    expect(answers.map(answer => answer.status).toSorted()).toEqual([...Array.from({ length: 9 }, () => 200), 201])
    expect(new Set(answers.map(answer => answer.text)).size).toBe(1)
  })

  it('is won by one of two people, and the other is told by whom', async () => {
    const garage = await buildGarage(api)
    const { body } = await buildJoint(garage)
    const answers = await Promise.all([
      garage.technician.put(`/sign-offs/${uuidv7()}`, body),
      garage.colleague.put(`/sign-offs/${uuidv7()}`, body),
    ])
    const [lost] = answers.filter(answer => answer.status !== 201)
    expect(answers.filter(answer => answer.status === 201)).toHaveLength(1)
    expect([lost?.status, lost?.body.data.code]).toEqual([409, 'already_signed'])
    expect(lost?.body.message).toMatch(/^(Ada Technician|Ben Colleague) has already signed position 1, 2, 3, 4/)
    expect(lost?.body.data.signedBy.name).toMatch(/Ada|Ben/)
  })

  it('can be finished by the next shift, and the group is signed when all is covered', async () => {
    const garage = await buildGarage(api)
    const joint = await buildJoint(garage)
    const part = (positions: number[]) => ({ ...joint.body, readings: joint.body.readings.filter(reading => positions.includes(reading.position)) })
    expect((await garage.technician.put(`/sign-offs/${uuidv7()}`, part([1, 3]))).status).toBe(201)
    expect((await garage.technician.get(`/fastener-groups/${joint.groupId}`)).body.state).toBe('in_progress')
    const overlap = await garage.colleague.put(`/sign-offs/${uuidv7()}`, part([3, 2]))
    expect(overlap.body.data).toMatchObject({ code: 'already_signed', positions: [3] })
    expect((await garage.colleague.put(`/sign-offs/${uuidv7()}`, part([2, 4]))).status).toBe(201)
    expect((await garage.technician.get(`/fastener-groups/${joint.groupId}`)).body.state).toBe('signed')
  })
})

describe('what a sign-off is refused for', () => {
  const refusal = async (scene: Parameters<typeof buildJoint>[1], overrides: object, rules: Parameters<typeof buildGarage>[1] = {}) => {
    const garage = await buildGarage(api, rules)
    const joint = await buildJoint(garage, scene)
    const answer = await garage.technician.put(`/sign-offs/${uuidv7()}`, { ...joint.body, ...overrides })
    return { garage, joint, status: answer.status, code: answer.body.data?.code, body: answer.body }
  }
  const at = (value: number) => ({ readings: [1, 2, 3, 4].map(position => ({ position, stage: 1, value, unit: 'N.m' })) })

  it('a position that the group does not have', async () => {
    const { status, code, body } = await refusal({}, { readings: [{ position: 5, stage: 1, value: 41, unit: 'N.m' }] })
    expect([status, code, body.data.issues[0].path]).toEqual([422, 'position_unknown', 'readings.0.position'])
  })
  it('the same position, stage and attempt twice', async () => {
    const reading = { position: 1, stage: 1, value: 41, unit: 'N.m' }
    expect((await refusal({}, { readings: [reading, reading] })).status).toBe(400)
  })
  it('a wrench or group that is not there', async () => {
    for (const field of ['wrenchId', 'fastenerGroupId']) {
      const { status, code, body } = await refusal({}, { [field]: randomUUID() })
      expect([status, code, body.data.issues[0].path]).toEqual([422, 'unknown_reference', field])
    }
  })
  it('another shop\'s wrench', async () => {
    const elsewhere = await buildJoint(await buildGarage(api))
    expect((await refusal({}, { wrenchId: elsewhere.wrenchId })).code).toBe('unknown_reference')
  })
  it('a time in the future, or before the order', async () => {
    expect((await refusal({}, { signedAt: minutesFromNow(3) })).code).toBe('signed_at')
    expect((await refusal({}, { signedAt: minutesFromNow(-60) })).code).toBe('signed_at')
    expect((await refusal({}, { signedAt: minutesFromNow(1) })).status).toBe(201)
  })
  it('a preparation that was not confirmed, or contradicts without a reason', async () => {
    const missing = await refusal({}, { prep: {} })
    expect([missing.status, missing.code, missing.body.data.issues[0].path]).toEqual([422, 'preparation', 'prep.threads_clean_dry'])
    const contradicts = await refusal({}, { prep: { threads_clean_dry: true, thread_locker: true } })
    expect([contradicts.code, contradicts.body.data.issues[0].path]).toEqual(['preparation', 'prepReason'])
    const withReason = await refusal({}, { prep: { threads_clean_dry: true, thread_locker: true }, prepReason: 'The foreman asked for it' })
    expect(withReason.body.exceptions).toEqual(['preparation_contradicts'])
  })
  it('a setting outside the band, unless a reason makes it an exception', async () => {
    expect((await refusal({}, at(46))).code).toBe('setting_out_of_band')
    const withReason = await refusal({}, { ...at(46), deviationReason: 'Maker bulletin in hand' })
    expect([withReason.status, withReason.body.verdict, withReason.body.exceptions]).toEqual([201, 'high', ['setting_out_of_band']])
  })
  it('a reading outside the band, of which the last attempt counts', async () => {
    const wrench = { kind: 'indicating' }
    expect((await refusal({ wrench }, at(30))).code).toBe('out_of_band')
    const again = await refusal({ wrench }, { readings: [
      ...[1, 2, 3].map(position => ({ position, stage: 1, value: 41, unit: 'N.m' })),
      { position: 4, stage: 1, attempt: 1, value: 30, unit: 'N.m' },
      { position: 4, stage: 1, attempt: 2, value: 41.5, unit: 'N.m' },
    ] })
    expect([again.status, again.body.verdict, again.body.exceptions]).toEqual([201, 'in_band', []])
    expect(again.body.readings).toHaveLength(5)
    expect(again.body.readings[3]).toMatchObject({ attempt: 1, verdict: 'low' })
  })
  it('a wrench out of calibration, or an exception where the shop says so, or when it was done offline', async () => {
    const scene = { calibration: { performedOn: daysAgo(400) } }
    const refused = await refusal(scene, {})
    expect([refused.status, refused.code]).toEqual([422, 'wrench_unfit'])
    expect(refused.body.message).toContain('overdue')
    const asException = await refusal(scene, {}, { unfitWrench: 'exception' })
    expect([asException.status, asException.body.exceptions, asException.body.calibration.status]).toEqual([201, ['wrench_unfit'], 'overdue'])
    const order = await asException.garage.foreman.get(`/repair-orders/${asException.joint.orderId}`)
    expect(order.body.holds).toEqual([{ fastenerGroupId: asException.joint.groupId, code: 'exception' }])
    const offline = await refusal(scene, { capturedOffline: true })
    expect([offline.status, offline.body.exceptions]).toEqual([201, ['wrench_unfit']])
  })
  it('a wrench without calibration, too small, quarantined', async () => {
    expect((await refusal({ calibration: null }, {})).code).toBe('wrench_unfit')
    expect((await refusal({ wrench: { range: { min: 4, max: 20, unit: 'N.m' } }, calibration: null }, {})).code).toBe('wrench_unfit')
  })
  it('an angle stage that is turned twice, unless a reason says why', async () => {
    const stages = [{ kind: 'torque', target: { value: 41, unit: 'N.m' } }, { kind: 'angle', angleDeg: 90, toleranceDeg: 5 }]
    const readings = [
      { position: 1, stage: 1, value: 41, unit: 'N.m' },
      { position: 1, stage: 2, attempt: 1, value: 70, unit: 'deg' },
      { position: 1, stage: 2, attempt: 2, value: 90, unit: 'deg' },
    ]
    expect((await refusal({ spec: { stages } }, { readings })).code).toBe('angle_retightened')
    const withReason = await refusal({ spec: { stages } }, { readings, deviationReason: 'New bolt fitted' })
    expect(withReason.body.exceptions).toEqual(['angle_retightened'])
    expect(withReason.body.readings[2]).toMatchObject({ nm: null, probabilityInBand: null, verdict: 'in_band' })
  })
  it('keeps a late entry as an exception, and refuses one from after the signature', async () => {
    const signedAt = minutesFromNow(1)
    expect((await refusal({}, { signedAt, tightenedAt: minutesFromNow(-60.5) })).body.exceptions).toEqual(['late_entry'])
    expect((await refusal({}, { signedAt, tightenedAt: minutesFromNow(-58) })).body.exceptions).toEqual([])
    expect((await refusal({}, { signedAt, tightenedAt: minutesFromNow(5) })).code).toBe('tightened_at')
  })
  it('a withdrawn spec, which offline becomes an exception', async () => {
    const garage = await buildGarage(api)
    const joint = await buildJoint(garage)
    await garage.foreman.post(`/torque-specs/${joint.specId}/withdraw`, { reason: 'The manual was corrected' })
    const live = await garage.technician.put(`/sign-offs/${uuidv7()}`, joint.body)
    expect([live.status, live.body.data.code]).toEqual([422, 'spec_withdrawn'])
    const offline = await garage.technician.put(`/sign-offs/${uuidv7()}`, { ...joint.body, capturedOffline: true })
    expect([offline.status, offline.body.exceptions]).toEqual([201, ['spec_withdrawn']])
  })
  it('a wrong PIN, counted down to the lock, and unlocked by the passphrase only', async () => {
    const garage = await buildGarage(api)
    const joint = await buildJoint(garage)
    const wrong = { ...joint.body, pin: '000001' }
    for (let left = 9; left >= 0; left -= 1) {
      const answer = await garage.technician.put(`/sign-offs/${uuidv7()}`, wrong)
      expect([answer.status, answer.body.data.code, answer.body.data.triesLeft]).toEqual([403, 'wrong_pin', left])
    }
    const locked = await garage.technician.put(`/sign-offs/${uuidv7()}`, joint.body)
    expect([locked.status, locked.body.data.code]).toEqual([403, 'pin_locked'])
    expect((await garage.technician.get('/sign-offs')).body.items).toEqual([])
  })
  it('allows no more than ten guesses in a burst of forty', async () => {
    const garage = await buildGarage(api)
    const joint = await buildJoint(garage)
    const answers = await Promise.all(Array.from({ length: 40 }, () => garage.technician.put(`/sign-offs/${uuidv7()}`, { ...joint.body, pin: '000001' })))
    expect(answers.filter(answer => answer.body.data.code === 'wrong_pin')).toHaveLength(10)
    expect(answers.filter(answer => answer.body.data.code === 'pin_locked')).toHaveLength(30)
  })
})

describe('corrections and voids', () => {
  it('lets only the signer correct, once, and keeps the old one', async () => {
    const garage = await buildGarage(api)
    const joint = await buildJoint(garage)
    const first = await sign(garage, joint)
    const correction = { ...signOffBody(joint.groupId, joint.wrenchId), id: uuidv7(), reason: 'Wrong wrench noted' }
    const stranger = await garage.colleague.post(`/sign-offs/${first.id}/corrections`, correction)
    expect([stranger.status, stranger.body.data.code]).toEqual([403, 'role'])
    const made = await garage.technician.post(`/sign-offs/${first.id}/corrections`, correction)
    expect(made.status).toBe(201)
    const again = await garage.technician.post(`/sign-offs/${first.id}/corrections`, { ...correction, id: uuidv7() })
    expect([again.status, again.body.data.code]).toEqual([409, 'superseded'])
    const old = await garage.technician.get(`/sign-offs/${first.id}`)
    expect(old.body).toMatchObject({ standing: false, supersededBy: correction.id, verdict: 'in_band' })
    const next = await garage.technician.get(`/sign-offs/${correction.id}`)
    expect(next.body).toMatchObject({ standing: true, supersedes: { id: first.id, reason: 'Wrong wrench noted' } })
  })

  it('opens the group again when a foreman voids', async () => {
    const garage = await buildGarage(api)
    const joint = await buildJoint(garage)
    const first = await sign(garage, joint)
    expect((await garage.technician.post(`/sign-offs/${first.id}/void`, { reason: 'Not mine to do', pin: PIN })).status).toBe(403)
    const voided = await garage.foreman.post(`/sign-offs/${first.id}/void`, { reason: 'The wrong vehicle', pin: PIN })
    expect(voided.body).toMatchObject({ standing: false, voided: { reason: 'The wrong vehicle' } })
    expect((await garage.technician.get(`/fastener-groups/${joint.groupId}`)).body.state).toBe('open')
    expect((await garage.foreman.post(`/sign-offs/${first.id}/void`, { reason: 'Once more', pin: PIN })).body.data.code).toBe('superseded')
    expect((await sign(garage, joint)).verdict).toBe('in_band')
  })
})
