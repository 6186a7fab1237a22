import { randomInt } from 'node:crypto'
import { createServer, type Server } from 'node:http'
import { createApp, createRouter, defineEventHandler, type EventHandler, toNodeListener } from 'h3'
import supertest from 'supertest'
import { afterAll, beforeAll } from 'vitest'
import { errorAnswer } from '#shared/schemas/errors'
import type { Actor } from '../../../server/context'
import { contracts } from '../../../server/contract'
import gate from '../../../server/middleware/gate'
import { beginSession } from '../../../server/services/people/sessions'
import { keepSession } from '../../../server/utils/session'

type Method = 'GET' | 'POST' | 'PUT' | 'PATCH'
const files = import.meta.glob<{ default: EventHandler }>('../../../server/api/**/*.ts', { eager: true })

/** The method and h3 path of a route file, after Nitro's rules. */
export function routeOf(file: string): { method: Method | null, path: string } {
  const name = file.replace(/^.*server\/api/, '').replace(/\.ts$/, '')
  const method = /\.(get|post|put|patch)$/.exec(name)?.[1]
  const path = name.replace(/\.(get|post|put|patch)$/, '').replace(/\/index$/, '').replace(/\[\.\.\.\]/, '**').replace(/\[(\w+)\]/g, ':$1')
  const methods: Record<string, Method> = { get: 'GET', post: 'POST', put: 'PUT', patch: 'PATCH' }
  return { method: method ? methods[method] ?? null : null, path: `/api${path}` }
}

function buildApp() {
  const app = createApp()
  app.use(gate)
  const router = createRouter()
  // Opens a session without a passphrase's slow hash; sign-in itself is tested through its own route.
  router.post('/test/session', defineEventHandler(async (event) => {
    await keepSession(event, String(event.node.req.headers['x-session-id']))
    return { sealed: true }
  }))
  for (const [file, { default: handler }] of Object.entries(files)) {
    const { method, path } = routeOf(file)
    if (method === 'GET') router.get(path, handler)
    else if (method === 'POST') router.post(path, handler)
    else if (method === 'PUT') router.put(path, handler)
    else if (method === 'PATCH') router.patch(path, handler)
    else router.use(path, handler)
  }
  return app.use(router)
}

/** Holds an answer against the contract of its route: an answer that the description does not promise fails the test. */
export function holdToContract(method: string, url: string, status: number, body: unknown): void {
  const path = url.split('?')[0]?.replace(/^\/api/, '') ?? ''
  const contract = contracts.find(route => route.method === method && new RegExp(`^${route.path.replace(/:\w+/g, '[^/]+')}$`).test(path))
  if (status >= 500 && status !== 503) throw new Error(`${method} ${url} answered ${status}: ${JSON.stringify(body)}`)
  const schema = status < 400 ? contract?.answer : errorAnswer
  if (!schema) return
  const result = schema.safeParse(body)
  if (!result.success && !isReport(body)) {
    throw new Error(`${method} ${url} answered ${status} against its contract: ${JSON.stringify(result.error.issues, null, 1)}`)
  }
}
/** A refused import answers its report beside the refusal. */
const isReport = (body: unknown) => typeof body === 'object' && body !== null && 'rows' in body && Array.isArray(body.rows)

/** A caller of the API: nobody, or a signed-in person. */
export class Caller {
  /** An address of its own, so that one test's failed sign-ins never stop another's. */
  private readonly address = `10.${randomInt(256)}.${randomInt(256)}.${randomInt(256)}`

  constructor(private readonly server: Server, private readonly cookie: string | null) {}

  private async send(method: Method, path: string, body?: unknown, headers: Record<string, string> = {}) {
    const url = path.startsWith('/api') ? path : `/api${path}`
    const agent = supertest(this.server)
    const start = { GET: agent.get(url), POST: agent.post(url), PUT: agent.put(url), PATCH: agent.patch(url) }[method]
    if (this.cookie) start.set('Cookie', this.cookie)
    start.set({ 'X-Forwarded-For': this.address, ...headers })
    if (body !== undefined) start.send(typeof body === 'string' ? body : JSON.stringify(body))
    if (body !== undefined && !headers['Content-Type']) start.set('Content-Type', 'application/json')
    const answer = await start
    holdToContract(method, url, answer.status, answer.body)
    return answer
  }

  get = (path: string, headers?: Record<string, string>) => this.send('GET', path, undefined, headers)
  post = (path: string, body: unknown = {}, headers?: Record<string, string>) => this.send('POST', path, body, headers)
  put = (path: string, body: unknown = {}, headers?: Record<string, string>) => this.send('PUT', path, body, headers)
  patch = (path: string, body: unknown = {}, headers?: Record<string, string>) => this.send('PATCH', path, body, headers)
}

/** The server's own routes on a loopback port, without a build. Needs `useDatabase()` before it. */
export function useApi() {
  let server: Server
  beforeAll(async () => {
    server = createServer(toNodeListener(buildApp()))
    await new Promise<void>(resolve => server.listen(0, '127.0.0.1', resolve))
  })
  afterAll(async () => {
    await new Promise(resolve => server.close(resolve))
  })
  return {
    nobody: () => new Caller(server, null),
    /** Signed in as a person. */
    async as(actor: Actor): Promise<Caller> {
      const sessionId = await beginSession(actor, 'test', new Date())
      const answer = await supertest(server).post('/test/session').set('X-Session-Id', sessionId)
      return new Caller(server, String(answer.headers['set-cookie']).split(';')[0] ?? '')
    },
  }
}
