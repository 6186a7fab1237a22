import { QueryTypes } from 'sequelize'
import type { SignOffListItem, SignOffQuery } from '#shared/schemas/sign-offs'
import type { ReadContext } from '../../context'
import { database } from '../../db'
import { LogEntry } from '../../db/models/log-entry'
import { SignOff } from '../../db/models/sign-off'
import { TorqueSpecRevision } from '../../db/models/torque-spec-revision'
import { Conditions, contains, type Page, page, type SortKey } from '../../db/page'
import { notFound } from '../../refusal'

const utc = (sql: string) => `to_char(${sql} AT TIME ZONE 'UTC', 'YYYY-MM-DD"T"HH24:MI:SS.MS"Z"')`

/** Whether a sign-off stands: not voided, not corrected, and the joint not opened again since. */
export const standingSql = (signOff: string) => `NOT EXISTS (SELECT 1 FROM voids v WHERE v.shop_id = ${signOff}.shop_id AND v.sign_off_id = ${signOff}.id)
  AND NOT EXISTS (SELECT 1 FROM sign_offs n WHERE n.supersedes_id = ${signOff}.id)
  AND NOT EXISTS (SELECT 1 FROM disturbances d WHERE d.shop_id = ${signOff}.shop_id AND d.fastener_group_id = ${signOff}.fastener_group_id AND d.log_sequence > ${signOff}.log_sequence)`

/** Whether a second person's check of it has passed. */
export const checkedSql = (signOff: string) => `EXISTS (SELECT 1 FROM second_checks k WHERE k.shop_id = ${signOff}.shop_id AND k.sign_off_id = ${signOff}.id AND k.passed)`

/** A sign-off as a line of a list, made by the database in the form it is answered in. */
export const itemSql = `json_build_object(
  'id', s.id, 'signedAt', ${utc('s.signed_at')},
  'repairOrder', json_build_object('id', s.repair_order_id, 'number', s.repair_order_number),
  'fastenerGroupId', s.fastener_group_id, 'component', s.component, 'targetNm', s.target_nm,
  'target', CASE WHEN s.target_value IS NULL THEN NULL ELSE json_build_object('value', s.target_value, 'unit', s.target_unit) END,
  'limits', json_build_object('targetNm', s.target_nm, 'lowerNm', s.lower_nm, 'upperNm', s.upper_nm),
  'verdict', s.verdict,
  'readings', coalesce((SELECT json_agg(json_build_object('nm', p.nm, 'verdict', p.verdict) ORDER BY p.stage, p.position)
    FROM sign_off_readings p WHERE p.shop_id = s.shop_id AND p.sign_off_id = s.id AND p.counts AND p.nm IS NOT NULL AND p.verdict IS NOT NULL), '[]'),
  'boltCount', s.bolt_count, 'wPrimePercent', s.w_prime_percent, 'exceptions', s.exceptions,
  'standing', ${standingSql('s')},
  'checked', ${checkedSql('s')},
  'wrench', json_build_object('id', s.wrench_id, 'assetTag', s.wrench_tag, 'kind', s.wrench_kind),
  'calibrationDueOn', s.calibration_due_on,
  'technician', json_build_object('id', s.technician_id, 'name', s.technician_name))`

// Each is served by an index of its own: migration 20261201000400.
const keys: Record<string, SortKey> = {
  signedAt: { sql: 's.signed_at', type: 'timestamptz' },
  repairOrder: { sql: 's.repair_order_number', type: 'text' },
  component: { sql: 's.component', type: 'text' },
  targetNm: { sql: 's.target_nm', type: 'double precision' },
  verdict: { sql: 's.verdict_rank', type: 'integer' },
  wrench: { sql: 's.wrench_tag', type: 'text' },
  calibrationDueOn: { sql: `coalesce(s.calibration_due_on, 'infinity'::date)`, type: 'date' },
  technician: { sql: 's.technician_name', type: 'text' },
}

/** Sign-offs by any column; days are the shop's. */
export async function listSignOffs(ctx: ReadContext, query: SignOffQuery): Promise<Page<SignOffListItem>> {
  const zone = ctx.shop.timeZone
  const where = new Conditions().add('s.shop_id = ?', ctx.shop.id)
    .when(query.wrenchId, 's.wrench_id = ?')
    .when(query.verdict, 's.verdict = ?')
    .when(query.technicianId, 's.technician_id = ?')
    .when(query.component && contains(query.component), 's.component ILIKE ?')
    .when(query.from, 's.signed_at >= (?::date)::timestamp AT TIME ZONE ?', query.from, zone)
    .when(query.to, 's.signed_at < (?::date)::timestamp AT TIME ZONE ?', query.to, zone)
  if (query.q) {
    const words = contains(query.q)
    where.add(`s.repair_order_number ILIKE ? OR s.component ILIKE ? OR EXISTS (
      SELECT 1 FROM repair_orders o JOIN vehicles c ON c.id = o.vehicle_id
       WHERE o.id = s.repair_order_id AND (c.vin ILIKE ? OR c.unit_number ILIKE ?))`, words, words, words, words)
  }
  const { items, nextCursor } = await page<{ item: SignOffListItem }>(query, {
    select: `${itemSql} AS item`, from: 'sign_offs s', id: 's.id', where, keys, defaultSort: '-signedAt',
  })
  return { items: items.map(row => row.item), nextCursor }
}

/** The sign-offs of a group, oldest first. */
export async function signOffsOfGroup(ctx: ReadContext, groupId: string): Promise<SignOffListItem[]> {
  const rows = await database().query<{ item: SignOffListItem }>(
    `SELECT ${itemSql} AS item FROM sign_offs s WHERE s.shop_id = $1 AND s.fastener_group_id = $2 ORDER BY s.log_sequence`,
    { bind: [ctx.shop.id, groupId], type: QueryTypes.SELECT, transaction: ctx.tx },
  )
  return rows.map(row => row.item)
}

/** A sign-off with what belongs to it, for its own page. @throws Refusal 404 */
export async function readSignOff(ctx: ReadContext, id: string) {
  const shopId = ctx.shop.id
  const signOff = await SignOff.findOne({
    where: { shopId, id },
    include: [
      'readings', 'group', 'technician', 'supersededBy',
      { association: 'repairOrder', include: ['vehicle', 'release'] },
      { association: 'voided', include: ['by'] },
      { association: 'secondChecks', include: ['readings', 'checkedByUser', 'wrench'] },
    ],
    transaction: ctx.tx,
  })
  if (!signOff) throw notFound('This sign-off')
  const at = { transaction: ctx.tx, rejectOnEmpty: true as const }
  const revision = await TorqueSpecRevision.findOne({ where: { shopId, id: signOff.specRevisionId }, ...at })
  const entry = await LogEntry.findOne({ where: { shopId, sequence: signOff.logSequence }, ...at })
  const vehicle = signOff.repairOrder?.vehicle
  if (!vehicle) throw new Error('A sign-off without its vehicle.')
  const [row] = await database().query<{ standing: boolean }>(
    `SELECT ${standingSql('s')} AS standing FROM sign_offs s WHERE s.shop_id = $1 AND s.id = $2`,
    { bind: [shopId, id], type: QueryTypes.SELECT, transaction: ctx.tx },
  )
  return {
    signOff,
    revision,
    vehicle,
    previousHash: entry.previousHash,
    standing: row?.standing ?? false,
    released: Boolean(signOff.repairOrder?.release),
  }
}

/** What `readSignOff` answers. */
export type SignOffView = Awaited<ReturnType<typeof readSignOff>>
