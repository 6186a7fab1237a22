import { uuidv7 } from '#shared/ids/uuid'
import type { Actor, Shop } from '../../server/context'
import type { Caller, useApi } from '../server/support/api'
import { buildShop, buildUser, PIN, unique } from './shop'

type Api = ReturnType<typeof useApi>

/** A shop with its people signed in: where a joint is tightened. */
export interface Garage {
  shop: Shop
  people: { technician: Actor, colleague: Actor, foreman: Actor, quality: Actor }
  technician: Caller
  colleague: Caller
  foreman: Caller
  quality: Caller
}

/** Fails a test whose scene could not be set, with the server's own words. */
async function ok<Body>(answer: Promise<{ status: number, body: Body }>): Promise<Body> {
  const { status, body } = await answer
  if (status >= 300) throw new Error(`The scene could not be set: ${status} ${JSON.stringify(body)}`)
  return body
}

/** A garage with two technicians, a foreman and a quality lead. */
export async function buildGarage(api: Api, rules: Parameters<typeof buildShop>[0] = {}, within?: Shop): Promise<Garage> {
  const shop = within ?? await buildShop(rules)
  const people = {
    technician: await buildUser(shop, 'technician', { name: 'Ada Technician' }),
    colleague: await buildUser(shop, 'technician', { name: 'Ben Colleague' }),
    foreman: await buildUser(shop, 'foreman', { name: 'Cleo Foreman' }),
    quality: await buildUser(shop, 'quality_lead', { name: 'Dov Quality' }),
  }
  return {
    shop,
    people,
    technician: await api.as(people.technician),
    colleague: await api.as(people.colleague),
    foreman: await api.as(people.foreman),
    quality: await api.as(people.quality),
  }
}

/** A spec of 41 N·m ± 10 % for four bolts, approved unless said otherwise. */
export async function buildSpec(garage: Garage, overrides: object = {}, { approve = true } = {}): Promise<{ id: string, revisionId: string }> {
  const spec = await ok(garage.foreman.post('/torque-specs', {
    component: unique('Water pump to block'),
    application: 'Engine, cooling system',
    jointClass: 'sealing',
    boltCount: 4,
    pattern: 'circle',
    threadCondition: 'dry',
    preparation: [{ code: 'threads_clean_dry', text: 'Threads clean and dry', required: true }],
    target: { value: 41, unit: 'N.m' },
    source: { title: 'Invented manual', section: '6-12', page: '214' },
    ...overrides,
  }))
  if (approve) await ok(garage.foreman.post(`/torque-specs/${spec.id}/approve`, {}))
  return { id: spec.id, revisionId: spec.revision.id }
}

/** A wrench of 10 to 60 N·m that was calibrated thirty days ago, reading true within a fraction of a percent. */
export async function buildWrench(garage: Garage, overrides: object = {}, calibration: object | null = {}): Promise<string> {
  const wrench = await ok(garage.quality.post('/wrenches', {
    assetTag: unique('W'),
    serial: unique('S'),
    kind: 'setting',
    range: { min: 10, max: 60, unit: 'N.m' },
    graduation: { value: 0.5, unit: 'N.m' },
    intervalMonths: 12,
    ...overrides,
  }))
  if (calibration) {
    const point = (target: number) => ({ target: { value: target, unit: 'N.m' }, readings: [1.001, 0.999, 1, 1.002, 0.998].map(share => ({ indicated: target, reference: target * share })) })
    await ok(garage.quality.post(`/wrenches/${wrench.id}/calibrations`, {
      performedOn: daysAgo(30), laboratory: 'Invented laboratory', certificateNumber: unique('C'), reference: { uncertaintyPercent: 0.6 },
      asFound: [point(12), point(36), point(60)], adjusted: false, ...calibration,
    }))
  }
  return wrench.id
}

/** A day some days before today, in UTC. */
export const daysAgo = (days: number) => new Date(Date.now() - days * 86_400_000).toISOString().slice(0, 10)

/** A repair order on a new vehicle. */
export async function buildOrder(garage: Garage): Promise<string> {
  const vehicle = await ok(garage.foreman.post('/vehicles', { make: 'Invented', model: 'Shuttle', unitNumber: unique('S') }))
  return (await ok(garage.foreman.post('/repair-orders', { number: unique('26'), vehicleId: vehicle.id }))).id
}

export interface Joint {
  orderId: string
  groupId: string
  specId: string
  wrenchId: string
  body: ReturnType<typeof signOffBody>
}

/** A joint on an order, ready to be signed, and the body that signs it whole. */
export async function buildJoint(garage: Garage, scene: { spec?: object, approve?: boolean, wrench?: object, calibration?: object | null, orderId?: string } = {}): Promise<Joint> {
  const spec = await buildSpec(garage, scene.spec, { approve: scene.approve ?? true })
  const orderId = scene.orderId ?? await buildOrder(garage)
  const group = await ok(garage.technician.post(`/repair-orders/${orderId}/fastener-groups`, { specRevisionId: spec.revisionId }))
  const wrenchId = await buildWrench(garage, scene.wrench, scene.calibration)
  return { orderId, groupId: group.id, specId: spec.id, wrenchId, body: signOffBody(group.id, wrenchId) }
}

/** Four clicks at 41 N·m, signed now. */
export function signOffBody(fastenerGroupId: string, wrenchId: string) {
  return {
    fastenerGroupId,
    wrenchId,
    readings: [1, 2, 3, 4].map(position => ({ position, stage: 1, value: 41, unit: 'N.m' })),
    prep: { threads_clean_dry: true },
    signedAt: new Date().toISOString(),
    pin: PIN,
    capturedOffline: false,
  }
}

/** Signs a joint as its technician and answers the sign-off. */
export async function sign(garage: Garage, joint: Joint, overrides: object = {}) {
  return ok(garage.technician.put(`/sign-offs/${uuidv7()}`, { ...joint.body, ...overrides }))
}
