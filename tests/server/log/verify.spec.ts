import { beforeEach, describe, expect, it } from 'vitest'
import { uuidv7 } from '#shared/ids/uuid'
import type { Actor, Shop } from '../../../server/context'
import { connect } from '../../../server/db/client'
import { database } from '../../../server/db/index'
import { appendToLog } from '../../../server/services/log/append'
import { verifyLog } from '../../../server/services/log/queries'
import { buildShop, buildUser } from '../../factories/shop'
import { useDatabase } from '../support/database'
import { ownerUrl } from '../support/scratch'

/** What somebody can do who has the owner's password and is set on it: switch the triggers off, and on again. */
async function tamper(sql: string, shopId: string) {
  const owner = connect(ownerUrl(), { max: 1 })
  await owner.query(`
    BEGIN;
    ALTER TABLE log_entries DISABLE TRIGGER USER;
    ${sql.replaceAll(':shop', `'${shopId}'`)};
    ALTER TABLE log_entries ENABLE ALWAYS TRIGGER log_entries_no_change;
    ALTER TABLE log_entries ENABLE ALWAYS TRIGGER log_entries_no_truncate;
    COMMIT`)
  await owner.close()
}

const entry = (sequence: number) => `shop_id = :shop AND sequence = ${sequence}`
const move = (from: number, to: number) => `UPDATE log_entries SET sequence = ${to} WHERE ${entry(from)}`
const shopHead = (sequence: number) => `UPDATE shops SET log_sequence = ${sequence},
  log_hash = (SELECT hash FROM log_entries WHERE ${entry(sequence)}) WHERE id = :shop`

describe('walking the log of a shop', () => {
  useDatabase()
  let shop: Shop
  let actor: Actor
  beforeEach(async () => {
    shop = await buildShop()
    actor = await buildUser(shop, 'technician')
    for (let nm = 1; nm <= 5; nm++) {
      const now = new Date(Date.UTC(2026, 10, 2, 8, nm))
      await database().transaction(tx => appendToLog(
        { tx, actor, shop, now }, { kind: 'sign_off.record', subject: uuidv7(), content: { nm, unit: 'N.m' } },
      ))
    }
  })

  it('finds it intact', async () => {
    expect(await verifyLog(shop.id)).toMatchObject({ ok: true, head: { sequence: 5 } })
  })

  it.each([
    ['changed content', `UPDATE log_entries SET content = '{"nm":9,"unit":"N.m"}' WHERE ${entry(3)}`, 3, 'hash'],
    ['a space put into the content', `UPDATE log_entries SET content = content || ' ' WHERE ${entry(3)}`, 3, 'hash'],
    ['a changed actor', `UPDATE log_entries SET actor = NULL WHERE ${entry(2)}`, 2, 'hash'],
    ['a changed time', `UPDATE log_entries SET at = at - interval '1 ms' WHERE ${entry(4)}`, 4, 'hash'],
    ['a changed subject', `UPDATE log_entries SET subject = gen_random_uuid() WHERE ${entry(1)}`, 1, 'hash'],
    ['a changed order', `${move(2, 99)}; ${move(3, 2)}; ${move(99, 3)}`, 2, 'previous_hash'],
    ['a removed entry', `DELETE FROM log_entries WHERE ${entry(3)}`, 3, 'sequence'],
    ['a removed first entry', `DELETE FROM log_entries WHERE ${entry(1)}`, 1, 'sequence'],
    ['a removed last entry', `DELETE FROM log_entries WHERE ${entry(5)}`, 5, 'head'],
    ['a shop that remembers an earlier end', shopHead(4), 5, 'head'],
  ])('shows %s', async (_what, sql, brokenAt, why) => {
    await tamper(sql, shop.id)
    expect(await verifyLog(shop.id)).toEqual({ ok: false, brokenAt, why })
  })
})
