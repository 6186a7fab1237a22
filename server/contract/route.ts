import type * as z from 'zod/mini'
import type { Role } from '#shared/types/roles'

type Schema = z.ZodMiniType
/** What a route promises: the OpenAPI description, the checks of a request and the tests of answers are all made from it. */
export interface RouteContract {
  method: 'GET' | 'POST' | 'PUT' | 'PATCH'
  /** Below /api, with `:id` for parameters. */
  path: string
  summary: string
  /** Who may ever call it; 'public' needs no session. */
  policy: { name: string, roles: readonly Role[] } | 'public'
  params?: Schema
  query?: Schema
  body?: Schema
  answer: Schema
  /** Its first success answers 201. */
  made?: boolean
  /** 'none' for what changes nothing in the shop's records. */
  transaction?: 'none'
  /** What the body is; JSON unless said. */
  accepts?: 'text/csv'
  /** Bytes of the largest body; 1 MB unless said. */
  maxBytes?: number
  /** Statuses it may refuse with besides 400, 401, 403, 404. */
  refuses?: readonly number[]
}

/** Keeps the exact types of a contract. */
export const contract = <const C extends RouteContract>(route: C): C => route
