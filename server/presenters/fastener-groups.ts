import type { GroupAnswer } from '#shared/schemas/repair-orders'
import { defaultPreparation } from '#shared/torque/preparation'
import type { ReadContext } from '../context'
import type { User } from '../db/models/user'
import { canDo, roleMay } from '../policies/policy'
import * as policies from '../policies/sign-offs'
import type { GroupView } from '../services/fastener-groups/queries'
import { coverage, coveredBy } from '../services/fastener-groups/state'
import { presentRevision } from './torque-specs'
import { vehicleBrief } from './vehicles'

interface MarkRow {
  reason: string
  at: Date
  byUser: string
  by?: User
  logSequence: number
}

const presentMark = (mark: MarkRow | undefined | null) => mark
  ? { reason: mark.reason, at: mark.at.toISOString(), by: { id: mark.byUser, name: mark.by?.name ?? '' } }
  : null

const latest = (marks: MarkRow[] | undefined) => marks?.toSorted((a, b) => b.logSequence - a.logSequence)[0]

/** A fastener group as it is to be tightened. */
export function presentGroup(ctx: ReadContext, view: GroupView): GroupAnswer {
  const { marked, facts, derived, spec, order, released } = view
  const revision = marked.revision
  if (!revision) throw new Error('A group without its spec revision.')
  const covered = coverage(derived.standing)
  const signerIds = derived.standing.map(signOff => signOff.technicianId)
  const open = !released
  const { concede, markNotDisturbed } = canDo(ctx.actor, { signerIds }, { concede: policies.concedeGroup, markNotDisturbed: policies.markNotDisturbed })
  return {
    id: marked.id,
    name: marked.name,
    state: derived.state,
    repairOrder: { id: order.id, number: order.number, released, vehicle: vehicleBrief(view.vehicle) },
    component: spec.component,
    application: spec.application,
    specId: spec.id,
    specRevision: presentRevision(revision),
    limits: { targetNm: revision.targetNm, lowerNm: revision.lowerNm, upperNm: revision.upperNm },
    pattern: marked.pattern,
    positions: (marked.positions ?? []).toSorted((a, b) => a.position - b.position).map(({ position, x, y, long, label }) => ({
      position, x, y, long, label,
      covered: view.stages.flatMap((stage) => {
        const signOff = coveredBy(covered, position, stage.number)
        return signOff ? [{ stage: stage.number, signOffId: signOff.id }] : []
      }),
    })),
    order: marked.tighteningOrder,
    stages: view.stages,
    preparation: revision.preparation.length > 0 ? revision.preparation : defaultPreparation(revision),
    places: revision.places,
    signOffs: view.signOffs,
    notDisturbed: facts.notDisturbed ? presentMark(marked.notDisturbedMark) : null,
    concession: presentMark(latest(marked.concessions)),
    disturbed: presentMark(latest(marked.disturbances)),
    can: {
      sign: open && roleMay(ctx.actor.role, policies.recordSignOff).allowed,
      disturb: open && derived.standing.length > 0 && roleMay(ctx.actor.role, policies.disturbGroup).allowed,
      concede: open && derived.exceptions.length > 0 && derived.state !== 'conceded' && facts.jointClass !== 'safety' && concede === true,
      markNotDisturbed: open && derived.state === 'open' && facts.jointClass !== 'safety' && markNotDisturbed === true,
    },
  }
}
