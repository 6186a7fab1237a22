import { createHash } from 'node:crypto'
import canonicalize from 'canonicalize'

/** What the hash of a log entry covers. */
export interface LogRecord {
  /** From 1, without gaps, in its shop. */
  sequence: number
  shopId: string
  /** `<resource>.<verb>` */
  kind: string
  /** Id of the record it is about. */
  subject: string
  /** The person who did it; null where the product did it itself. */
  actor: string | null
  /** ISO 8601 in UTC, with milliseconds and Z. */
  at: string
  /** The JSON value of what was recorded. */
  content: unknown
  /** Hash of the entry before; 64 zeros before the first. */
  previousHash: string
}

/** A log entry as it is kept. */
export interface HashedRecord extends LogRecord {
  hash: string
}

/** What stands for the entry before the first one. */
export const firstPreviousHash = '0'.repeat(64)

/**
 * The canonical JSON of a value. Source: RFC 8785.
 * @throws Error when the value has no JSON (undefined, a function, NaN, an infinity)
 */
export function canonicalJson(value: unknown): string {
  const text = canonicalize(value)
  if (text === undefined) throw new Error('This value has no JSON.')
  return text
}

/** The value of a canonical text; any other text is a mere string, so that no hash ever fits it. */
export function readCanonical(text: string): unknown {
  try {
    const value: unknown = JSON.parse(text)
    return canonicalJson(value) === text ? value : text
  } catch {
    return text
  }
}

/**
 * Lower-case hex SHA-256 of the UTF-8 of the entry's canonical JSON, its own hash left out.
 * Source: FIPS 180-4, RFC 8785.
 */
export function entryHash(entry: LogRecord): string {
  const { sequence, shopId, kind, subject, actor, at, content, previousHash } = entry
  const text = canonicalJson({ sequence, shopId, kind, subject, actor, at, content, previousHash })
  return createHash('sha256').update(text, 'utf8').digest('hex')
}

/** Where a log stands: number and hash of its last entry. */
export interface LogHead {
  sequence: number
  hash: string
}

/** What is wrong with the first broken entry. */
export type ChainFault
  /** An entry before it is missing, or the order is another. */
  = | 'sequence'
    /** It does not follow from the entry before. */
    | 'previous_hash'
    /** Something in it was changed. */
    | 'hash'

export type ChainCheck
  = | { ok: true, head: LogHead }
    | { ok: false, brokenAt: number, why: ChainFault }

/** Walks a log from its first entry and recomputes it. `brokenAt` is the place, from 1, of the first broken entry. */
export async function verifyChain(
  entries: Iterable<HashedRecord> | AsyncIterable<HashedRecord>,
): Promise<ChainCheck> {
  let head: LogHead = { sequence: 0, hash: firstPreviousHash }
  for await (const entry of entries) {
    const brokenAt = head.sequence + 1
    if (entry.sequence !== brokenAt) return { ok: false, brokenAt, why: 'sequence' }
    if (entry.previousHash !== head.hash) return { ok: false, brokenAt, why: 'previous_hash' }
    if (entryHash(entry) !== entry.hash) return { ok: false, brokenAt, why: 'hash' }
    head = { sequence: entry.sequence, hash: entry.hash }
  }
  return { ok: true, head }
}
