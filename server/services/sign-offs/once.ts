import { createHash } from 'node:crypto'
import { conflict } from '../../refusal'
import { canonicalJson } from '../log/hash'

/** The content of a signed body: without what only proves who sent it. */
export function contentOf<Body extends { pin?: unknown, deviceSignature?: unknown }>(body: Body): Omit<Body, 'pin' | 'deviceSignature'> {
  const { pin, deviceSignature, ...content } = body
  return content
}

/** SHA-256 of the canonical JSON (RFC 8785) of what was signed. */
export const contentHash = (content: unknown) => createHash('sha256').update(canonicalJson(content)).digest('hex')

/**
 * The same id again: the first answer to the same content from the same person, or a conflict.
 * @throws Refusal 409 `id_taken`
 */
export function answerAgain<Answer>(existing: { contentHash: string, answer: Answer }, samePerson: boolean, hash: string): Answer {
  if (samePerson && existing.contentHash === hash) return existing.answer
  throw conflict('id_taken', 'This id is already used by another record. Nothing was changed.')
}
