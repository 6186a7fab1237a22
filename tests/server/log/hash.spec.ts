import { createHash } from 'node:crypto'
import { describe, expect, it } from 'vitest'
import {
  canonicalJson, entryHash, firstPreviousHash, type HashedRecord, readCanonical, verifyChain,
} from '../../../server/services/log/hash'

const shopId = '018f2f6e-5d3b-7c1a-9f00-000000000001'
const subject = '018f2f6e-5d3b-7c1a-9f00-000000000002'
const actor = '018f2f6e-5d3b-7c1a-9f00-000000000003'

function chainOf(length: number): HashedRecord[] {
  const chain: HashedRecord[] = []
  for (let sequence = 1; sequence <= length; sequence++) {
    const previousHash = chain.at(-1)?.hash ?? firstPreviousHash
    const at = `2026-11-02T08:30:00.${String(sequence).padStart(3, '0')}Z`
    const entry = {
      sequence, shopId, kind: 'sign_off.record', subject, actor, at, content: { nm: 100 + sequence }, previousHash,
    }
    chain.push({ ...entry, hash: entryHash(entry) })
  }
  return chain
}

/** The chain with entry `sequence` changed, its own hash kept. */
const changed = (sequence: number, change: Partial<HashedRecord>) =>
  chainOf(5).map(entry => entry.sequence === sequence ? { ...entry, ...change } : entry)

describe('the hash of a log entry', () => {
  const entry = {
    sequence: 1, shopId, kind: 'sign_off.record', subject, actor: null, at: '2026-11-02T08:30:00.000Z',
    content: { unit: 'N.m', value: 4.50, note: 'größer' }, previousHash: firstPreviousHash,
  }

  it('is SHA-256 of the UTF-8 of the canonical JSON, written out here by hand', () => {
    const text = '{"actor":null,"at":"2026-11-02T08:30:00.000Z","content":{"note":"größer","unit":"N.m","value":4.5},'
      + `"kind":"sign_off.record","previousHash":"${'0'.repeat(64)}","sequence":1,"shopId":"${shopId}",`
      + `"subject":"${subject}"}`
    expect(entryHash(entry)).toBe(createHash('sha256').update(Buffer.from(text, 'utf8')).digest('hex'))
  })

  it('does not depend on the order of keys, nor on its own place in the record', () => {
    const reversed = Object.fromEntries(Object.entries(entry.content).reverse())
    expect(entryHash({ ...entry, content: reversed })).toBe(entryHash(entry))
    expect(entryHash(Object.assign({ hash: 'f'.repeat(64) }, entry))).toBe(entryHash(entry))
  })

  it('refuses what has no JSON', () => {
    for (const content of [undefined, Number.NaN, Number.POSITIVE_INFINITY, { nested: [Number.NaN] }]) {
      expect(() => canonicalJson(content)).toThrow()
    }
  })
})

// The examples of RFC 8785, sections 3.2.2 and 3.2.3.
describe('canonical JSON', () => {
  it('writes numbers, texts and literals as the RFC does', () => {
    const text = String.raw`{
      "numbers": [333333333.33333329, 1E30, 4.50, 2e-3, 0.000000000000000000000000001],
      "string": "\u20ac$\u000F\u000aA'\u0042\u0022\u005c\\\"\/",
      "literals": [null, true, false]
    }`
    expect(canonicalJson(JSON.parse(text))).toBe(
      '{"literals":[null,true,false],"numbers":[333333333.3333333,1e+30,4.5,0.002,1e-27],'
      + '"string":"€$\\u000f\\nA\'B\\"\\\\\\\\\\"/"}',
    )
  })

  it('sorts keys by UTF-16 code units', () => {
    const value = {
      '\u20ac': 'Euro Sign', '\r': 'Carriage Return', '\ufb33': 'Hebrew Letter Dalet With Dagesh', '1': 'One',
      '\ud83d\ude00': 'Emoji: Grinning Face', '\u0080': 'Control', '\u00f6': 'Latin Small Letter O With Diaeresis',
    }
    const order = ['\r', '1', '\u0080', '\u00f6', '\u20ac', '\ud83d\ude00', '\ufb33']
    const places = order.map(key => canonicalJson(value).indexOf(`${JSON.stringify(key)}:`))
    expect(places.every(place => place > 0)).toBe(true)
    expect(places).toEqual([...places].sort((a, b) => a - b))
  })

  it('is the only text that is read back as a value', () => {
    expect(readCanonical('{"a":1,"b":[2]}')).toEqual({ a: 1, b: [2] })
    for (const text of ['{"b":[2],"a":1}', '{"a": 1}', '{"a":1.0}', '{', '']) expect(readCanonical(text)).toBe(text)
  })
})

describe('a chain', () => {
  it('is intact as it was written, empty or not', async () => {
    expect(await verifyChain([])).toEqual({ ok: true, head: { sequence: 0, hash: firstPreviousHash } })
    const chain = chainOf(5)
    expect(await verifyChain(chain)).toEqual({ ok: true, head: { sequence: 5, hash: chain[4]?.hash } })
  })

  it.each<[string, Partial<HashedRecord>]>([
    ['content', { content: { nm: 103.1 } }],
    ['kind', { kind: 'sign_off.void' }],
    ['subject', { subject: actor }],
    ['actor', { actor: subject }],
    ['actor, taken away', { actor: null }],
    ['time', { at: '2026-11-02T08:30:00.004Z' }],
    ['shop', { shopId: subject }],
    ['hash', { hash: 'a'.repeat(64) }],
  ])('shows a changed %s', async (_what, change) => {
    expect(await verifyChain(changed(3, change))).toEqual({ ok: false, brokenAt: 3, why: 'hash' })
  })

  it('shows a changed entry whose hash was made anew, at the one after it', async () => {
    const [entry] = changed(3, { content: { nm: 1 } }).slice(2)
    if (!entry) throw new Error('The chain is too short.')
    const forged = changed(3, { ...entry, hash: entryHash(entry) })
    expect(await verifyChain(forged)).toEqual({ ok: false, brokenAt: 4, why: 'previous_hash' })
  })

  it('shows a changed order, an entry twice and one that is gone', async () => {
    const [one, two, three, four, five] = chainOf(5)
    if (!one || !two || !three || !four || !five) throw new Error('The chain is too short.')
    expect(await verifyChain([one, three, two, four, five])).toEqual({ ok: false, brokenAt: 2, why: 'sequence' })
    expect(await verifyChain([one, two, two, three])).toEqual({ ok: false, brokenAt: 3, why: 'sequence' })
    expect(await verifyChain([one, two, four, five])).toEqual({ ok: false, brokenAt: 3, why: 'sequence' })
    expect(await verifyChain([two, three])).toEqual({ ok: false, brokenAt: 1, why: 'sequence' })
    const renumbered = [one, { ...three, sequence: 2 }, { ...two, sequence: 3 }]
    expect(await verifyChain(renumbered)).toEqual({ ok: false, brokenAt: 2, why: 'previous_hash' })
  })
})
