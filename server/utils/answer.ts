import { type H3Event, setResponseHeader, setResponseStatus } from 'h3'
import { BaseError, DatabaseError, ForeignKeyConstraintError, UniqueConstraintError } from 'sequelize'
import type { ErrorAnswer } from '#shared/schemas/errors'
import { conflict, invalid, Refusal } from '../refusal'
import { logger } from './logger'

const statusNames: Record<number, string> = {
  400: 'Bad Request', 401: 'Unauthorized', 403: 'Forbidden', 404: 'Not Found', 405: 'Method Not Allowed', 409: 'Conflict',
  413: 'Content Too Large', 415: 'Unsupported Media Type', 422: 'Unprocessable Content', 429: 'Too Many Requests',
  500: 'Internal Server Error', 503: 'Service Unavailable',
}

/** What the database refused, in our words, where that is the caller's doing: the one place that knows SQLSTATE. */
function fromDatabase(error: BaseError): Refusal | null {
  if (error instanceof UniqueConstraintError) {
    const path = error.errors.map(item => item.path).find(item => item !== null && item !== 'shop_id') ?? ''
    const message = 'There is one with this already.'
    return conflict('id_taken', message, { issues: [{ path: camel(path), message }] })
  }
  if (error instanceof ForeignKeyConstraintError) return new Refusal(422, 'unknown_reference', 'It refers to something that is not there.')
  if (error instanceof DatabaseError && 'code' in error.parent) {
    if (error.parent.code === '40P01' || error.parent.code === '40001') {
      return conflict('busy', 'Somebody else changed this at the same moment. Nothing was saved: try again.')
    }
    // Character zero, which no text column holds.
    if (error.parent.code === '22021' || error.parent.code === '22P05') {
      return invalid([{ path: '', message: 'There is a character in it that cannot be kept.' }])
    }
  }
  return null
}

const camel = (name: string) => name.replace(/_([a-z])/g, (_, letter: string) => letter.toUpperCase())

/** Turns whatever was thrown into a refusal; what nobody foresaw is logged whole and answered as a bare 500. */
export function toRefusal(error: unknown, about: Record<string, unknown>): Refusal {
  if (error instanceof Refusal) return error
  const known = error instanceof BaseError ? fromDatabase(error) : null
  if (known) return known
  logger.error({ ...about, err: error }, 'a request failed')
  return new Refusal(500, 'server_error', 'Something failed on our side. Nothing was saved.')
}

/** Answers a refusal in the one shape all errors have. */
export function answerRefusal(event: H3Event, refusal: Refusal): ErrorAnswer {
  setResponseStatus(event, refusal.status, statusNames[refusal.status])
  const { retryAfterSeconds, rows } = refusal.detail
  if (typeof retryAfterSeconds === 'number') setResponseHeader(event, 'Retry-After', retryAfterSeconds)
  return {
    statusCode: refusal.status,
    statusMessage: statusNames[refusal.status] ?? 'Error',
    message: refusal.message,
    data: { code: refusal.code, ...refusal.detail },
    // A refused import answers its report where a successful one does, too.
    ...(rows === undefined ? {} : { rows }),
  }
}
