import { describe, expect, it } from 'vitest'
import { buildShop, buildUser, PASSPHRASE, unique } from '../../factories/shop'
import { useApi } from '../support/api'
import { useDatabase } from '../support/database'
import { ladder } from '../support/ladder'

useDatabase()
const api = useApi()
const administrator = ['administrator'] as const
const person = () => ({ name: 'Nia Newcomer', email: `${unique('nia')}@shop.example`, role: 'technician' })

ladder({
  api, method: 'POST', path: '/users', roles: administrator, valid: person, log: 'users.create',
  spoil: { name: [undefined, '', 'n'.repeat(101)], email: [undefined, 'x', 7], role: [undefined, 'boss'] },
})
ladder({ api, method: 'GET', path: '/users', roles: administrator, spoilQuery: { sort: ['shoe'], limit: ['0'] } })
ladder({
  api, method: 'PATCH', path: '/users/:id', roles: administrator, scene: async shop => ({ id: (await buildUser(shop, 'advisor')).id }),
  valid: () => ({ role: 'technician' }), spoil: { role: ['boss'], active: ['no'], name: [''], endSessions: [false] }, log: 'users.update',
})
ladder({
  api, method: 'PATCH', path: '/shop', roles: administrator, valid: () => ({ unfitWrench: 'exception' }),
  spoil: { unfitWrench: ['maybe'], defaultTolerancePercent: [0, 100], dueSoonDays: [-1, 366] }, log: 'shops.update',
})
ladder({ api, method: 'GET', path: '/log', roles: ['quality_lead', 'administrator'], spoilQuery: { after: ['x', '-1'], limit: ['0'] } })
ladder({ api, method: 'GET', path: '/log/head', roles: ['quality_lead', 'administrator'] })

describe('people', () => {
  it('sign in with the temporary passphrase, which is answered once', async () => {
    const admin = await api.as(await buildUser(await buildShop(), 'administrator'))
    const { body } = await admin.post('/users', person())
    expect(body.temporaryPassphrase).toMatch(/^[a-z2-9]{4}(-[a-z2-9]{4}){4}$/)
    const entered = await api.nobody().post('/auth/sign-in', { email: body.email, password: body.temporaryPassphrase })
    expect(entered.body.user.role).toBe('technician')
    expect(JSON.stringify((await admin.get('/users')).body)).not.toContain(body.temporaryPassphrase)
  })

  it('lose their sessions with a new role or a disabling, at once', async () => {
    const shop = await buildShop()
    const admin = await api.as(await buildUser(shop, 'administrator'))
    for (const change of [{ role: 'foreman' }, { active: false }, { endSessions: true }, { resetPassphrase: true }]) {
      const user = await buildUser(shop, 'technician')
      const caller = await api.as(user)
      expect((await caller.get('/auth/me')).status).toBe(200)
      expect((await admin.patch(`/users/${user.id}`, change)).status).toBe(200)
      expect((await caller.get('/auth/me')).status, JSON.stringify(change)).toBe(401)
    }
  })

  it('cannot change their own access, nor take an e-mail that is taken', async () => {
    const shop = await buildShop()
    const actor = await buildUser(shop, 'administrator')
    const admin = await api.as(actor)
    const own = await admin.patch(`/users/${actor.id}`, { active: false })
    expect([own.status, own.body.data.code]).toEqual([403, 'same_person'])
    const taken = await admin.post('/users', { ...person(), email: actor.email })
    expect([taken.status, taken.body.data.code]).toEqual([409, 'id_taken'])
  })

  it('are stopped after ten failed sign-ins from one address, and say when to come back', async () => {
    const user = await buildUser(await buildShop(), 'technician')
    const wrong = { email: user.email, password: 'not the passphrase' }
    const caller = api.nobody()
    await caller.post('/auth/sign-in', { email: user.email, password: PASSPHRASE })
    const statuses: number[] = []
    for (let attempt = 0; attempt < 11; attempt += 1) statuses.push((await caller.post('/auth/sign-in', wrong)).status)
    expect(statuses).toEqual([...Array.from({ length: 10 }, () => 401), 429])
    const blocked = await caller.post('/auth/sign-in', { email: user.email, password: PASSPHRASE })
    expect([blocked.status, blocked.body.data.code]).toEqual([429, 'too_many'])
    expect(Number(blocked.headers['retry-after'])).toBeGreaterThan(0)
    expect((await api.nobody().post('/auth/sign-in', { email: user.email, password: PASSPHRASE })).status).toBe(200)
  })
})

describe('the description of the API', () => {
  it('has every route with the schema of its answer', async () => {
    const { body } = await api.nobody().get('/openapi.json')
    expect(body.openapi).toBe('3.0.3')
    const record = body.paths['/sign-offs/{id}'].put
    expect(record.responses['201'].content['application/json'].schema.properties).toHaveProperty('hash')
    expect(record.requestBody.content['application/json'].schema.required).toContain('fastenerGroupId')
    expect(Object.keys(body.paths).length).toBeGreaterThan(25)
  })

  it('answers an unknown address in the one shape of errors', async () => {
    const caller = await api.as(await buildUser(await buildShop(), 'advisor'))
    const answer = await caller.get('/no-such-thing')
    expect([answer.status, answer.body.data.code]).toEqual([404, 'not_found'])
  })
})
