import { beforeEach, describe, expect, it } from 'vitest'
import { uuidv7 } from '#shared/ids/uuid'
import type { Actor, Shop } from '../../../server/context'
import { database } from '../../../server/db/index'
import { appendToLog, type Entry } from '../../../server/services/log/append'
import { firstPreviousHash } from '../../../server/services/log/hash'
import { listLog, logHead, verifyLog } from '../../../server/services/log/queries'
import { createVehicle } from '../../../server/services/vehicles/vehicles'
import { inTransaction } from '../../../server/transaction'
import { buildShop, buildUser } from '../../factories/shop'
import { useDatabase } from '../support/database'

const now = new Date('2026-11-02T08:30:00.250Z')
const subject = uuidv7()

describe('the log', () => {
  useDatabase()
  let shop: Shop
  let actor: Actor
  beforeEach(async () => {
    shop = await buildShop()
    actor = await buildUser(shop, 'foreman')
  })

  const append = (entry: Partial<Entry> = {}, at = now) => database().transaction(tx => appendToLog(
    { tx, actor, shop, now: at }, { kind: 'sign_off.record', subject, content: { nm: 120 }, ...entry },
  ))
  const list = (after = 0, limit = 100) => listLog({ shop, tx: null }, { after, limit })

  it('starts empty', async () => {
    expect(await logHead({ shop, tx: null })).toEqual({ sequence: 0, hash: firstPreviousHash, at: null })
    expect(await list()).toEqual({ items: [], next: null })
    expect(await verifyLog(shop.id)).toEqual({ ok: true, head: { sequence: 0, hash: firstPreviousHash } })
  })

  it('keeps who, what and when, each entry tied to the one before', async () => {
    const first = await append({ content: { z: 1, a: ['größer', null] } })
    const second = await append({ actor: null, kind: 'shop.open' }, new Date('2026-11-02T08:31:00Z'))
    expect(first).toMatchObject({ sequence: 1, previousHash: firstPreviousHash })
    expect(second).toMatchObject({ sequence: 2, previousHash: first.hash })
    expect((await list()).items).toEqual([
      {
        sequence: 1, shopId: shop.id, kind: 'sign_off.record', subject, actor: actor.id, at: '2026-11-02T08:30:00.250Z',
        content: { a: ['größer', null], z: 1 }, previousHash: firstPreviousHash, hash: first.hash,
      },
      {
        sequence: 2, shopId: shop.id, kind: 'shop.open', subject, actor: null, at: '2026-11-02T08:31:00.000Z',
        content: { nm: 120 }, previousHash: first.hash, hash: second.hash,
      },
    ])
    expect(await logHead({ shop, tx: null }))
      .toEqual({ sequence: 2, hash: second.hash, at: new Date('2026-11-02T08:31:00Z') })
  })

  it('is read in pages', async () => {
    for (let i = 0; i < 3; i++) await append()
    const first = await list(0, 2)
    expect(first.items.map(entry => entry.sequence)).toEqual([1, 2])
    expect(first.next).toBe(2)
    const second = await list(first.next ?? 0, 2)
    expect(second.items.map(entry => entry.sequence)).toEqual([3])
    expect(second.next).toBeNull()
  })

  it('takes no number for what was rolled back', async () => {
    await append()
    const failed = database().transaction(async (tx) => {
      await appendToLog({ tx, actor, shop, now }, { kind: 'sign_off.record', subject, content: {} })
      throw new Error('refused after all')
    })
    await expect(failed).rejects.toThrow('refused after all')
    expect((await append()).sequence).toBe(2)
    expect(await verifyLog(shop.id)).toMatchObject({ ok: true, head: { sequence: 2 } })
  })

  it('is one gapless chain when twenty write at once', async () => {
    const appended = await Promise.all(Array.from({ length: 20 }, (_, nm) => append({ content: { nm } })))
    const numbers = appended.map(entry => entry.sequence).sort((a, b) => a - b)
    expect(numbers).toEqual(Array.from({ length: 20 }, (_, i) => i + 1))
    expect(new Set(appended.map(entry => entry.previousHash)).size).toBe(20)
    const last = appended.find(entry => entry.sequence === 20)
    expect(await verifyLog(shop.id)).toEqual({ ok: true, head: { sequence: 20, hash: last?.hash } })
  })

  it('is each shop\'s own', async () => {
    await append()
    const other = await buildShop()
    const theirs = await buildUser(other, 'foreman')
    const entry = await database().transaction(tx => appendToLog(
      { tx, actor: theirs, shop: other, now }, { kind: 'shop.open', subject, content: null },
    ))
    expect(entry).toMatchObject({ sequence: 1, previousHash: firstPreviousHash })
    expect((await list()).items).toHaveLength(1)
  })

  it('refuses content without JSON and kinds that are no `<resource>.<verb>`', async () => {
    await expect(append({ content: undefined })).rejects.toThrow('no JSON')
    await expect(append({ content: { nm: Number.NaN } })).rejects.toThrow()
    await expect(append({ kind: 'Signed' })).rejects.toThrow(/check constraint/)
    expect(await list()).toEqual({ items: [], next: null })
  })

  it('lets services that insert before they append run side by side', async () => {
    const context = { actor, shop, now: new Date() }
    await Promise.all(Array.from({ length: 16 }, (_, index) =>
      inTransaction(context, ctx => createVehicle(ctx, { make: 'Invented', model: 'Shuttle', unitNumber: `S-${index}` }))))
    expect(await verifyLog(shop.id)).toMatchObject({ ok: true, head: { sequence: 16 } })
  })
})
