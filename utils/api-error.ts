import * as z from 'zod/mini'
import { errorAnswer, type Issue } from '#shared/schemas/errors'

/** What stands in `data` of every refusal; the rest belongs to its code, such as `triesLeft`. */
export type RefusalData = z.infer<typeof errorAnswer>['data']

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

const carried = z.object({ statusCode: z.number(), message: z.string(), data: errorAnswer.shape.data })
const answered = z.object({ data: errorAnswer })
const failed = z.object({ statusCode: z.number() })

/** Reads whatever a request threw, or Nuxt carried over from the server, as an ApiError. */
export function toApiError(error: unknown): ApiError {
  if (error instanceof ApiError) return error
  const answer = answered.safeParse(error)
  if (answer.success) return new ApiError(answer.data.data.statusCode, answer.data.data.message, answer.data.data.data)
  const known = carried.safeParse(error)
  if (known.success) return new ApiError(known.data.statusCode, known.data.message, known.data.data)
  const status = failed.safeParse(error)
  if (status.success) return new ApiError(status.data.statusCode, 'Something failed on our side. Nothing was saved.', { code: 'server_error' })
  return new ApiError(0, unreachable, { code: 'unreachable' })
}
