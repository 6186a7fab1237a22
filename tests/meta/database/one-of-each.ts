import { uuidv7 } from '#shared/ids/uuid'
import type { Actor, Shop } from '../../../server/context'
import { Calibration } from '../../../server/db/models/calibration'
import { CalibrationPoint } from '../../../server/db/models/calibration-point'
import { CalibrationReading } from '../../../server/db/models/calibration-reading'
import { Concession } from '../../../server/db/models/concession'
import { Disturbance } from '../../../server/db/models/disturbance'
import { FastenerGroup } from '../../../server/db/models/fastener-group'
import { FastenerPosition } from '../../../server/db/models/fastener-position'
import { NotDisturbedMark } from '../../../server/db/models/not-disturbed-mark'
import { Release } from '../../../server/db/models/release'
import { RepairOrder } from '../../../server/db/models/repair-order'
import { SecondCheck } from '../../../server/db/models/second-check'
import { SecondCheckReading } from '../../../server/db/models/second-check-reading'
import { SignOff } from '../../../server/db/models/sign-off'
import { SignOffReading } from '../../../server/db/models/sign-off-reading'
import { SignOffVoid } from '../../../server/db/models/sign-off-void'
import { TorqueSpec } from '../../../server/db/models/torque-spec'
import { TorqueSpecRevision } from '../../../server/db/models/torque-spec-revision'
import { Vehicle } from '../../../server/db/models/vehicle'
import { Wrench } from '../../../server/db/models/wrench'

const at = new Date('2026-11-02T08:30:00.250Z')
const limits = { targetNm: 120, lowerNm: 108, upperNm: 132 }

async function addJoint(shopId: string, createdBy: string) {
  const vehicle = await Vehicle.create({ id: uuidv7(), shopId, make: 'Norrland', model: 'T6', createdAt: at })
  const spec = await TorqueSpec.create({
    id: uuidv7(), shopId, kind: 'joint', component: 'Wheel nut', application: 'Front axle',
    appliesTo: { make: 'Norrland', yearFrom: 2019 }, createdAt: at,
  })
  const revision = await TorqueSpecRevision.create({
    id: uuidv7(), shopId, specId: spec.id, number: 1, status: 'approved', jointClass: 'safety', ...limits,
    targetValue: 120, targetUnit: 'N.m', tolerance: { kind: 'percent', value: 10 }, sourceTitle: 'Workshop manual',
    stages: [{ kind: 'torque', target: { value: 120, unit: 'N.m' } }], createdBy, createdAt: at,
    approvedBy: createdBy, approvedAt: at,
  })
  const order = await RepairOrder.create({
    id: uuidv7(), shopId, number: 'RO-1', vehicleId: vehicle.id, openedAt: at, openedBy: createdBy,
  })
  const group = await FastenerGroup.create({
    id: uuidv7(), shopId, repairOrderId: order.id, specRevisionId: revision.id, name: 'Front left wheel', boltCount: 2,
    pattern: 'circle', tighteningOrder: [1, 2], createdBy, createdAt: at,
  })
  await FastenerPosition.create({ shopId, groupId: group.id, position: 1, x: 500, y: 0 })
  return { order, revision, group }
}

async function addCalibration(shopId: string, recordedBy: string) {
  const wrench = await Wrench.create({
    id: uuidv7(), shopId, assetTag: 'TW-1', serial: 'A1', kind: 'setting', rangeMin: 40, rangeMax: 200,
    rangeUnit: 'N.m', rangeMinNm: 40, rangeMaxNm: 200, permissiblePercent: 4, intervalMonths: 12, createdAt: at,
  })
  const calibration = await Calibration.create({
    id: uuidv7(), shopId, wrenchId: wrench.id, performedOn: '2026-10-01', laboratory: 'Lab', certificateNumber: 'C-1',
    referenceUncertaintyPercent: 0.5, adjusted: false, result: 'pass', usable: true, decisionRule: 'simple acceptance',
    dueOn: '2027-10-01', recordedBy, recordedAt: at,
  })
  const calibrationId = calibration.id
  await CalibrationPoint.create({
    shopId, calibrationId, number: 1, phase: 'as_found', targetValue: 120, targetUnit: 'N.m', targetNm: 120,
    meanDeviationPercent: 1, limitPercent: 4, verdict: 'pass',
  })
  await CalibrationReading.create({
    shopId, calibrationId, point: 1, number: 1, indicated: 120, reference: 121, deviationPercent: -0.8,
  })
  return { wrench, calibration }
}

/** One row in every append-only table but the log, and in all that they stand on, through the models. */
export async function addOneOfEach(shop: Shop, actor: Actor): Promise<SignOff> {
  const shopId = shop.id
  const { order, revision, group } = await addJoint(shopId, actor.id)
  const { wrench, calibration } = await addCalibration(shopId, actor.id)
  const id = uuidv7()
  const asked = { receivedAt: at, capturedOffline: false, contentHash: 'a'.repeat(64) }
  const signOff = await SignOff.create({
    ...asked, id, shopId, fastenerGroupId: group.id, repairOrderId: order.id, specRevisionId: revision.id,
    wrenchId: wrench.id, calibrationId: calibration.id, technicianId: actor.id, signedAt: at,
    preparation: [{ code: 'clean', text: 'Cleaned', required: true, confirmed: true }], verdict: 'in_band',
    ...limits, decisionRule: 'simple acceptance', calibrationStatus: 'valid', wrenchKind: 'setting',
    wrenchSerial: wrench.serial, boltCount: 2, repairOrderNumber: order.number, component: 'Wheel nut', verdictRank: 0,
    wrenchTag: wrench.assetTag, calibrationDueOn: calibration.dueOn, technicianName: actor.name, logSequence: 1,
    answer: {
      id, sequence: 1, verdict: 'in_band', exceptions: [], readings: [], limits, hash: 'b'.repeat(64),
      wrench: { id: wrench.id, assetTag: 'TW-1', serial: 'A1', kind: 'setting' },
      calibration: { id: calibration.id, dueOn: calibration.dueOn, status: 'valid' },
    },
  })
  await SignOffReading.create({
    shopId, signOffId: id, position: 1, stage: 1, attempt: 1, counts: true, value: 120, unit: 'N.m', nm: 120,
  })
  const secondCheckId = uuidv7()
  await SecondCheck.create({
    ...asked, id: secondCheckId, shopId, signOffId: id, method: 'setting', wrenchId: wrench.id, passed: true, at,
    checkedBy: actor.id, logSequence: 2,
    answer: { id: secondCheckId, sequence: 2, verdict: null, exceptions: [], hash: 'c'.repeat(64) },
  })
  await SecondCheckReading.create({
    shopId, secondCheckId, position: 1, value: 120, unit: 'N.m', nm: 120, turned: false,
  })
  const decision = { shopId, reason: 'because of a test', at, byUser: actor.id, logSequence: 3 }
  await SignOffVoid.create({ ...decision, id: uuidv7(), signOffId: id })
  await Disturbance.create({ ...decision, id: uuidv7(), fastenerGroupId: group.id })
  await Concession.create({ ...decision, id: uuidv7(), fastenerGroupId: group.id })
  await NotDisturbedMark.create({ ...decision, id: uuidv7(), fastenerGroupId: group.id })
  await Release.create({
    shopId, id: uuidv7(), repairOrderId: order.id, at, byUser: actor.id, ownJoint: true, logSequence: 4,
  })
  return signOff
}
