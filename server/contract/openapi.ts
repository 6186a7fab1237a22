import * as z from 'zod/mini'
import { errorAnswer } from '#shared/schemas/errors'
import { contracts } from './index'
import type { RouteContract } from './route'

const schemaOf = (schema: z.ZodMiniType, io: 'input' | 'output') => z.toJSONSchema(schema, { target: 'openapi-3.0', io, unrepresentable: 'any' })

const statuses: Record<number, string> = {
  400: 'Malformed', 401: 'Not signed in', 403: 'Not yours to do', 404: 'Not there', 409: 'Conflict', 413: 'Too large',
  415: 'Wrong media type', 422: 'Refused by a rule', 429: 'Too many tries', 503: 'Database away',
}

function parameters(place: 'path' | 'query', schema: z.ZodMiniType | undefined) {
  if (!schema) return []
  const { properties = {}, required = [] } = schemaOf(schema, 'input')
  return Object.entries(properties).map(([name, property]) => ({
    name, in: place, required: place === 'path' || required.includes(name), schema: property,
  }))
}

function refusalsOf(route: RouteContract): number[] {
  return [
    ...(route.policy === 'public' ? [] : [401, 403]), ...(route.body || route.query ? [400] : []), ...(route.params ? [404] : []),
    ...(route.body || route.accepts ? [413, 415] : []), ...(route.refuses ?? []),
  ]
}

/** One operation as OpenAPI 3.0 describes it. */
function describe(route: RouteContract) {
  const json = (schema: z.ZodMiniType) => ({ 'application/json': { schema: schemaOf(schema, 'output') } })
  const refusals = [...new Set(refusalsOf(route))].sort((a, b) => a - b)
  return {
    summary: route.summary,
    operationId: `${route.method.toLowerCase()}${route.path.replace(/[^a-zA-Z0-9]+(.)?/g, (_, letter: string = '') => letter.toUpperCase())}`,
    description: route.policy === 'public' ? 'Needs no session.' : `Roles: ${route.policy.roles.join(', ')}.`,
    security: route.policy === 'public' ? [] : [{ session: [] }],
    parameters: [...parameters('path', route.params), ...parameters('query', route.query)],
    ...(route.body || route.accepts
      ? { requestBody: { required: true, content: { [route.accepts ?? 'application/json']: { schema: route.body ? schemaOf(route.body, 'input') : { type: 'string' } } } } }
      : {}),
    responses: {
      ...(route.made || route.method === 'PUT' ? { 201: { description: 'Made', content: json(route.answer) } } : {}),
      ...(route.made && route.method !== 'PUT' ? {} : { 200: { description: 'Done', content: json(route.answer) } }),
      ...Object.fromEntries(refusals.map(status => [status, { description: statuses[status] ?? 'Refused', content: json(errorAnswer) }])),
    },
  }
}

let described: object | undefined

/** The OpenAPI 3.0 description of the whole API, made from the contracts that the routes themselves are made from. */
export function describeApi(): object {
  described ??= {
    openapi: '3.0.3',
    info: { title: 'Jamnut', version: '1', description: 'Torque specs with their sources, sign-offs, wrenches and their calibration.' },
    servers: [{ url: '/api' }],
    components: { securitySchemes: { session: { type: 'apiKey', in: 'cookie', name: 'jamnut' } } },
    paths: contracts.reduce<Record<string, Record<string, object>>>((paths, route) => {
      const path = route.path.replace(/:(\w+)/g, '{$1}')
      return { ...paths, [path]: { ...paths[path], [route.method.toLowerCase()]: describe(route) } }
    }, {}),
  }
  return described
}
