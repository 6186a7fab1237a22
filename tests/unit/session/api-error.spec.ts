import { describe, expect, it } from 'vitest'
import { signInBody } from '#shared/schemas/auth'
import { ApiError, toApiError } from '../../../utils/api-error'
import { parseBody } from '../../../utils/parse-body'

const body = {
  statusCode: 403, statusMessage: 'Forbidden', message: 'That is not your PIN; 2 tries are left.',
  data: { code: 'wrong_pin', triesLeft: 2, issues: [{ path: 'pin', message: 'Wrong PIN; 2 tries are left.' }] },
}

describe('toApiError', () => {
  it('reads a refusal of the server with all it carries', () => {
    const error = toApiError(Object.assign(new Error('403'), { statusCode: 403, data: body }))
    expect(error).toMatchObject({ status: 403, code: 'wrong_pin', message: body.message, triesLeft: 2 })
    expect(error.issues).toEqual(body.data.issues)
  })

  it('reads what travelled from server to browser the same', () => {
    expect(toApiError({ statusCode: 403, message: body.message, data: body.data }))
      .toMatchObject({ status: 403, code: 'wrong_pin', triesLeft: 2 })
  })

  it('takes silence as unreachable and says that nothing was saved', () => {
    const error = toApiError(new TypeError('fetch failed'))
    expect(error).toMatchObject({ status: 0, code: 'unreachable' })
    expect(error.message).toContain('Nothing was saved')
  })

  it('keeps the status of an answer in a shape of its own', () => {
    expect(toApiError(Object.assign(new Error('bad'), { statusCode: 502, data: '<html>' }))).toMatchObject({ status: 502, code: 'server_error' })
  })

  it('gives itself back', () => {
    const error = new ApiError(409, 'Taken.', { code: 'id_taken' })
    expect(toApiError(error)).toBe(error)
  })
})

it.each([[1, 1], [60, 1], [61, 2], [899, 15]])('waits %i s as %i min', (retryAfterSeconds, minutes) => {
  expect(new ApiError(429, 'Too many.', { code: 'too_many', retryAfterSeconds }).retryMinutes).toBe(minutes)
})

it('has no minutes to wait where the server names none', () => {
  expect(new ApiError(401, 'No.', { code: 'bad_credentials' }).retryMinutes).toBeNull()
})

describe('parseBody', () => {
  it('answers what the schema reads', () => {
    expect(parseBody(signInBody, { email: ' A@B.example ', password: 'x' })).toEqual({ email: 'a@b.example', password: 'x' })
  })

  it('refuses with every issue at its field', () => {
    let thrown: unknown
    try {
      parseBody(signInBody, { email: '', password: '' })
    } catch (error) {
      thrown = error
    }
    expect(toApiError(thrown)).toMatchObject({ status: 400, code: 'invalid' })
    expect(toApiError(thrown).issues.map(issue => issue.path)).toEqual(['email', 'password'])
  })
})
