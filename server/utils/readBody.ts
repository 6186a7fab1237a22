import { type H3Event, getRequestHeader } from 'h3'
import { invalid, Refusal } from '../refusal'

const MEGABYTE = 1_000_000

/**
 * Reads the text of a request's body up to a limit; h3 itself has none.
 * @throws Refusal 413 when it is larger, 415 when it is another type
 */
export async function readLimitedBody(event: H3Event, accepts: 'application/json' | 'text/csv', maxBytes = MEGABYTE): Promise<string> {
  const tooLarge = () => new Refusal(413, 'too_large', `Send at most ${maxBytes / MEGABYTE} MB.`)
  if (Number(getRequestHeader(event, 'content-length') ?? 0) > maxBytes) throw tooLarge()
  const type = (getRequestHeader(event, 'content-type') ?? '').split(';')[0]?.trim().toLowerCase()
  const chunks: Buffer[] = []
  let size = 0
  for await (const chunk of bodyOf(event)) {
    size += chunk.length
    if (size > maxBytes) throw tooLarge()
    chunks.push(chunk)
  }
  if (type !== accepts && !(size === 0 && type === '')) {
    throw new Refusal(415, 'media_type', `Send the body as ${accepts}.`)
  }
  return Buffer.concat(chunks).toString('utf8')
}

/** The JSON of a body; nothing at all is an empty object. @throws Refusal 400 when it is not JSON */
export function parseJson(text: string): unknown {
  if (text.trim() === '') return {}
  try {
    return JSON.parse(text)
  } catch {
    throw invalid([{ path: '', message: 'The body is not valid JSON.' }])
  }
}

/** The bytes of the request, whether it came over a socket or from the server's own rendering. */
async function* bodyOf(event: H3Event): AsyncGenerator<Buffer> {
  const given = 'body' in event.node.req ? event.node.req.body : undefined
  if (given !== undefined && given !== null) {
    yield Buffer.from(typeof given === 'string' || given instanceof Uint8Array ? given : JSON.stringify(given))
    return
  }
  for await (const chunk of event.node.req) yield Buffer.from(chunk)
}
