import type { SignOffDetail } from '#shared/schemas/sign-offs'
import type { ReadContext } from '../context'
import { canDo, roleMay } from '../policies/policy'
import * as policies from '../policies/sign-offs'
import type { SignOffView } from '../services/sign-offs/queries'
import { presentSecondCheck } from './second-checks'

/** A sign-off with everything that was true when it was signed. */
export function presentSignOff(ctx: ReadContext, { signOff, revision, vehicle, previousHash, standing, released }: SignOffView): SignOffDetail {
  const { voided, supersededBy } = signOff
  const technician = { id: signOff.technicianId, name: signOff.technicianName }
  return {
    ...signOff.answer,
    standing,
    signedAt: signOff.signedAt.toISOString(),
    receivedAt: signOff.receivedAt.toISOString(),
    tightenedAt: signOff.tightenedAt?.toISOString() ?? null,
    capturedOffline: signOff.capturedOffline,
    technician,
    repairOrder: { id: signOff.repairOrderId, number: signOff.repairOrderNumber },
    fastenerGroup: { id: signOff.fastenerGroupId, name: signOff.group?.name ?? signOff.component },
    component: signOff.component,
    vehicle: { id: vehicle.id, vin: vehicle.vin, unitNumber: vehicle.unitNumber, make: vehicle.make, model: vehicle.model },
    specRevision: {
      id: revision.id,
      specId: revision.specId,
      number: revision.number,
      source: { title: revision.sourceTitle, section: revision.sourceSection, page: revision.sourcePage, date: revision.sourceDate },
      threadCondition: revision.threadCondition,
      shopValue: revision.shopValue,
    },
    target: signOff.targetValue !== null && signOff.targetUnit !== null
      ? { value: signOff.targetValue, unit: signOff.targetUnit, nm: signOff.targetNm }
      : null,
    adapter: signOff.adapter,
    multiplierRatio: signOff.multiplierRatio,
    attestedInOrder: signOff.attestedInOrder,
    preparation: signOff.preparation,
    prepReason: signOff.prepReason,
    deviationReason: signOff.deviationReason,
    parts: signOff.parts,
    note: signOff.note,
    decisionRule: signOff.decisionRule,
    biasPercent: signOff.biasPercent,
    wPercent: signOff.wPercent,
    wPrimePercent: signOff.wPrimePercent,
    probabilityInBand: signOff.probabilityInBand,
    supersedes: signOff.supersedesId !== null ? { id: signOff.supersedesId, reason: signOff.supersedesReason ?? '' } : null,
    supersededBy: supersededBy?.id ?? null,
    voided: voided ? { reason: voided.reason, at: voided.at.toISOString(), by: { id: voided.byUser, name: voided.by?.name ?? '' } } : null,
    secondChecks: (signOff.secondChecks ?? []).map(presentSecondCheck),
    previousHash,
    can: {
      correct: standing && !released && canDo(ctx.actor, { technicianId: technician.id }, { correct: policies.correctSignOff }).correct === true,
      void: standing && !released && roleMay(ctx.actor.role, policies.voidSignOff).allowed,
      secondCheck: standing && canDo(ctx.actor, { technicianId: technician.id }, { check: policies.recordSecondCheck }).check === true,
    },
  }
}
