import type { CalibrationAnswer, WrenchAnswer, WrenchDetail } from '#shared/schemas/wrenches'
import type { Actor } from '../context'
import type { Calibration } from '../db/models/calibration'
import { canDo, roleMay } from '../policies/policy'
import * as policies from '../policies/wrenches'
import type { ListedWrench } from '../services/wrenches/queries'

const isDirection = (text: string | null | undefined) => text === 'clockwise' || text === 'anticlockwise' ? text : null

/** A wrench as it stands, with the figures that judge its readings. */
export function presentWrench(actor: Actor, item: ListedWrench): WrenchAnswer {
  const { wrench } = item
  return {
    id: wrench.id,
    assetTag: wrench.assetTag,
    serial: wrench.serial,
    kind: wrench.kind,
    toolClass: wrench.toolClass,
    range: { min: wrench.rangeMin, max: wrench.rangeMax, unit: wrench.rangeUnit, minNm: wrench.rangeMinNm, maxNm: wrench.rangeMaxNm },
    graduation: wrench.graduationValue !== null && wrench.graduationUnit !== null && wrench.graduationNm !== null
      ? { value: wrench.graduationValue, unit: wrench.graduationUnit, nm: wrench.graduationNm }
      : null,
    gripLengthMm: wrench.gripLengthMm,
    drive: wrench.drive,
    directions: wrench.directions,
    permissiblePercent: wrench.permissiblePercent,
    intervalMonths: wrench.intervalMonths,
    intervalCycles: wrench.intervalCycles,
    location: wrench.location,
    state: wrench.state,
    stateReason: wrench.stateReason,
    calibration: {
      id: item.calibration?.id ?? null,
      status: item.status,
      performedOn: item.calibration?.performedOn ?? null,
      dueOn: item.dueOn,
      daysLeft: item.daysLeft,
      cyclesSince: item.cyclesSince,
    },
    figures: item.figures.map(point => ({
      phase: point.phase,
      direction: isDirection(point.direction),
      targetNm: point.targetNm,
      meanDeviationPercent: point.meanDeviationPercent ?? 0,
      wPercent: point.wPercent,
      wPrimePercent: point.wPrimePercent,
    })),
    ...(item.fit === undefined ? {} : { fit: item.fit, reasons: item.reasons ?? [] }),
    can: {
      ...canDo(actor, { onlyQuarantines: false }, { update: policies.updateWrench }),
      ...canDo(actor, { onlyQuarantines: true }, { quarantine: policies.updateWrench }),
      calibrate: roleMay(actor.role, policies.recordCalibration).allowed,
    },
  }
}

/** A calibration with every point and reading. */
export function presentCalibration(calibration: Calibration): CalibrationAnswer {
  const readingsOf = (point: number) => (calibration.readings ?? []).filter(reading => reading.point === point).toSorted((a, b) => a.number - b.number)
  return {
    id: calibration.id,
    wrenchId: calibration.wrenchId,
    performedOn: calibration.performedOn,
    laboratory: calibration.laboratory,
    certificateNumber: calibration.certificateNumber,
    referenceUncertaintyPercent: calibration.referenceUncertaintyPercent,
    asFoundUnavailableReason: calibration.asFoundUnavailableReason,
    adjusted: calibration.adjusted,
    note: calibration.note,
    result: calibration.result,
    usable: calibration.usable,
    decisionRule: calibration.decisionRule,
    dueOn: calibration.dueOn,
    points: (calibration.points ?? []).toSorted((a, b) => a.number - b.number).map((point) => {
      const readings = readingsOf(point.number)
      return {
        phase: point.phase,
        direction: point.direction,
        target: { value: point.targetValue, unit: point.targetUnit },
        targetNm: point.targetNm,
        meanDeviationPercent: point.meanDeviationPercent,
        deviationsPercent: readings.map(reading => reading.deviationPercent),
        readings: readings.map(({ indicated, reference }) => ({ indicated, reference })),
        limitPercent: point.limitPercent,
        verdict: point.verdict,
        wPercent: point.wPercent,
        wPrimePercent: point.wPrimePercent,
      }
    }),
    recordedBy: { id: calibration.recordedBy, name: calibration.recordedByUser?.name ?? '' },
    recordedAt: calibration.recordedAt.toISOString(),
  }
}

/** A wrench with its calibrations, newest first. */
export const presentWrenchDetail = (actor: Actor, { inForce, calibrations }: { inForce: ListedWrench, calibrations: Calibration[] }): WrenchDetail =>
  ({ ...presentWrench(actor, inForce), calibrations: calibrations.map(presentCalibration) })
