import { QueryTypes, type Sequelize } from 'sequelize'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { Shop } from '../../../server/context'
import { appendOnlyTables } from '../../../server/db/append-only'
import { closeDatabase, database, openDatabase } from '../../../server/db/index'
import { FastenerGroup } from '../../../server/db/models/fastener-group'
import { Calibration } from '../../../server/db/models/calibration'
import { SignOff } from '../../../server/db/models/sign-off'
import { appendToLog } from '../../../server/services/log/append'
import { buildShop, buildUser } from '../../factories/shop'
import { useScratch } from '../../server/support/scratch'
import { addOneOfEach } from './one-of-each'

const attempts = {
  UPDATE: (table: string) => `UPDATE ${table} SET shop_id = shop_id`,
  DELETE: (table: string) => `DELETE FROM ${table}`,
  TRUNCATE: (table: string) => `TRUNCATE ${table} CASCADE`,
}

describe('signed records', () => {
  const scratch = useScratch()
  let shop: Shop
  let signOffId = ''

  beforeAll(async () => {
    process.env.JAMNUT_PIN_PEPPER ??= 'a pepper only for tests, thirty-two or more'
    process.env.NUXT_SESSION_PASSWORD ??= 'a session password only for tests, long enough'
    openDatabase(scratch.webUrl)
    shop = await buildShop()
    const actor = await buildUser(shop, 'foreman')
    const signOff = await addOneOfEach(shop, actor)
    signOffId = signOff.id
    const now = new Date('2026-11-02T08:30:00Z')
    await database().transaction(tx => appendToLog(
      { tx, shop, actor, now }, { kind: 'sign_off.record', subject: signOffId, content: {} },
    ))
  })
  afterAll(closeDatabase)

  const rows = async (table: string) => {
    const [row] = await scratch.owner.query<{ count: number }>(
      `SELECT count(*) AS count FROM ${table}`, { type: QueryTypes.SELECT },
    )
    return row?.count
  }
  const attempt = (role: Sequelize, sql: string) => role.query(sql).then(() => 'done', (error: Error) => error.message)

  it.each(appendOnlyTables)('in %s are only ever added, whoever asks', async (table) => {
    expect(await rows(table)).toBe(1)
    for (const sql of Object.values(attempts)) {
      expect(await attempt(scratch.web, sql(table))).toBe(`permission denied for table ${table}`)
      expect(await attempt(scratch.owner, sql(table))).toMatch(/^rows of \w+ are only ever added$/)
    }
    expect(await rows(table)).toBe(1)
  })

  it('are read back as they were written', async () => {
    const signOff = await SignOff.findOne({
      where: { shopId: shop.id, id: signOffId },
      rejectOnEmpty: true,
      include: [
        'readings', 'voided', 'supersededBy', 'technician', 'wrench', 'revision', 'repairOrder',
        { association: 'calibration', include: ['points', 'readings', 'recordedByUser', 'wrench'] },
        { association: 'secondChecks', include: ['readings', 'checkedByUser', 'wrench', 'signOff'] },
        { association: 'group', include: ['positions', 'disturbances', 'concessions', 'notDisturbedMark'] },
      ],
    })
    expect(signOff).toMatchObject({
      signedAt: new Date('2026-11-02T08:30:00.250Z'), calibrationDueOn: '2027-10-01', logSequence: 1, exceptions: [],
      supersededBy: null, voided: { reason: 'because of a test' }, technician: { role: 'foreman' },
    })
    // Kept as json, not jsonb: the answer comes back letter for letter.
    expect(JSON.stringify(signOff.answer).slice(0, 6)).toBe('{"id":')
    expect(Object.keys(signOff.answer).slice(0, 3)).toEqual(['id', 'sequence', 'verdict'])
    expect(signOff.readings?.map(reading => reading.nm)).toEqual([120])
    expect(signOff.revision?.tolerance).toEqual({ kind: 'percent', value: 10 })
    expect(signOff.calibration?.points?.[0]?.meanDeviationPercent).toBe(1)
    expect(signOff.calibration?.readings?.[0]?.deviationPercent).toBe(-0.8)
    expect(signOff.secondChecks?.[0]?.readings?.[0]?.turned).toBe(false)
    expect(signOff.group?.positions?.[0]?.x).toBe(500)
    expect(signOff.group?.disturbances).toHaveLength(1)
  })

  it('cannot be superseded, voided or marked twice', async () => {
    const again = (table: string, columns: string) => scratch.owner.query(
      `INSERT INTO ${table} (id, ${columns}) SELECT gen_random_uuid(), ${columns} FROM ${table}`,
    )
    const decision = 'shop_id, reason, at, by_user, log_sequence'
    await expect(again('voids', `sign_off_id, ${decision}`)).rejects.toThrow(/Validation error/)
    await expect(again('not_disturbed_marks', `fastener_group_id, ${decision}`)).rejects.toThrow(/Validation error/)
  })

  it('never point across shops', async () => {
    const other = await buildShop()
    const group = await FastenerGroup.findOne({ where: { shopId: shop.id }, rejectOnEmpty: true, raw: true })
    const foreign = FastenerGroup.create({ ...group, id: signOffId, shopId: other.id })
    await expect(foreign).rejects.toThrow(/foreign key/)
    const calibration = await Calibration.findOne({ where: { shopId: shop.id }, rejectOnEmpty: true, raw: true })
    await expect(Calibration.create({ ...calibration, id: signOffId, shopId: other.id, certificateNumber: 'C-2' }))
      .rejects.toThrow(/foreign key/)
  })
})
