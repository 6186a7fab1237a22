import type * as z from 'zod/mini'
import { sayIssue } from '#shared/schemas/messages'
import { ApiError } from './api-error'

/**
 * Reads a form with the schema the route uses, before anything is sent.
 * @throws ApiError 400 `invalid` with every issue, exactly as the server would refuse it
 */
export function parseBody<S extends z.ZodMiniType>(schema: S, value: unknown): z.output<S> {
  const result = schema.safeParse(value, { error: sayIssue })
  if (result.success) return result.data
  const issues = result.error.issues.map(({ path, message, code }) => ({ path: path.join('.'), message, code }))
  throw new ApiError(400, issues[0]?.message ?? 'The form is not complete.', { code: 'invalid', issues })
}
