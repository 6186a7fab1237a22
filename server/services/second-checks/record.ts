import type { SecondCheckAnswer, SecondCheckBody } from '#shared/schemas/sign-offs'
import { torqueAtFastener } from '#shared/torque/adapter'
import { toNm } from '#shared/torque/units'
import type { Verdict } from '#shared/torque/verdict'
import type { Context } from '../../context'
import { SecondCheck } from '../../db/models/second-check'
import { SecondCheckReading } from '../../db/models/second-check-reading'
import { SignOff } from '../../db/models/sign-off'
import { SignOffReading } from '../../db/models/sign-off-reading'
import { authorize } from '../../policies/policy'
import { recordSecondCheck as mayCheck } from '../../policies/sign-offs'
import { conflict, invalid, refused, unknownReference } from '../../refusal'
import { factsOfGroup } from '../fastener-groups/facts'
import { lockGroup, type LoadedGroup } from '../fastener-groups/load'
import { standingSignOffs } from '../fastener-groups/state'
import { appendToLog } from '../log/append'
import { requirePin } from '../people/pin'
import { answerAgain, contentHash, contentOf } from '../sign-offs/once'
import type { Recorded } from '../sign-offs/record'
import { calibrationInForce, fitness } from '../wrenches/inForce'
import { whyNot } from './methods'

const AHEAD_MS = 2 * 60_000

type CheckReading = NonNullable<SecondCheckBody['readings']>[number] & { nm: number }
type InForce = NonNullable<Awaited<ReturnType<typeof calibrationInForce>>>

/**
 * Records a second person's check of a joint, exactly once.
 * @throws Refusal 400, 403 `same_person` or for the PIN, 409 `id_taken` `superseded` `already_decided`, 422 `method` and by the rules
 */
export async function recordSecondCheck(ctx: Context, id: string, body: SecondCheckBody): Promise<Recorded<SecondCheckAnswer>> {
  refuseForm(body)
  const content = contentOf(body)
  const hash = contentHash(content)
  const earlier = await findEarlier(ctx, id, hash)
  if (earlier) return { answer: earlier, made: false }
  const signOff = await SignOff.findOne({ where: { shopId: ctx.shop.id, id: body.signOffId }, transaction: ctx.tx })
  if (signOff) authorize(ctx.actor, mayCheck, { technicianId: signOff.technicianId })
  if (body.deviceSignature && body.pin === undefined) throw unknownReference('deviceSignature.deviceId', 'This device')
  await requirePin(ctx, body.pin)
  if (!signOff) throw unknownReference('signOffId', 'This sign-off')
  const loaded = await lockGroup(ctx, signOff.fastenerGroupId)
  const meanwhile = await findEarlier(ctx, id, hash)
  if (meanwhile) return { answer: meanwhile, made: false }
  if (!loaded) throw unknownReference('signOffId', 'This sign-off')
  await refuseStale(ctx, signOff, loaded)
  refuseMethod(body, signOff, loaded)
  const exceptions = clockException(ctx, body)
  const inForce = await wrenchFor(ctx, body)
  if (inForce) refuseUnfit(ctx, body, loaded, inForce, exceptions)
  const readings = await judgePositions(ctx, body, signOff)
  const turned = readings.some(reading => reading.turned === true)
  const passed = !turned
  const verdict: Verdict | null = turned ? 'low' : null
  const result = { id, verdict, exceptions }
  const { sequence, hash: logHash } = await appendToLog(ctx, {
    kind: 'second_checks.create',
    subject: id,
    content: { checked: content, checkedBy: { id: ctx.actor.id, name: ctx.actor.name }, wrench: inForce ? { id: inForce.wrench.id, assetTag: inForce.wrench.assetTag } : null, passed, result },
  })
  const answer: SecondCheckAnswer = { ...result, sequence, hash: logHash }
  await SecondCheck.create({
    id,
    shopId: ctx.shop.id,
    signOffId: signOff.id,
    method: body.method,
    wrenchId: inForce?.wrench.id ?? null,
    calibrationId: inForce?.calibration?.id ?? null,
    calibrationStatus: inForce?.status ?? null,
    adapter: body.adapter ?? null,
    verdict,
    passed,
    exceptions,
    note: body.note ?? null,
    at: new Date(body.at),
    receivedAt: ctx.now,
    capturedOffline: body.capturedOffline,
    deviceId: null,
    deviceSignature: null,
    checkedBy: ctx.actor.id,
    contentHash: hash,
    answer,
    logSequence: sequence,
  }, { transaction: ctx.tx })
  await SecondCheckReading.bulkCreate(readings.map(({ position, value, unit, nm, turned: moved }) => ({
    secondCheckId: id, shopId: ctx.shop.id, position, value, unit, nm, turned: moved ?? false,
  })), { transaction: ctx.tx })
  return { answer, made: true }
}

/** @throws Refusal 400 when a method lacks its wrench or readings, or a position is there twice */
function refuseForm({ method, wrenchId, readings = [] }: SecondCheckBody): void {
  const custom = (path: string, message: string) => ({ path, message, code: 'custom' })
  const issues = [
    ...(method !== 'witness' && wrenchId === undefined ? [custom('wrenchId', 'Say with which wrench.')] : []),
    ...(method !== 'witness' && readings.length === 0 ? [custom('readings', 'Give what each bolt showed.')] : []),
    ...readings.flatMap((reading, index) => readings.findIndex(other => other.position === reading.position) < index
      ? [custom(`readings.${index}.position`, `Position ${reading.position} is here twice.`)]
      : []),
  ]
  if (issues.length > 0) throw invalid(issues)
}

async function findEarlier(ctx: Context, id: string, hash: string): Promise<SecondCheckAnswer | null> {
  const existing = await SecondCheck.findOne({ where: { shopId: ctx.shop.id, id }, transaction: ctx.tx })
  return existing ? answerAgain(existing, existing.checkedBy === ctx.actor.id, hash) : null
}

async function refuseStale(ctx: Context, signOff: SignOff, loaded: LoadedGroup): Promise<void> {
  const facts = await factsOfGroup(ctx, loaded.group.id)
  const standing = facts ? standingSignOffs(facts).find(item => item.id === signOff.id) : undefined
  if (!standing) throw conflict('superseded', 'This sign-off does not stand any more: it was corrected, voided or the joint opened again.')
  if (standing.checked) throw conflict('already_decided', 'This joint has been checked already.')
}

function refuseMethod({ method }: SecondCheckBody, signOff: SignOff, { revision, stages }: LoadedGroup): void {
  const confirmed = signOff.preparation.filter(step => step.confirmed).map(step => step.code)
  const why = whyNot(method, { threadCondition: revision.threadCondition, stages, confirmed })
  if (why) throw refused('method', why, 'method')
}

function clockException(ctx: Context, { at, capturedOffline }: SecondCheckBody): string[] {
  if (new Date(at).getTime() <= ctx.now.getTime() + AHEAD_MS) return []
  if (capturedOffline) return ['clock_off']
  throw refused('at', 'This time is in the future. Check the device\'s clock.', 'at')
}

async function wrenchFor(ctx: Context, { wrenchId, at, method }: SecondCheckBody): Promise<InForce | null> {
  if (wrenchId === undefined) return null
  const inForce = await calibrationInForce(ctx, wrenchId, new Date(at))
  if (!inForce) throw unknownReference('wrenchId', 'This wrench')
  if (method === 'residual' && inForce.wrench.kind !== 'indicating') {
    throw refused('method', 'A residual torque is read from an indicating wrench.', 'wrenchId')
  }
  return inForce
}

function refuseUnfit(ctx: Context, body: SecondCheckBody, { revision, stages }: LoadedGroup, inForce: InForce, exceptions: string[]): void {
  const { fit, reasons } = fitness(inForce, {
    limits: { targetNm: revision.targetNm, lowerNm: revision.lowerNm, upperNm: revision.upperNm },
    stages, adapter: body.adapter ?? null, multiplierRatio: null, leftHand: revision.leftHand,
  })
  if (fit) return
  if (!body.capturedOffline && ctx.shop.rules.unfitWrench === 'refuse') {
    const hard = reasons.filter(reason => reason.hard)
    throw refused('wrench_unfit', `This wrench does not fit: ${hard.map(reason => reason.text).join(' ')}`, 'wrenchId', { reasons: hard })
  }
  exceptions.push('wrench_unfit')
}

/** @throws Refusal 422 `position_unknown` for a position the sign-off does not cover */
async function judgePositions(ctx: Context, body: SecondCheckBody, signOff: SignOff): Promise<CheckReading[]> {
  const signed = await SignOffReading.findAll({ where: { shopId: ctx.shop.id, signOffId: signOff.id }, transaction: ctx.tx })
  return (body.readings ?? []).map((reading, index) => {
    if (!signed.some(item => item.position === reading.position)) {
      throw refused('position_unknown', `Position ${reading.position} is not part of this sign-off.`, `readings.${index}.position`)
    }
    return { ...reading, nm: torqueAtFastener(toNm(reading), body.adapter ?? null, null) }
  })
}
