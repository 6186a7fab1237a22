import type { SecondCheckRecord, SecondCheckWaiting } from '#shared/schemas/sign-offs'
import type { ReadContext } from '../context'
import type { SecondCheck } from '../db/models/second-check'
import { canDo } from '../policies/policy'
import { recordSecondCheck } from '../policies/sign-offs'
import { methodsFor } from '../services/second-checks/methods'
import type { WaitingRow } from '../services/second-checks/queries'

/** A second check as it stands beside its sign-off. */
export function presentSecondCheck(check: SecondCheck): SecondCheckRecord {
  return {
    ...check.answer,
    method: check.method,
    passed: check.passed,
    at: check.at.toISOString(),
    checkedBy: { id: check.checkedBy, name: check.checkedByUser?.name ?? '' },
    wrench: check.wrench
      ? { id: check.wrench.id, assetTag: check.wrench.assetTag, serial: check.wrench.serial, kind: check.wrench.kind }
      : null,
    readings: (check.readings ?? []).map(({ position, value, unit, nm, turned }) => ({ position, value, unit, nm, turned })),
    note: check.note,
  }
}

/** A joint that waits, with the methods that it allows. */
export function presentWaiting(ctx: ReadContext, row: WaitingRow): SecondCheckWaiting {
  return {
    signOff: row.signOff,
    fastenerGroup: row.fastenerGroup,
    vehicle: row.vehicle,
    methods: methodsFor({ threadCondition: row.threadCondition, stages: row.stages ?? [], confirmed: row.confirmed }),
    positions: row.positions,
    can: canDo(ctx.actor, { technicianId: row.signOff.technician.id }, { check: recordSecondCheck }),
  }
}
