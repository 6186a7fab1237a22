import { QueryTypes } from 'sequelize'
import { adapterFactor, type Adapter } from '#shared/torque/adapter'
import type { Stage } from '#shared/torque/stages'
import type { Limits } from '#shared/torque/tolerance'
import type { CalibrationStatus } from '#shared/types/words'
import { calibrationStatus } from '#shared/wrench/due'
import { type CalibrationPoint, figuresAt } from '#shared/wrench/figures'
import { type FitnessReason, wrenchFitness } from '#shared/wrench/fitness'
import type { ReadContext } from '../../context'
import { database } from '../../db'
import { Wrench } from '../../db/models/wrench'

/** The calibration that counts on a day. */
export interface CalibrationRow {
  id: string
  performedOn: string
  dueOn: string
  usable: boolean
}

/** A wrench as it stood at a time: its calibration then, and what that says of it. */
export interface InForce {
  wrench: Wrench
  calibration: CalibrationRow | null
  status: CalibrationStatus
  dueOn: string | null
  daysLeft: number | null
  /** Readings signed with it since that calibration, up to then. */
  cyclesSince: number
  figures: CalibrationPoint[]
  /** From the lowest to the highest calibrated point; null without a certificate. */
  calibratedRange: { minNm: number, maxNm: number } | null
  permissiblePercent: number
}

interface Row {
  wrenchId: string
  calibration: CalibrationRow | null
  points: CalibrationPoint[] | null
  cyclesSince: number
}

/** The day of a moment in the shop's time zone, `YYYY-MM-DD`. */
export function dayOfShop(at: Date, timeZone: string): string {
  // Swedish writes days as ISO 8601 does.
  return new Intl.DateTimeFormat('sv-SE', { timeZone, year: 'numeric', month: '2-digit', day: '2-digit' }).format(at)
}

// Newest performed_on up to the day; recorded later wins a tie. Cycles are counted only where they can matter or are shown.
const sql = `
  SELECT w.id AS "wrenchId",
    CASE WHEN c.id IS NULL THEN NULL ELSE json_build_object('id', c.id, 'performedOn', c.performed_on, 'dueOn', c.due_on, 'usable', c.usable) END AS calibration,
    (SELECT json_agg(json_build_object('phase', p.phase, 'direction', p.direction, 'targetNm', p.target_nm,
       'meanDeviationPercent', p.mean_deviation_percent, 'wPercent', p.w_percent, 'wPrimePercent', p.w_prime_percent) ORDER BY p.number)
     FROM calibration_points p WHERE p.shop_id = w.shop_id AND p.calibration_id = c.id) AS points,
    CASE WHEN w.interval_cycles IS NULL AND NOT $4 THEN 0 ELSE (
      SELECT count(*) FROM sign_offs s JOIN sign_off_readings r ON r.sign_off_id = s.id AND r.value IS NOT NULL AND r.unit <> 'deg'
       WHERE s.shop_id = w.shop_id AND s.wrench_id = w.id AND s.signed_at <= $2
         AND s.signed_at >= (coalesce(c.performed_on, w.created_at::date))::timestamp AT TIME ZONE $5)::integer END AS "cyclesSince"
  FROM wrenches w
  LEFT JOIN LATERAL (
    SELECT * FROM calibrations k WHERE k.shop_id = w.shop_id AND k.wrench_id = w.id AND k.performed_on <= $3::date
     ORDER BY k.performed_on DESC, k.recorded_at DESC, k.id DESC LIMIT 1) c ON true
  WHERE w.shop_id = $1`

function assess(ctx: ReadContext, wrench: Wrench, row: Row, today: string): InForce {
  const { calibration } = row
  const standing = calibrationStatus({
    // A failed calibration takes a wrench out of use until one passes, whatever people have set.
    state: wrench.state === 'in_use' && calibration?.usable === false ? 'quarantined' : wrench.state,
    dueOn: calibration?.dueOn ?? null,
    today,
    dueSoonDays: ctx.shop.rules.dueSoonDays,
    cyclesSince: row.cyclesSince,
    intervalCycles: wrench.intervalCycles,
  })
  const points = row.points ?? []
  const asLeft = points.filter(point => point.phase === 'as_left')
  const figures = asLeft.length > 0 ? asLeft : points
  const torques = figures.map(point => point.targetNm)
  return {
    wrench,
    calibration,
    status: standing.status,
    dueOn: calibration?.dueOn ?? null,
    daysLeft: standing.daysLeft,
    cyclesSince: row.cyclesSince,
    figures,
    calibratedRange: torques.length > 0 ? { minNm: Math.min(...torques), maxNm: Math.max(...torques) } : null,
    permissiblePercent: wrench.permissiblePercent,
  }
}

/** How a wrench stood at a time; null when it is not the shop's. */
export async function calibrationInForce(ctx: ReadContext, wrenchId: string, at: Date): Promise<InForce | null> {
  const wrench = await Wrench.findOne({ where: { shopId: ctx.shop.id, id: wrenchId }, transaction: ctx.tx })
  if (!wrench) return null
  const today = dayOfShop(at, ctx.shop.timeZone)
  const [row] = await database().query<Row>(`${sql} AND w.id = $6`, {
    bind: [ctx.shop.id, at, today, false, ctx.shop.timeZone, wrenchId], type: QueryTypes.SELECT, transaction: ctx.tx,
  })
  return row ? assess(ctx, wrench, row, today) : null
}

/** How every wrench of the shop stands at a time, in two queries: a shop has some hundreds at most. */
export async function wrenchesInForce(ctx: ReadContext, at: Date): Promise<InForce[]> {
  const wrenches = await Wrench.findAll({ where: { shopId: ctx.shop.id }, transaction: ctx.tx })
  const today = dayOfShop(at, ctx.shop.timeZone)
  const rows = await database().query<Row>(sql, {
    bind: [ctx.shop.id, at, today, true, ctx.shop.timeZone], type: QueryTypes.SELECT, transaction: ctx.tx,
  })
  const byId = new Map(rows.map(row => [row.wrenchId, row]))
  return wrenches.flatMap((wrench) => {
    const row = byId.get(wrench.id)
    return row ? [assess(ctx, wrench, row, today)] : []
  })
}

/** The joint that a wrench is to fit. */
export interface FitCase {
  limits: Limits
  stages: readonly Stage[]
  adapter?: Adapter | null
  multiplierRatio?: number | null
  leftHand?: boolean
}

/** Whether a wrench suits every judged torque stage of a joint, with each reason once. */
export function fitness(inForce: InForce, { limits, stages, adapter, multiplierRatio, leftHand = false }: FitCase): { fit: boolean, reasons: FitnessReason[] } {
  const factor = adapterFactor(adapter, multiplierRatio)
  const torques = stages.flatMap(({ targetNm, lowerNm, upperNm }) =>
    targetNm !== null && lowerNm !== null && upperNm !== null ? [{ targetNm, lowerNm, upperNm }] : [])
  const results = (torques.length > 0 ? torques : [limits]).map(({ targetNm, lowerNm, upperNm }) => wrenchFitness({
    status: inForce.status,
    kind: inForce.wrench.kind,
    rangeMinNm: inForce.wrench.rangeMinNm,
    rangeMaxNm: inForce.wrench.rangeMaxNm,
    calibratedRange: inForce.calibratedRange,
    graduationNm: inForce.wrench.graduationNm,
    bandLowerNm: lowerNm,
    bandUpperNm: upperNm,
    targetNm,
    factor,
    wPrimePercent: figuresAt(inForce.figures, targetNm / factor, leftHand ? 'anticlockwise' : 'clockwise')?.wPrimePercent ?? null,
    permissiblePercent: inForce.permissiblePercent,
    directions: inForce.wrench.directions,
    leftHand,
  }))
  const reasons = results.flatMap(result => result.reasons)
  return {
    fit: results.every(result => result.fit),
    reasons: reasons.filter((reason, index) => reasons.findIndex(other => other.code === reason.code) === index),
  }
}
