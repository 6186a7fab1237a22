import type { ErrorAnswer, Issue } from '#shared/schemas/errors'

/** What stands in `data` of every refusal; the rest belongs to its code, such as `triesLeft`. */
export type RefusalData = ErrorAnswer['data']

/** The server did not answer at all. */
const unreachable = 'The server did not answer. Nothing was saved; what you entered is still here. Try again.'

/** A refusal of the API, or its silence (status 0, code `unreachable`). `message` is in words for a person. */
export class ApiError extends Error {
  override readonly name = 'ApiError'
  readonly code: string
  readonly issues: readonly Issue[]

  constructor(
    /** HTTP status; 0 without an answer. */
    readonly status: number,
    message: string,
    readonly data: RefusalData,
  ) {
    super(message)
    this.code = data.code
    this.issues = data.issues ?? []
  }

  /** Nuxt reads this name when it carries an error from the server to the browser. */
  get statusCode() {
    return this.status
  }

  /** Minutes to wait before the next try, begun minutes counting as one; null where it does not matter. */
  get retryMinutes() {
    const { retryAfterSeconds } = this.data
    return typeof retryAfterSeconds === 'number' ? Math.max(1, Math.ceil(retryAfterSeconds / 60)) : null
  }

  /** Wrong PINs left before it is locked; null where it was not about a PIN. */
  get triesLeft() {
    const { triesLeft } = this.data
    return typeof triesLeft === 'number' ? triesLeft : null
  }
}

// Looked at by hand: every page reads errors, and the bay's tablets are not to load a schema library for it.
const at = (value: unknown, name: string): unknown => typeof value === 'object' && value !== null ? Reflect.get(value, name) : undefined

function isRefusalData(data: unknown): data is RefusalData {
  const issues = at(data, 'issues')
  return typeof at(data, 'code') === 'string' && (issues === undefined || Array.isArray(issues))
}

/** An error in the one shape of every refusal, whether it just came or was carried from the server to the browser. */
function readRefusal(error: unknown): ApiError | null {
  const [status, message, data] = [at(error, 'statusCode'), at(error, 'message'), at(error, 'data')]
  return typeof status === 'number' && typeof message === 'string' && isRefusalData(data) ? new ApiError(status, message, data) : null
}

/** Reads whatever a request threw, or Nuxt carried over from the server, as an ApiError. */
export function toApiError(error: unknown): ApiError {
  if (error instanceof ApiError) return error
  const refusal = readRefusal(at(error, 'data')) ?? readRefusal(error)
  if (refusal) return refusal
  const status = at(error, 'statusCode')
  if (typeof status === 'number') return new ApiError(status, 'Something failed on our side. Nothing was saved.', { code: 'server_error' })
  return new ApiError(0, unreachable, { code: 'unreachable' })
}
