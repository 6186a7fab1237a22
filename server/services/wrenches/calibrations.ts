import { uuidv7 } from '#shared/ids/uuid'
import type { CreateCalibrationBody } from '#shared/schemas/wrenches'
import { toNm } from '#shared/torque/units'
import { assessPoint } from '#shared/wrench/calibration'
import { dueOn } from '#shared/wrench/due'
import { budget } from '#shared/wrench/uncertainty'
import type { Context } from '../../context'
import { Calibration } from '../../db/models/calibration'
import { CalibrationPoint } from '../../db/models/calibration-point'
import { CalibrationReading } from '../../db/models/calibration-reading'
import type { Wrench } from '../../db/models/wrench'
import { conflict, invalid, refused } from '../../refusal'
import { appendToLog } from '../log/append'
import { dayOfShop } from './inForce'
import { lockWrench } from './wrenches'

type Run = NonNullable<CreateCalibrationBody['asFound']>[number]
type Phase = 'as_found' | 'as_left'

const decisionRule = 'ISO 6789-1: every reading within the permissible deviation, no guard band'

/** One point of a run, judged by every reading, with its uncertainty; figures of the certificate itself come first. */
function judge(run: Run, phase: Phase, wrench: Wrench, uncertaintyPercent: number) {
  const targetNm = toNm(run.target)
  const { deviationsPercent, meanDeviationPercent, verdict } = assessPoint({ targetNm, readings: run.readings, limitPercent: wrench.permissiblePercent })
  const perUnit = toNm({ value: 1, unit: run.target.unit })
  const computed = budget({
    target: run.target.value,
    readings: run.readings,
    uncertaintyPercent,
    graduation: wrench.graduationNm === null ? null : wrench.graduationNm / perUnit,
  })
  // A certificate that gives W′ alone says nothing of W, and the other way round W′ follows from W.
  const own = run.wPercent !== undefined || run.wPrimePercent !== undefined
  const wPercent = own ? run.wPercent ?? null : computed.wPercent
  const wPrimePercent = own ? run.wPrimePercent ?? Math.abs(meanDeviationPercent) + (run.wPercent ?? 0) : computed.wPrimePercent
  return { run, phase, targetNm, deviationsPercent, meanDeviationPercent, limitPercent: wrench.permissiblePercent, verdict, wPercent, wPrimePercent }
}

/** @throws Refusal 400 when the parts of a calibration do not go together */
function refuseForm(body: CreateCalibrationBody): void {
  const custom = (path: string, message: string) => ({ path, message, code: 'custom' })
  const issues = [
    ...(body.asFound === undefined && body.asFoundUnavailable === undefined ? [custom('asFound', 'Give the readings as found, or say why there are none.')] : []),
    ...(body.asFound !== undefined && body.asFoundUnavailable !== undefined ? [custom('asFoundUnavailable', 'There are readings as found: leave this out.')] : []),
    ...(body.adjusted && body.asLeft === undefined ? [custom('asLeft', 'An adjusted wrench is measured again: give the readings as left.')] : []),
  ]
  if (issues.length > 0) throw invalid(issues)
}

/**
 * Records a calibration. The result is that of as found; the wrench is usable when as left (as found without one) passes,
 * which also brings it back from the laboratory or quarantine.
 * @throws Refusal 400, 404, 409 `id_taken` for a certificate already recorded, 422 `performed_on` in the future
 */
export async function recordCalibration(ctx: Context, wrenchId: string, body: CreateCalibrationBody): Promise<Calibration> {
  refuseForm(body)
  const wrench = await lockWrench(ctx, wrenchId)
  const taken = await Calibration.count({ where: { shopId: ctx.shop.id, wrenchId, certificateNumber: body.certificateNumber }, transaction: ctx.tx })
  if (taken > 0) {
    const message = 'This certificate is already recorded for this wrench.'
    throw conflict('id_taken', message, { issues: [{ path: 'certificateNumber', message, code: 'id_taken' }] })
  }
  if (body.performedOn > dayOfShop(ctx.now, ctx.shop.timeZone)) throw refused('performed_on', 'This day has not come yet.', 'performedOn')
  const { uncertaintyPercent } = body.reference
  const asFound = (body.asFound ?? []).map(run => judge(run, 'as_found', wrench, uncertaintyPercent))
  const asLeft = (body.asLeft ?? []).map(run => judge(run, 'as_left', wrench, uncertaintyPercent))
  const passes = (points: typeof asFound) => points.length > 0 && points.every(point => point.verdict === 'pass')
  const result = passes(asFound.length > 0 ? asFound : asLeft) ? 'pass' : 'fail'
  const usable = passes(asLeft.length > 0 ? asLeft : asFound)
  const id = uuidv7(ctx.now.getTime())
  const due = dueOn(body.performedOn, wrench.intervalMonths)
  if (usable && (wrench.state === 'at_laboratory' || wrench.state === 'quarantined')) {
    await wrench.update({ state: 'in_use', stateReason: null }, { transaction: ctx.tx })
  }
  await appendToLog(ctx, { kind: 'calibrations.create', subject: id, content: { wrenchId, recorded: body, result, usable, dueOn: due } })
  const calibration = await Calibration.create({
    id,
    shopId: ctx.shop.id,
    wrenchId,
    performedOn: body.performedOn,
    laboratory: body.laboratory,
    certificateNumber: body.certificateNumber,
    referenceUncertaintyPercent: uncertaintyPercent,
    asFoundUnavailableReason: body.asFoundUnavailable?.reason ?? null,
    adjusted: body.adjusted,
    note: body.note ?? null,
    result,
    usable,
    decisionRule,
    dueOn: due,
    recordedBy: ctx.actor.id,
    recordedAt: ctx.now,
  }, { transaction: ctx.tx })
  const points = [...asFound, ...asLeft]
  await CalibrationPoint.bulkCreate(points.map(({ run, deviationsPercent, ...point }, index) => ({
    calibrationId: id, shopId: ctx.shop.id, number: index + 1, direction: run.direction ?? null,
    targetValue: run.target.value, targetUnit: run.target.unit, ...point,
  })), { transaction: ctx.tx })
  await CalibrationReading.bulkCreate(points.flatMap(({ run, deviationsPercent }, index) => run.readings.map((reading, at) => ({
    calibrationId: id, shopId: ctx.shop.id, point: index + 1, number: at + 1, ...reading, deviationPercent: deviationsPercent[at] ?? 0,
  }))), { transaction: ctx.tx })
  return calibration
}
