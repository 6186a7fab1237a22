import { describe, expect, it } from 'vitest'
import { buildShop, buildUser, PASSPHRASE, PIN } from '../../factories/shop'
import { useApi } from '../support/api'
import { useDatabase } from '../support/database'

useDatabase()
const api = useApi()

describe('signing in', () => {
  it('answers who signed in, and the same words whether or not the e-mail exists', async () => {
    const shop = await buildShop()
    const user = await buildUser(shop, 'technician')
    const right = await api.nobody().post('/auth/sign-in', { email: user.email.toUpperCase(), password: PASSPHRASE })
    expect(right.status).toBe(200)
    expect(right.body).toEqual({ user: { id: user.id, name: user.name, role: 'technician', shopId: shop.id } })
    expect(String(right.headers['set-cookie'])).toMatch(/^jamnut=.*HttpOnly/)

    const wrong = await api.nobody().post('/auth/sign-in', { email: user.email, password: 'not the passphrase' })
    const unknown = await api.nobody().post('/auth/sign-in', { email: 'nobody@shop.example', password: 'not the passphrase' })
    expect(wrong.status).toBe(401)
    expect(unknown.status).toBe(401)
    expect(unknown.body).toEqual(wrong.body)
    expect(wrong.body.data.code).toBe('bad_credentials')
  })

  it('refuses a disabled person', async () => {
    const shop = await buildShop()
    const user = await buildUser(shop, 'technician', { active: false })
    const answer = await api.nobody().post('/auth/sign-in', { email: user.email, password: PASSPHRASE })
    expect(answer.status).toBe(401)
  })

  it('says who is signed in, and nothing to nobody', async () => {
    const shop = await buildShop()
    const user = await buildUser(shop, 'foreman')
    const caller = await api.as(user)
    const me = await caller.get('/auth/me')
    expect(me.body.user).toMatchObject({ id: user.id, role: 'foreman', hasPin: true })
    expect(me.body.can).toMatchObject({ listUsers: false, createOrder: true })
    expect((await api.nobody().get('/auth/me')).body.data.code).toBe('signed_out')
  })

  it('ends the session at sign-out for good', async () => {
    const caller = await api.as(await buildUser(await buildShop(), 'advisor'))
    expect((await caller.post('/auth/sign-out')).status).toBe(200)
    expect((await caller.get('/auth/me')).status).toBe(401)
  })

  it('lets no other site\'s page change anything', async () => {
    const caller = await api.as(await buildUser(await buildShop(), 'advisor'))
    const answer = await caller.post('/auth/sign-out', {}, { Origin: 'https://elsewhere.example' })
    expect(answer.status).toBe(403)
    expect(answer.body.data.code).toBe('foreign_origin')
    expect((await caller.get('/auth/me')).status).toBe(200)
  })
})

describe('own secrets', () => {
  it('changes the passphrase and ends all other sessions', async () => {
    const user = await buildUser(await buildShop(), 'technician')
    const here = await api.as(user)
    const elsewhere = await api.as(user)
    const next = 'another long passphrase'
    expect((await here.post('/auth/passphrase', { current: 'wrong one here', next })).body.data.code).toBe('wrong_passphrase')
    expect((await here.post('/auth/passphrase', { current: PASSPHRASE, next: 'too short' })).status).toBe(400)
    expect((await here.post('/auth/passphrase', { current: PASSPHRASE, next })).status).toBe(200)
    expect((await here.get('/auth/me')).status).toBe(200)
    expect((await elsewhere.get('/auth/me')).status).toBe(401)
    expect((await api.nobody().post('/auth/sign-in', { email: user.email, password: next })).status).toBe(200)
  })

  it.each(['123456', '111111', '121212', '654321', '199012', '123123'])('refuses the PIN %s', async (pin) => {
    const caller = await api.as(await buildUser(await buildShop(), 'technician'))
    const answer = await caller.post('/auth/pin', { password: PASSPHRASE, pin })
    expect(answer.status).toBe(422)
    expect(answer.body.data.code).toBe('weak_pin')
  })

  it('sets a PIN with the passphrase', async () => {
    const caller = await api.as(await buildUser(await buildShop(), 'technician'))
    expect((await caller.post('/auth/pin', { password: 'not it', pin: PIN })).body.data.code).toBe('wrong_passphrase')
    expect((await caller.post('/auth/pin', { password: PASSPHRASE, pin: PIN })).status).toBe(200)
  })
})
