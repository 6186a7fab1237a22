import type { WrenchQuery } from '#shared/schemas/wrenches'
import type { CalibrationStatus } from '#shared/types/words'
import type { FitnessReason } from '#shared/wrench/fitness'
import type { ReadContext } from '../../context'
import { Calibration } from '../../db/models/calibration'
import { invalid, notFound } from '../../refusal'
import { loadGroup } from '../fastener-groups/load'
import { calibrationInForce, fitness, type InForce, wrenchesInForce } from './inForce'

/** A wrench of the list, with whether it fits the joint that was asked for. */
export type ListedWrench = InForce & { fit?: boolean, reasons?: FitnessReason[] }

/** What needs somebody first: overdue before due soon before the rest. */
const attention = ['overdue', 'due_soon', 'quarantined', 'none', 'at_laboratory', 'valid', 'lost', 'retired'] satisfies CalibrationStatus[]

const order: Record<string, (a: ListedWrench, b: ListedWrench) => number> = {
  assetTag: (a, b) => a.wrench.assetTag.localeCompare(b.wrench.assetTag, 'en', { numeric: true }),
  kind: (a, b) => a.wrench.kind.localeCompare(b.wrench.kind),
  rangeMax: (a, b) => a.wrench.rangeMaxNm - b.wrench.rangeMaxNm,
  dueOn: (a, b) => (a.dueOn ?? '9999').localeCompare(b.dueOn ?? '9999'),
  status: (a, b) => attention.indexOf(a.status) - attention.indexOf(b.status),
}

/**
 * Wrenches of the shop. Status and fitness are derived, so the list is sorted here, not in the database: a crib has some
 * hundreds. With `fitFor` the fit ones come first. @throws Refusal 404 for an unknown joint
 */
export async function listWrenches(ctx: ReadContext, query: WrenchQuery): Promise<{ items: ListedWrench[], nextCursor: string | null }> {
  const loaded = query.fitFor ? await loadGroup(ctx, query.fitFor) : null
  if (query.fitFor && !loaded) throw notFound('This fastener group')
  const words = query.q?.trim().toLowerCase() ?? ''
  const found = (await wrenchesInForce(ctx, ctx.now))
    .filter(item => (query.kind === undefined || item.wrench.kind === query.kind) && (query.status === undefined || item.status === query.status))
    .filter(({ wrench }) => [wrench.assetTag, wrench.serial, wrench.drive ?? '', wrench.location ?? ''].some(text => text.toLowerCase().includes(words)))
    .map((item): ListedWrench => loaded
      ? {
          ...item,
          ...fitness(item, {
            limits: { targetNm: loaded.revision.targetNm, lowerNm: loaded.revision.lowerNm, upperNm: loaded.revision.upperNm },
            stages: loaded.stages,
            leftHand: loaded.revision.leftHand,
          }),
        }
      : item)
  const sort = query.sort ?? 'assetTag'
  const key = sort.replace(/^-/, '')
  const sign = sort.startsWith('-') ? -1 : 1
  const compare = (a: ListedWrench, b: ListedWrench) =>
    Number(b.fit ?? false) - Number(a.fit ?? false)
    || sign * (order[key]?.(a, b) ?? 0)
    || sign * (order.assetTag?.(a, b) ?? 0)
    || a.wrench.id.localeCompare(b.wrench.id)
  const sorted = found.toSorted(compare)
  const start = query.cursor === undefined ? 0 : startAfter(sorted, query.cursor)
  const items = sorted.slice(start, start + query.limit)
  const last = items.at(-1)
  return { items, nextCursor: start + query.limit < sorted.length && last ? Buffer.from(last.wrench.id).toString('base64url') : null }
}

function startAfter(sorted: readonly ListedWrench[], cursor: string): number {
  const id = Buffer.from(cursor, 'base64url').toString('utf8')
  const index = sorted.findIndex(item => item.wrench.id === id)
  if (index < 0) throw invalid([{ path: 'cursor', message: 'This is not a cursor of this list.' }])
  return index + 1
}

/** The calibrations of a wrench with points and readings, newest first. */
export function calibrationsOf(ctx: ReadContext, wrenchId: string, id?: string): Promise<Calibration[]> {
  return Calibration.findAll({
    where: { shopId: ctx.shop.id, wrenchId, ...(id === undefined ? {} : { id }) },
    include: ['points', 'readings', 'recordedByUser'],
    order: [['performedOn', 'DESC'], ['recordedAt', 'DESC'], ['id', 'DESC']],
    transaction: ctx.tx,
  })
}

/** A wrench as it stands now, with its history. @throws Refusal 404 */
export async function readWrench(ctx: ReadContext, id: string): Promise<{ inForce: InForce, calibrations: Calibration[] }> {
  const inForce = await calibrationInForce(ctx, id, ctx.now)
  if (!inForce) throw notFound('This wrench')
  return { inForce, calibrations: await calibrationsOf(ctx, id) }
}
