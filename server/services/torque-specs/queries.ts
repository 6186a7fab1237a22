import type { SpecQuery } from '#shared/schemas/torque-specs'
import type { ReadContext } from '../../context'
import { TorqueSpec } from '../../db/models/torque-spec'
import { TorqueSpecRevision } from '../../db/models/torque-spec-revision'
import { Conditions, contains, type Page, page, type SortKey } from '../../db/page'
import { notFound } from '../../refusal'

/** A spec with all its revisions, newest first, and the people who made and approved them. */
export interface SpecRecord {
  spec: TorqueSpec
  revisions: TorqueSpecRevision[]
}

async function recordsOf(ctx: ReadContext, ids: readonly string[]): Promise<SpecRecord[]> {
  if (ids.length === 0) return []
  const specs = await TorqueSpec.findAll({ where: { shopId: ctx.shop.id, id: [...ids] }, transaction: ctx.tx })
  const revisions = await TorqueSpecRevision.findAll({
    where: { shopId: ctx.shop.id, specId: [...ids] }, include: ['createdByUser', 'approvedByUser'],
    order: [['number', 'DESC']], transaction: ctx.tx,
  })
  return ids.flatMap((id) => {
    const spec = specs.find(item => item.id === id)
    return spec ? [{ spec, revisions: revisions.filter(revision => revision.specId === id) }] : []
  })
}

// The newest approved revision, else the newest of all: one look into an index for each spec, however many there are.
const from = `torque_specs s CROSS JOIN LATERAL (
  SELECT * FROM torque_spec_revisions o WHERE o.shop_id = s.shop_id AND o.spec_id = s.id
   ORDER BY o.status = 'approved' DESC, o.number DESC LIMIT 1) r`

const keys: Record<string, SortKey> = {
  component: { sql: 's.component', type: 'text' },
  application: { sql: 's.application', type: 'text' },
  createdAt: { sql: 's.created_at', type: 'timestamptz' },
  targetNm: { sql: 'r.target_nm', type: 'double precision' },
  jointClass: { sql: 'r.joint_class', type: 'text' },
  status: { sql: 'r.status', type: 'text' },
  source: { sql: 'r.source_title', type: 'text' },
}
const searched = ['s.component', 's.application', 'r.source_title', 'r.thread']

/** Specs by what their valid revision says; `q` looks in component, application, source and thread. */
export async function listSpecs(ctx: ReadContext, query: SpecQuery): Promise<Page<SpecRecord>> {
  const q = query.q?.trim()
  const where = new Conditions()
    .add('s.shop_id = ?', ctx.shop.id)
    .when(query.kind, 's.kind = ?')
    .when(query.status, 'r.status = ?')
    .when(query.jointClass, 'r.joint_class = ?')
    .when(query.flagged, `(r.flags <> '[]'::jsonb) = ?::boolean`)
    .when(q, searched.map(column => `${column} ILIKE ?`).join(' OR '), ...searched.map(() => contains(q ?? '')))
  const { items, nextCursor } = await page<{ id: string }>(query, {
    select: 's.id',
    from,
    id: 's.id',
    where,
    keys,
    defaultSort: 'component',
  })
  return { items: await recordsOf(ctx, items.map(item => item.id)), nextCursor }
}

/** A spec of the shop with its revisions. @throws Refusal 404 */
export async function readSpec(ctx: ReadContext, id: string): Promise<SpecRecord> {
  const [record] = await recordsOf(ctx, [id])
  if (!record) throw notFound('This torque spec')
  return record
}
