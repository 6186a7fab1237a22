import { randomUUID } from 'node:crypto'
import { describe, expect, it } from 'vitest'
import { roles, type Role } from '#shared/types/roles'
import type { Actor, Shop } from '../../../server/context'
import { LogEntry } from '../../../server/db/models/log-entry'
import { buildShop, buildUser } from '../../factories/shop'
import type { Caller, useApi } from './api'

export interface Ladder<Scene extends object> {
  api: ReturnType<typeof useApi>
  method: 'GET' | 'POST' | 'PUT' | 'PATCH'
  /** Below /api. `:id` (and any other `:name`) takes the value that the scene has under that name. */
  path: string
  /** The roles that may; every other role gets 403. */
  roles: readonly Role[]
  /** What must be there before the call, made anew for each rung in a fresh shop; `caller` is who will call. */
  scene?: (shop: Shop, caller: Actor) => Promise<Scene>
  /** A body that is accepted; text where the route takes CSV. */
  valid?: (scene: Scene) => object | string
  /** Values that must be refused, by the path of the field they are put at; `undefined` takes the field away. */
  spoil?: Record<string, readonly unknown[]>
  /** The same for parameters of the query. */
  spoilQuery?: Record<string, readonly string[]>
  /** The status of success: 201 for POST and PUT, else 200, unless said. */
  status?: number
  /** Kind of the log entry that success leaves; none where nothing is changed. */
  log?: string
  /** Where the answer says what the entry is about, if neither its `id` nor the scene's. */
  subject?: (answer: { rows: { id: string }[] }) => string
  accepts?: 'text/csv'
}

/** The same value with another one at a path such as `readings.0.value`; the objects on the way are copied. */
export function withValue(body: unknown, path: string, value: unknown): unknown {
  const [head = '', ...rest] = path.split('.')
  const inner: unknown = typeof body === 'object' && body !== null ? Reflect.get(body, head) : undefined
  const next = rest.length > 0 ? withValue(inner, rest.join('.'), value) : value
  if (Array.isArray(body)) return body.map((item: unknown, index) => index === Number(head) ? next : item)
  return { ...(typeof body === 'object' ? body : {}), [head]: next }
}

const say = (value: unknown) => (JSON.stringify(value) ?? 'nothing').slice(0, 60)

/** The rungs every route has: session, role, form, another shop's record, success with its log entry. */
export function ladder<Scene extends object = Record<string, never>>(route: Ladder<Scene>): void {
  const { method, roles: allowed, status = method === 'POST' || method === 'PUT' ? 201 : 200 } = route
  const [someRole] = allowed
  if (!someRole) throw new Error('A ladder needs a role that may.')
  const headers: Record<string, string> | undefined = route.accepts && { 'Content-Type': route.accepts }

  const addressOf = (scene: object) => route.path.replace(/:(\w+)/g, (_, name: string) => String(Reflect.get(scene, name)))
  const send = (caller: Caller, address: string, body?: unknown, other = headers) => method === 'GET'
    ? caller.get(address)
    : { POST: caller.post, PUT: caller.put, PATCH: caller.patch }[method](address, body, other)

  async function stage(role: Role = someRole ?? 'administrator') {
    const shop = await buildShop()
    const actor = await buildUser(shop, role)
    // Without `scene` the Scene is the empty default.
    const scene = await route.scene?.(shop, actor) ?? {} as Scene
    const entries = () => LogEntry.findAll({ where: { shopId: shop.id }, order: [['sequence', 'ASC']] })
    return { actor, scene, caller: await route.api.as(actor), address: addressOf(scene), body: route.valid?.(scene), entries }
  }

  describe(`${method} ${route.path}`, () => {
    it('without a session: 401', async () => {
      const { address, body } = await stage()
      const answer = await send(route.api.nobody(), address, body)
      expect([answer.status, answer.body.data.code]).toEqual([401, 'signed_out'])
    })

    const others = roles.filter(role => !allowed.includes(role))
    if (others.length > 0) it.each(others)('as %s: 403, whatever is sent', async (role) => {
      const { caller, address } = await stage(role)
      const answer = await send(caller, address, route.accepts ? 'anything' : { anything: true })
      expect([answer.status, answer.body.data.code]).toEqual([403, 'role'])
    })

    if (route.valid && !route.accepts) it('what is no JSON object of known fields: 400, or 415', async () => {
      const { caller, address, body } = await stage()
      expect((await send(caller, address, 'a=1', { 'Content-Type': 'application/x-www-form-urlencoded' })).status).toBe(415)
      for (const wrong of ['{', 'null', '[]', '"text"', '7']) expect((await send(caller, address, wrong)).status, wrong).toBe(400)
      const unknown = await send(caller, address, withValue(body, 'noSuchField', 1))
      expect([unknown.status, unknown.body.data.issues?.[0]?.path]).toEqual([400, 'noSuchField'])
    })

    it.each(Object.entries(route.spoil ?? {}))('%s spoiled: 400 beside it', async (path, values) => {
      const { caller, address, body, entries } = await stage()
      const before = (await entries()).length
      for (const value of values) {
        const answer = await send(caller, address, withValue(body, path, value))
        expect([answer.status, answer.body.data?.code], `${path}: ${say(value)}`).toEqual([400, 'invalid'])
        const paths = answer.body.data.issues.map((issue: { path: string }) => issue.path)
        expect(paths, `${path}: ${say(value)}`).toContain(path)
      }
      expect((await entries()).length, 'a refusal writes nothing').toBe(before)
    })

    it.each(Object.entries(route.spoilQuery ?? {}))('?%s spoiled: 400 beside it', async (name, values) => {
      const { caller, address, body } = await stage()
      for (const value of values) {
        const answer = await send(caller, `${address}?${new URLSearchParams({ [name]: value })}`, body)
        expect([answer.status, answer.body.data?.issues?.[0]?.path], value).toEqual([400, name])
      }
    })

    if (route.path.includes(':')) it('an id that is none: 404', async () => {
      const { caller, scene, body } = await stage()
      for (const id of ['7', 'x'.repeat(300), '%00', '../vehicles']) {
        const answer = await send(caller, addressOf({ ...scene, id: encodeURIComponent(id) }), body)
        expect([answer.status, answer.body.data.code], id).toEqual([404, 'not_found'])
      }
    })

    // A PUT makes the record: its id is not there before.
    if (route.path.includes(':') && method !== 'PUT') it('another shop\'s record, or none: 404', async () => {
      const { caller, scene, body } = await stage()
      const elsewhere = await stage()
      for (const address of [elsewhere.address, addressOf({ ...scene, id: randomUUID() })]) {
        const answer = await send(caller, address, body)
        expect([answer.status, answer.body.data.code]).toEqual([404, 'not_found'])
      }
    })

    it.each(allowed)(`as %s: ${status}`, async (role) => {
      const { actor, caller, scene, address, body, entries } = await stage(role)
      const before = (await entries()).length
      const answer = await send(caller, address, body)
      expect(answer.status, JSON.stringify(answer.body)).toBe(status)
      const made = (await entries()).slice(before)
      expect(made.map(entry => entry.kind)).toEqual(route.log ? [route.log] : [])
      for (const { actor: by, subject } of made) {
        expect(by).toBe(actor.id)
        expect([answer.body.id, Reflect.get(scene, 'id'), route.subject?.(answer.body)]).toContain(subject)
      }
    })
  })
}
