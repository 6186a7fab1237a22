import type { Issue } from '#shared/schemas/errors'

/** What a refusal carries to the caller besides its words. */
export interface RefusalDetail {
  issues?: Issue[]
  [extra: string]: unknown
}

/**
 * A request understood and refused: the one way a service or policy says no.
 * The route wrapper turns it into an HTTP answer; jobs, seeds and tests read it as it is.
 */
export class Refusal extends Error {
  override readonly name = 'Refusal'

  constructor(
    readonly status: number,
    readonly code: string,
    message: string,
    readonly detail: RefusalDetail = {},
  ) {
    super(message)
  }
}

/** 400: a field is malformed. */
export const invalid = (issues: Issue[]) =>
  new Refusal(400, 'invalid', issues[0]?.message ?? 'The request is not in the expected form.', { issues })

/** 403: not theirs to do. */
export const forbidden = (code: string, message: string) => new Refusal(403, code, message)

/** 404: not there, or another shop's. */
export const notFound = (what: string) => new Refusal(404, 'not_found', `${what} is not there.`)

/** 409: somebody or something was first. */
export const conflict = (code: string, message: string, detail?: RefusalDetail) => new Refusal(409, code, message, detail)

/** 422: understood, and refused by a rule; `path` names the field it concerns. */
export const refused = (code: string, message: string, path?: string, detail: RefusalDetail = {}) =>
  new Refusal(422, code, message, path === undefined ? detail : { issues: [{ path, message, code }], ...detail })

/** 422: an id in the body that names nothing here. */
export const unknownReference = (path: string, what: string) => refused('unknown_reference', `${what} is not there.`, path)
