import { uuidv7 } from '#shared/ids/uuid'
import type { CreateWrenchBody, UpdateWrenchBody } from '#shared/schemas/wrenches'
import { toNm } from '#shared/torque/units'
import { classOf, permissiblePercent } from '#shared/wrench/classes'
import type { Context } from '../../context'
import { Wrench } from '../../db/models/wrench'
import { authorize } from '../../policies/policy'
import { updateWrench as mayUpdate } from '../../policies/wrenches'
import { conflict, invalid, notFound } from '../../refusal'
import { appendToLog } from '../log/append'

/** Properties of a wrench as they are kept: as entered, with N·m beside it. */
function propertiesOf(body: CreateWrenchBody) {
  const { range, graduation } = body
  const rangeMinNm = toNm({ value: range.min, unit: range.unit })
  const rangeMaxNm = toNm({ value: range.max, unit: range.unit })
  const graduationNm = graduation ? toNm(graduation) : null
  const issues = [
    ...(range.min < range.max ? [] : [{ path: 'range.max', message: 'The range ends above where it begins.', code: 'custom' }]),
    ...(graduationNm !== null && graduationNm >= rangeMaxNm ? [{ path: 'graduation.value', message: 'One graduation is less than the whole range.', code: 'custom' }] : []),
  ]
  if (issues.length > 0) throw invalid(issues)
  const byClass = permissiblePercent(classOf(body), rangeMaxNm)
  return {
    assetTag: body.assetTag,
    serial: body.serial,
    kind: body.kind,
    toolClass: body.toolClass ?? null,
    rangeMin: range.min,
    rangeMax: range.max,
    rangeUnit: range.unit,
    rangeMinNm,
    rangeMaxNm,
    graduationValue: graduation?.value ?? null,
    graduationUnit: graduation?.unit ?? null,
    graduationNm,
    gripLengthMm: body.gripLengthMm ?? null,
    drive: body.drive ?? null,
    directions: body.directions ?? null,
    // The maker may promise more than the class asks, never less.
    permissiblePercent: Math.min(body.permissiblePercent ?? byClass, byClass),
    intervalMonths: body.intervalMonths,
    intervalCycles: body.intervalCycles ?? null,
    location: body.location ?? null,
  }
}

async function refuseTakenTag(ctx: Context, assetTag: string, exceptId: string | null): Promise<void> {
  const other = await Wrench.findOne({ where: { shopId: ctx.shop.id, assetTag }, transaction: ctx.tx })
  if (!other || other.id === exceptId) return
  const message = `There is a wrench ${assetTag} already.`
  throw conflict('id_taken', message, { issues: [{ path: 'assetTag', message, code: 'id_taken' }] })
}

/** Adds a wrench. @throws Refusal 400 for a range that makes no sense, 409 `id_taken` for a tag in use */
export async function addWrench(ctx: Context, body: CreateWrenchBody): Promise<Wrench> {
  const properties = propertiesOf(body)
  await refuseTakenTag(ctx, body.assetTag, null)
  const id = uuidv7(ctx.now.getTime())
  await appendToLog(ctx, { kind: 'wrenches.create', subject: id, content: properties })
  return Wrench.create({ id, shopId: ctx.shop.id, ...properties, stateReason: null, createdAt: ctx.now }, { transaction: ctx.tx })
}

/** Locks a wrench for a change. @throws Refusal 404 */
export async function lockWrench(ctx: Context, id: string): Promise<Wrench> {
  const wrench = await Wrench.findOne({ where: { shopId: ctx.shop.id, id }, lock: ctx.tx.LOCK.UPDATE, transaction: ctx.tx })
  if (!wrench) throw notFound('This wrench')
  return wrench
}

/** The properties that a wrench has, in the form they are entered in. */
const bodyOf = (wrench: Wrench): CreateWrenchBody => ({
  assetTag: wrench.assetTag,
  serial: wrench.serial,
  kind: wrench.kind,
  toolClass: wrench.toolClass ?? undefined,
  range: { min: wrench.rangeMin, max: wrench.rangeMax, unit: wrench.rangeUnit },
  graduation: wrench.graduationValue !== null && wrench.graduationUnit !== null ? { value: wrench.graduationValue, unit: wrench.graduationUnit } : undefined,
  gripLengthMm: wrench.gripLengthMm ?? undefined,
  drive: wrench.drive ?? undefined,
  directions: wrench.directions ?? undefined,
  permissiblePercent: wrench.permissiblePercent,
  intervalMonths: wrench.intervalMonths,
  intervalCycles: wrench.intervalCycles ?? undefined,
  location: wrench.location ?? undefined,
})

/**
 * Changes a wrench, or what has become of it: taken out of use (with a reason) or back in use.
 * @throws Refusal 400, 403 where the role may only quarantine, 404, 409 `id_taken`
 */
export async function changeWrench(ctx: Context, id: string, body: UpdateWrenchBody): Promise<void> {
  const { state, stateReason, ...changes } = body
  if (state !== undefined && state !== 'in_use' && stateReason === undefined) {
    throw invalid([{ path: 'stateReason', message: 'Say why it is out of use.', code: 'custom' }])
  }
  const wrench = await lockWrench(ctx, id)
  authorize(ctx.actor, mayUpdate, { onlyQuarantines: state === 'quarantined' && Object.keys(changes).length === 0 })
  if (changes.assetTag !== undefined) await refuseTakenTag(ctx, changes.assetTag, id)
  const before = { ...bodyOf(wrench), state: wrench.state, stateReason: wrench.stateReason }
  const given = Object.fromEntries(Object.entries(changes).filter(([, value]) => value !== undefined))
  const standing = state === undefined ? {} : { state, stateReason: state === 'in_use' ? null : stateReason ?? null }
  await wrench.update({ ...propertiesOf({ ...bodyOf(wrench), ...given }), ...standing }, { transaction: ctx.tx })
  await appendToLog(ctx, { kind: 'wrenches.update', subject: id, content: { before: jsonOf(before), after: body } })
}

/** Without the fields that are not there, which JSON has no word for. */
const jsonOf = (value: object) => Object.fromEntries(Object.entries(value).filter(([, item]) => item !== undefined))
