import type { CorrectionBody, SignOffAnswer, SignOffBody } from '#shared/schemas/sign-offs'
import { verdictRank, type Verdict } from '#shared/torque/verdict'
import type { ExceptionCode } from '#shared/types/words'
import type { Context } from '../../context'
import { SignOff } from '../../db/models/sign-off'
import { SignOffReading } from '../../db/models/sign-off-reading'
import { SignOffVoid } from '../../db/models/sign-off-void'
import { authorize } from '../../policies/policy'
import { correctSignOff as mayCorrect, recordSignOff as maySign } from '../../policies/sign-offs'
import { conflict, invalid, notFound, unknownReference } from '../../refusal'
import { factsOfGroup } from '../fastener-groups/facts'
import { lockGroup, type LoadedGroup } from '../fastener-groups/load'
import { coverage, coveredBy, type GroupFacts, standingSignOffs } from '../fastener-groups/state'
import { appendToLog } from '../log/append'
import { requirePin } from '../people/pin'
import { calibrationInForce, fitness } from '../wrenches/inForce'
import { type Evaluation, evaluate } from './evaluate'
import { refuseDoubles, refuseImpossibleAdapter, suitReadings, type SuitedReading } from './form'
import { answerAgain, contentHash, contentOf } from './once'
import { ruleOn } from './rules'

/** A recorded sign-off: its answer, and whether this request made it. */
export interface Recorded<Answer> {
  answer: Answer
  made: boolean
}

/** The sign-off that a new one stands in for. */
interface Superseded {
  id: string
  reason: string
}

type InForce = Awaited<ReturnType<typeof calibrationInForce>>

/**
 * Records a sign-off exactly once: the same id with the same content gets the first answer again.
 * @throws Refusal 400, 403 `wrong_pin` `pin_locked`, 409 `id_taken` `already_signed` `already_released`, 422 by the rules
 */
export async function recordSignOff(ctx: Context, id: string, body: SignOffBody): Promise<Recorded<SignOffAnswer>> {
  authorize(ctx.actor, maySign, undefined)
  return record(ctx, id, body, contentOf(body), null)
}

/**
 * Corrects one's own sign-off by a new one that names it. The old one is kept, and no longer stands.
 * @throws Refusal as a sign-off, 404, 403 for anyone but the signer, 409 `superseded` when it does not stand any more
 */
export async function correctSignOff(ctx: Context, supersededId: string, input: CorrectionBody): Promise<Recorded<SignOffAnswer>> {
  const { id, reason, ...body } = input
  const old = await SignOff.findOne({ where: { shopId: ctx.shop.id, id: supersededId }, transaction: ctx.tx })
  if (!old) throw notFound('This sign-off')
  authorize(ctx.actor, mayCorrect, { technicianId: old.technicianId })
  if (body.fastenerGroupId !== old.fastenerGroupId) {
    throw invalid([{ path: 'fastenerGroupId', message: 'A correction is of the same fastener group.', code: 'custom' }])
  }
  return record(ctx, id, body, { ...contentOf(body), reason, supersedesId: old.id }, { id: old.id, reason })
}

async function record(
  ctx: Context, id: string, body: SignOffBody, content: object, superseded: Superseded | null,
): Promise<Recorded<SignOffAnswer>> {
  refuseDoubles(body.readings)
  refuseImpossibleAdapter(body)
  const hash = contentHash(content)
  const earlier = await findEarlier(ctx, id, hash)
  if (earlier) return { answer: earlier, made: false }
  if (body.deviceSignature && body.pin === undefined) {
    throw unknownReference('deviceSignature.deviceId', 'This device')
  }
  await requirePin(ctx, body.pin)

  const loaded = await lockGroup(ctx, body.fastenerGroupId)
  // Another request with the same id may have come first while this one waited for the group.
  const meanwhile = await findEarlier(ctx, id, hash)
  if (meanwhile) return { answer: meanwhile, made: false }
  if (!loaded) throw unknownReference('fastenerGroupId', 'This fastener group')
  const facts = await factsOfGroup(ctx, loaded.group.id)
  if (!facts) throw unknownReference('fastenerGroupId', 'This fastener group')
  await refuseStale(ctx, loaded, body, superseded)

  const readings = suitReadings(body.readings, loaded.group.boltCount, loaded.stages)
  refuseCovered(facts, readings, superseded)
  const inForce = await calibrationInForce(ctx, body.wrenchId, new Date(body.signedAt))
  if (!inForce) throw unknownReference('wrenchId', 'This wrench')
  const evaluation = evaluate(readings, loaded.stages, judging(inForce), {
    adapter: body.adapter, multiplierRatio: body.multiplierRatio, leftHand: loaded.revision.leftHand,
  })
  const exceptions = ruleOn({
    body,
    now: ctx.now,
    openedAt: loaded.order.openedAt,
    revisionStatus: loaded.revision.status,
    threadCondition: loaded.revision.threadCondition,
    preparation: loaded.revision.preparation,
    stages: loaded.stages,
    wrench: { kind: inForce.wrench.kind, ...fitness(inForce, fitCase(loaded, body)) },
    unfitWrench: ctx.shop.rules.unfitWrench,
    evaluation,
  })
  return { answer: await keep(ctx, { id, body, content, hash, loaded, inForce, evaluation, exceptions, superseded }), made: true }
}

async function findEarlier(ctx: Context, id: string, hash: string): Promise<SignOffAnswer | null> {
  const existing = await SignOff.findOne({ where: { shopId: ctx.shop.id, id }, transaction: ctx.tx })
  return existing ? answerAgain(existing, existing.technicianId === ctx.actor.id, hash) : null
}

/** What the world has moved on from: a released order, a sign-off that no longer stands. */
async function refuseStale(ctx: Context, loaded: LoadedGroup, body: SignOffBody, superseded: Superseded | null): Promise<void> {
  if (loaded.released && !body.capturedOffline) {
    throw conflict('already_released', 'This repair order is released. Nothing was recorded.')
  }
  if (!superseded) return
  const where = { shopId: ctx.shop.id }
  const replaced = await SignOff.count({ where: { ...where, supersedesId: superseded.id }, transaction: ctx.tx })
  const voided = await SignOffVoid.count({ where: { ...where, signOffId: superseded.id }, transaction: ctx.tx })
  if (replaced + voided > 0) throw conflict('superseded', 'This sign-off does not stand any more: it was corrected or voided.')
}

/** @throws Refusal 409 `already_signed`, saying who signed and when */
function refuseCovered(facts: GroupFacts, readings: readonly SuitedReading[], superseded: Superseded | null): void {
  const covered = coverage(standingSignOffs(facts).filter(signOff => signOff.id !== superseded?.id))
  const taken = readings.flatMap((reading, index) => {
    const signOff = coveredBy(covered, reading.position, reading.stage)
    return signOff ? [{ signOff, index, position: reading.position }] : []
  })
  const [first] = taken
  if (!first) return
  const positions = [...new Set(taken.map(item => item.position))]
  const { technicianName, signedAt, id } = first.signOff
  throw conflict('already_signed', `${technicianName} has already signed position ${positions.join(', ')}. Nothing was recorded, and what you entered is kept.`, {
    issues: taken.map(item => ({ path: `readings.${item.index}.position`, message: `Already signed by ${item.signOff.technicianName}.`, code: 'already_signed' })),
    signedBy: { signOffId: id, name: technicianName, signedAt: new Date(signedAt).toISOString() },
    positions,
  })
}

const judging = ({ wrench, figures, permissiblePercent }: NonNullable<InForce>) => ({
  kind: wrench.kind,
  graduation: wrench.graduationValue !== null && wrench.graduationUnit !== null
    ? { value: wrench.graduationValue, unit: wrench.graduationUnit }
    : null,
  figures,
  permissiblePercent,
})

const fitCase = ({ revision, stages }: LoadedGroup, body: SignOffBody) => ({
  limits: { targetNm: revision.targetNm, lowerNm: revision.lowerNm, upperNm: revision.upperNm },
  stages: stages.filter(stage => body.readings.some(reading => reading.stage === stage.number)),
  adapter: body.adapter ?? null,
  multiplierRatio: body.multiplierRatio ?? null,
  leftHand: revision.leftHand,
})

interface Keeping {
  id: string
  body: SignOffBody
  content: object
  hash: string
  loaded: LoadedGroup
  inForce: NonNullable<InForce>
  evaluation: Evaluation
  exceptions: ExceptionCode[]
  superseded: Superseded | null
}

/** Appends to the log, then adds the rows with everything that is true now. */
async function keep(ctx: Context, keeping: Keeping): Promise<SignOffAnswer> {
  const { id, body, hash, loaded, inForce, evaluation, exceptions, superseded } = keeping
  const { group, revision, spec, order } = loaded
  const { wrench, calibration } = inForce
  const { worst } = evaluation
  const limits = { targetNm: revision.targetNm, lowerNm: revision.lowerNm, upperNm: revision.upperNm }
  const result = {
    id,
    verdict: evaluation.verdict,
    exceptions,
    readings: evaluation.readings.map(({ position, stage, attempt, value, unit, nm, verdict, probabilityInBand }) => ({
      position, stage, attempt, value: value ?? null, unit: unit ?? null, nm, verdict, probabilityInBand,
    })),
    wrench: { id: wrench.id, assetTag: wrench.assetTag, serial: wrench.serial, kind: wrench.kind },
    calibration: { id: calibration?.id ?? null, dueOn: inForce.dueOn, status: inForce.status },
    limits,
  }
  const { sequence, hash: logHash } = await appendToLog(ctx, {
    kind: superseded ? 'sign_offs.correct' : 'sign_offs.create',
    subject: id,
    content: {
      signed: keeping.content,
      technician: { id: ctx.actor.id, name: ctx.actor.name },
      repairOrder: { id: order.id, number: order.number },
      component: spec.component,
      specRevision: { id: revision.id, number: revision.number },
      result,
    },
  })
  const answer: SignOffAnswer = { ...result, sequence, hash: logHash }
  const governing = revision.governs === 'printed' ? [revision.printedValue, revision.printedUnit] as const : [revision.targetValue, revision.targetUnit] as const
  const confirmed = revision.preparation.map(step => ({ ...step, confirmed: body.prep[step.code] === true }))
  const extra = Object.keys(body.prep).filter(code => body.prep[code] && !revision.preparation.some(step => step.code === code))
  await SignOff.create({
    id,
    shopId: ctx.shop.id,
    fastenerGroupId: group.id,
    repairOrderId: order.id,
    specRevisionId: revision.id,
    wrenchId: wrench.id,
    calibrationId: calibration?.id ?? null,
    technicianId: ctx.actor.id,
    signedAt: new Date(body.signedAt),
    receivedAt: ctx.now,
    tightenedAt: body.tightenedAt === undefined ? null : new Date(body.tightenedAt),
    capturedOffline: body.capturedOffline,
    deviceId: null,
    deviceSignature: null,
    supersedesId: superseded?.id ?? null,
    supersedesReason: superseded?.reason ?? null,
    adapter: body.adapter ?? null,
    multiplierRatio: body.multiplierRatio ?? null,
    attestedInOrder: body.attestedInOrder ?? false,
    preparation: [...confirmed, ...extra.map(code => ({ code, text: code.replaceAll('_', ' '), required: false, confirmed: true }))],
    prepReason: body.prepReason ?? null,
    deviationReason: body.deviationReason ?? null,
    parts: body.parts ?? [],
    note: body.note ?? null,
    verdict: evaluation.verdict,
    exceptions,
    targetValue: governing[0],
    targetUnit: governing[1],
    lowerNm: limits.lowerNm,
    upperNm: limits.upperNm,
    decisionRule: evaluation.decisionRule,
    biasPercent: worst?.biasPercent ?? null,
    wPercent: worst?.wPercent ?? null,
    wPrimePercent: worst?.wPrimePercent ?? null,
    uNm: worst?.uNm ?? null,
    probabilityInBand: evaluation.probabilityInBand,
    calibrationStatus: inForce.status,
    wrenchKind: wrench.kind,
    wrenchSerial: wrench.serial,
    boltCount: group.boltCount,
    repairOrderNumber: order.number,
    component: spec.component,
    targetNm: limits.targetNm,
    verdictRank: rankOf(evaluation.verdict),
    wrenchTag: wrench.assetTag,
    calibrationDueOn: inForce.dueOn,
    technicianName: ctx.actor.name,
    contentHash: hash,
    answer,
    logSequence: sequence,
  }, { transaction: ctx.tx })
  await SignOffReading.bulkCreate(evaluation.readings.map(({ position, stage, attempt, counts, value, unit, nm, verdict, probabilityInBand }) => ({
    signOffId: id, shopId: ctx.shop.id, position, stage, attempt, counts, value: value ?? null, unit: unit ?? null, nm, verdict, probabilityInBand,
  })), { transaction: ctx.tx })
  return answer
}

/** A joint that was not judged sorts before all that were. */
const rankOf = (verdict: Verdict | null) => (verdict === null ? 0 : verdictRank(verdict) + 1)
