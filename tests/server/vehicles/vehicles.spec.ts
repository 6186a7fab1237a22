import { describe, expect, it } from 'vitest'
import { roles } from '#shared/types/roles'
import { LogEntry } from '../../../server/db/models/log-entry'
import { buildShop, buildUser, unique } from '../../factories/shop'
import { buildVehicle } from '../../factories/vehicle'
import { useApi } from '../support/api'
import { useDatabase } from '../support/database'
import { ladder } from '../support/ladder'

useDatabase()
const api = useApi()

/** The example of 49 CFR 565: its check digit is X. */
const vin = '1M8GDM9AXKP042788'
const wrongDigit = '1M8GDM9A1KP042788'
const counter = ['technician', 'foreman', 'advisor'] as const
const whole = () => ({
  vin, unitNumber: unique('S'), plate: 'INV 204', year: 2019, make: 'Invented', model: 'Shuttle', engine: '2.4 diesel', odometer: 120_400,
})
const spoil = {
  vin: ['1M8GDM9AXKP04278', `${vin}0`, '1M8GDM9AXKPO42788', '1M8GDM9AXKPI42788', '1M8GDM9AXKPQ42788', '', 7, null],
  vinUnverified: ['yes', 1],
  unitNumber: ['', '   ', 'x'.repeat(41), 7, null, 'S\u0000'],
  plate: ['', 'x'.repeat(21)],
  year: [1899, 2101, 2019.5, '2019', Number.NaN],
  make: ['', 'x'.repeat(81), 7, null],
  model: ['', 'x'.repeat(10_000)],
  engine: ['', 'x'.repeat(81)],
  odometer: [-1, 10_000_000, 1.5, '12', 1e308],
}

ladder({
  api, method: 'GET', path: '/vehicles', roles,
  spoilQuery: { limit: ['0', '201', '-1', 'x'], sort: ['vin', '-'], cursor: ['x', 'W10'], q: ['x'.repeat(101)], other: ['1'] },
})
ladder({ api, method: 'GET', path: '/vehicles/:id', roles, scene: async shop => ({ id: (await buildVehicle(shop)).id }) })
ladder({
  api, method: 'POST', path: '/vehicles', roles: counter, valid: whole, log: 'vehicles.create',
  spoil: { ...spoil, make: [undefined, ...spoil.make], model: [undefined, ...spoil.model] },
})
ladder({
  api, method: 'PATCH', path: '/vehicles/:id', roles: counter, scene: async shop => ({ id: (await buildVehicle(shop)).id }),
  valid: whole, log: 'vehicles.update', spoil,
})

async function foreman() {
  const shop = await buildShop()
  const actor = await buildUser(shop, 'foreman')
  return { shop, caller: await api.as(actor) }
}

describe('a VIN', () => {
  it('with a wrong check digit is refused unless somebody stands for it', async () => {
    const { caller } = await foreman()
    const body = { make: 'Invented', model: 'Van', vin: wrongDigit }
    const refused = await caller.post('/vehicles', body)
    expect([refused.status, refused.body.data.code, refused.body.data.issues[0].path]).toEqual([422, 'vin_check_digit', 'vin'])
    const made = await caller.post('/vehicles', { ...body, vinUnverified: true })
    expect([made.status, made.body.vinUnverified]).toEqual([201, true])
    const { id } = made.body
    expect((await caller.patch(`/vehicles/${id}`, { plate: 'NEW 1' })).status).toBe(200)
    expect((await caller.patch(`/vehicles/${id}`, { vinUnverified: false })).body.data.code).toBe('vin_check_digit')
    expect((await caller.patch(`/vehicles/${id}`, { vin: '1M8GDM9A2KP042788' })).body.data.code).toBe('vin_check_digit')
    const right = await caller.patch(`/vehicles/${id}`, { vin })
    expect([right.status, right.body.vinUnverified]).toEqual([200, false])
  })

  it('with a right one is verified, whatever is said, in capitals', async () => {
    const { caller } = await foreman()
    const made = await caller.post('/vehicles', { make: 'Invented', model: 'Van', vin: ` ${vin.toLowerCase()} `, vinUnverified: true })
    expect([made.body.vin, made.body.vinUnverified]).toEqual([vin, false])
  })

  it.each(['vin', 'unitNumber'])('or unit number that is there already: 409 beside %s', async (path) => {
    const { shop, caller } = await foreman()
    const taken = { vin, unitNumber: 'S-204' }
    const first = await buildVehicle(shop, taken)
    const other = await buildVehicle(shop)
    const body = path === 'vin' ? { vin } : { unitNumber: 'S-204' }
    const again = await caller.post('/vehicles', { make: 'Invented', model: 'Van', ...body })
    expect([again.status, again.body.data.code, again.body.data.issues[0].path]).toEqual([409, 'id_taken', path])
    expect((await caller.patch(`/vehicles/${other.id}`, body)).status).toBe(409)
    expect((await caller.patch(`/vehicles/${first.id}`, body)).status).toBe(200)
  })
})

it('two people add the same vehicle at once: one wins, the other is told', async () => {
  const { caller } = await foreman()
  const body = { make: 'Invented', model: 'Van', vin }
  const answers = await Promise.all([caller.post('/vehicles', body), caller.post('/vehicles', body)])
  expect(answers.map(answer => answer.status).toSorted()).toEqual([201, 409])
})

it('a change logs what was and what is; no change logs nothing', async () => {
  const { shop, caller } = await foreman()
  const { id } = await buildVehicle(shop, { plate: 'OLD 1' })
  expect((await caller.patch(`/vehicles/${id}`, {})).status).toBe(200)
  expect((await caller.patch(`/vehicles/${id}`, { plate: 'OLD 1' })).status).toBe(200)
  expect((await caller.patch(`/vehicles/${id}`, { plate: 'NEW 1', odometer: 7 })).body).toMatchObject({ plate: 'NEW 1', odometer: 7 })
  const entries = await LogEntry.findAll({ where: { shopId: shop.id, subject: id, kind: 'vehicles.update' } })
  expect(entries.map(entry => JSON.parse(entry.content))).toEqual([
    { before: { plate: 'OLD 1', odometer: null }, after: { plate: 'NEW 1', odometer: 7 } },
  ])
})

describe('the list', () => {
  it('pages by every key, up and down, without a gap', async () => {
    const { shop, caller } = await foreman()
    const actor = await buildUser(shop, 'foreman')
    for (const [index, make] of ['Borealis', 'Acme', 'Acme', 'Cirrus', 'Acme'].entries()) {
      await buildVehicle(shop, { make, ...(index % 2 === 0 ? { unitNumber: `S-${index}` } : {}) }, actor)
    }
    for (const sort of ['unitNumber', '-unitNumber', 'make', '-make', 'createdAt', '-createdAt']) {
      const ids: string[] = []
      let cursor = ''
      do {
        const { body } = await caller.get(`/vehicles?limit=2&sort=${sort}${cursor}`)
        ids.push(...body.items.map((item: { id: string }) => item.id))
        cursor = body.nextCursor ? `&cursor=${body.nextCursor}` : ''
      } while (cursor)
      expect(new Set(ids).size, sort).toBe(5)
      const whole = await caller.get(`/vehicles?sort=${sort}`)
      expect(whole.body.items.map((item: { id: string }) => item.id), sort).toEqual(ids)
    }
    const byMake = await caller.get('/vehicles?sort=make')
    expect(byMake.body.items.map((item: { make: string }) => item.make)).toEqual(['Acme', 'Acme', 'Acme', 'Borealis', 'Cirrus'])
  })

  it('finds what is typed, taken literally, in this shop only', async () => {
    const { shop, caller } = await foreman()
    const other = await buildShop()
    await buildVehicle(other, { model: 'Kestrel' })
    const { id } = await buildVehicle(shop, { model: 'Kestrel', plate: 'A_1 %' })
    await buildVehicle(shop, { model: 'Heron' })
    for (const q of ['kestrel', ' KEST ', 'A_1', '%']) {
      const { body } = await caller.get(`/vehicles?q=${encodeURIComponent(q)}`)
      expect(body.items.map((item: { id: string }) => item.id), q).toEqual([id])
    }
    expect((await caller.get('/vehicles?q=%00')).body.items).toEqual([])
  })

  it('says what may be done', async () => {
    const { shop } = await foreman()
    await buildVehicle(shop)
    for (const [role, update] of [['technician', true], ['advisor', true], ['quality_lead', false], ['administrator', false]] as const) {
      const { body } = await (await api.as(await buildUser(shop, role))).get('/vehicles')
      expect(body.items[0].can, role).toEqual({ update })
    }
  })
})
