import { type EventHandler, defineEventHandler, getQuery, getRouterParams, setResponseStatus } from 'h3'
import type * as z from 'zod/mini'
import type { Issue } from '#shared/schemas/errors'
import { sayIssue } from '#shared/schemas/messages'
import type { Context, ReadContext } from '../context'
import type { RouteContract } from '../contract/route'
import { database } from '../db'
import { roleMay } from '../policies/policy'
import { invalid, notFound, Refusal } from '../refusal'
import { answerRefusal, toRefusal } from './answer'
import { parseJson, readLimitedBody } from './readBody'

type Output<S> = S extends z.ZodMiniType ? z.output<S> : undefined
/** The body as its schema reads it; the text itself where it is not JSON. */
type BodyOf<C extends RouteContract> = C['accepts'] extends 'text/csv' ? string : Output<C['body']>

/** What a handler gets: the parts of the request, parsed. */
export interface RouteInput<C extends RouteContract> {
  params: Output<C['params']>
  query: Output<C['query']>
  body: BodyOf<C>
}
/** A mutation runs in one transaction; a read has none; a public route has nobody asking. */
type ContextOf<C extends RouteContract>
  = C['policy'] extends 'public' ? Pick<ReadContext, 'now' | 'requestId'>
    : C['method'] extends 'GET' ? ReadContext
      : C['transaction'] extends 'none' ? ReadContext : Context

/** An answer with a status of its own, where one route has two (first 201, then 200). */
export class Reply<Body> {
  constructor(readonly status: number, readonly body: Body) {}
}

type FormIssue = NonNullable<ReturnType<z.ZodMiniType['safeParse']>['error']>['issues'][number]

/** One issue of a form as the caller reads it; of a choice between forms those of the one that was nearly met. */
function issuesOf(issue: FormIssue, above: readonly PropertyKey[] = []): Issue[] {
  const path = [...above, ...issue.path]
  if (issue.code === 'unrecognized_keys') {
    return issue.keys.map(key => ({ path: [...path, key].map(String).join('.'), message: 'This field is not known.', code: issue.code }))
  }
  if (issue.code === 'invalid_union') {
    const [nearest] = issue.errors.toSorted((one, other) => one.length - other.length)
    if (nearest && nearest.length > 0) return nearest.flatMap(inner => issuesOf(inner, path))
  }
  return [{ path: path.map(String).join('.'), message: issue.message, code: issue.code }]
}

function parse(schema: z.ZodMiniType, value: unknown) {
  const result = schema.safeParse(value, { error: sayIssue })
  if (result.success) return result.data
  throw invalid(result.error.issues.flatMap(issue => issuesOf(issue)))
}

/**
 * Makes a route from its contract and one service call. In this order: session, body size and type, role, form,
 * then the handler inside its transaction; whatever is thrown becomes one refusal in the one shape.
 */
export function defineRoute<const C extends RouteContract>(
  route: C,
  handle: (ctx: ContextOf<C>, input: RouteInput<C>) => Promise<z.output<C['answer']> | Reply<z.output<C['answer']>>>,
): EventHandler {
  const run = async (ctx: unknown, input: unknown) => {
    // The contract has parsed the input and decided which context there is: the types are its own.
    return handle(ctx as ContextOf<C>, input as RouteInput<C>)
  }
  return defineEventHandler(async (event) => {
    const { actor, shop, requestId } = event.context
    try {
      if (route.policy !== 'public') {
        if (!actor || !shop) throw new Refusal(401, 'signed_out', 'Sign in first.')
      }
      const text = route.body || route.accepts ? await readLimitedBody(event, route.accepts ?? 'application/json', route.maxBytes) : ''
      if (route.policy !== 'public' && actor) {
        const decision = roleMay(actor.role, route.policy)
        if (!decision.allowed) throw new Refusal(403, decision.code, decision.message)
      }
      const query = route.query ? parse(route.query, getQuery(event)) : undefined
      const body = route.body ? parse(route.body, parseJson(text)) : text
      const params = route.params ? parseParams(route.params, getRouterParams(event)) : undefined
      const input = { params, query, body }
      const ctx = { actor, shop, now: new Date(), requestId, tx: null }
      const needsTransaction = route.method !== 'GET' && route.transaction !== 'none' && route.policy !== 'public'
      const result = needsTransaction
        ? await database().transaction(tx => run({ ...ctx, tx }, input))
        : await run(ctx, input)
      const reply = result instanceof Reply ? result : new Reply(route.made ? 201 : 200, result)
      setResponseStatus(event, reply.status)
      return reply.body
    } catch (error) {
      const refusal = toRefusal(error, { requestId, shopId: shop?.id, actorId: actor?.id, route: `${route.method} ${route.path}` })
      return answerRefusal(event, refusal)
    }
  })
}

/** A malformed id names nothing: 404, not 400. */
function parseParams(schema: z.ZodMiniType, params: Record<string, string>) {
  const result = schema.safeParse(params)
  if (!result.success) throw notFound('What you asked for')
  return result.data
}
