import type { SpecFlag, SpecRevisionBody } from '#shared/schemas/torque-specs'
import { checkDualUnits } from '#shared/torque/dual-unit'
import { defaultPreparation } from '#shared/torque/preparation'
import { formatQuantity } from '#shared/torque/quantity'
import { bandIssues, specIssues, specLimits } from '#shared/torque/spec-rules'
import type { Quantity } from '#shared/torque/units'
import type { SpecKind } from '#shared/types/words'
import type { TorqueSpecRevision } from '../../db/models/torque-spec-revision'
import { invalid, refused } from '../../refusal'

/** Refuses what a screen's schema could not see. @throws Refusal 400 with every field that is wrong */
export function refuseSpecIssues(body: SpecRevisionBody): void {
  const issues = specIssues(body).map(({ path, message }) => ({ path: path.join('.'), message }))
  if (issues.length > 0) throw invalid(issues)
}

function flagOf(what: string, first: Quantity | undefined, second: Quantity | undefined): SpecFlag[] {
  if (!first || !second) return []
  const { explained, diffNm, limitBothNm, swapped } = checkDualUnits({ first, second })
  if (explained) return []
  const hint = swapped ? ' The columns look swapped.' : ''
  const pair = `${formatQuantity(first)} and ${formatQuantity(second)}`
  const message = `${what}: ${pair} differ by more than rounding explains.${hint}`
  return [{ code: 'dual_unit_mismatch', message, diffNm, limitNm: limitBothNm, swapped }]
}

/** Pairs printed in two units that disagree by more than rounding explains: target, lower and upper limit. */
export function flagsOf({ target, printed, tolerance, printedLimits }: SpecRevisionBody): SpecFlag[] {
  const limits = tolerance?.kind === 'limits' ? tolerance : undefined
  return [
    ...flagOf('Target', target, printed),
    ...flagOf('Lower limit', limits?.lower, printedLimits?.lower),
    ...flagOf('Upper limit', limits?.upper, printedLimits?.upper),
  ]
}

/** The columns of a revision from what was entered: as printed, and what it comes to in N·m while the target governs. */
export function revisionValues(body: SpecRevisionBody, kind: SpecKind, shopDefaultPercent: number) {
  const { target, printed, source } = body
  return {
    jointClass: body.jointClass,
    boltCount: body.boltCount ?? null,
    pattern: body.pattern ?? null,
    places: body.places ?? [],
    thread: body.thread ?? null,
    leftHand: body.leftHand ?? false,
    propertyClass: body.propertyClass ?? null,
    threadCondition: body.threadCondition ?? null,
    runningTorque: body.runningTorque ?? null,
    // Nobody tightens a general table.
    preparation: body.preparation ?? (kind === 'joint' ? defaultPreparation(body) : []),
    targetValue: target?.value ?? null,
    targetUnit: target?.unit ?? null,
    printedValue: printed?.value ?? null,
    printedUnit: printed?.unit ?? null,
    printedLimits: body.printedLimits ?? null,
    tolerance: body.tolerance ?? null,
    stages: body.stages ?? null,
    printedOrder: body.order ?? null,
    secondCheckRequired: body.secondCheckRequired ?? false,
    oneTimeUse: body.oneTimeUse ?? false,
    retorque: body.retorque ?? null,
    caution: body.caution ?? null,
    sourceTitle: source.title,
    sourceSection: source.section ?? null,
    sourcePage: source.page ?? null,
    sourceDate: source.date ?? null,
    ...specLimits(body, shopDefaultPercent),
    flags: flagsOf(body),
    governs: null,
  }
}

/** The target of a revision as entered. */
export const targetOf = ({ targetValue, targetUnit }: TorqueSpecRevision): Quantity | undefined =>
  targetValue === null || targetUnit === null ? undefined : { value: targetValue, unit: targetUnit }
/** The value printed in the other unit. */
export const printedOf = ({ printedValue, printedUnit }: TorqueSpecRevision): Quantity | undefined =>
  printedValue === null || printedUnit === null ? undefined : { value: printedValue, unit: printedUnit }

/**
 * Target, limits and stages when the value in the other unit governs: everything is computed from that one alone.
 * @throws Refusal 422 `governs` where there is no such value, or it lies outside the limits
 */
export function printedValues(draft: TorqueSpecRevision, shopDefaultPercent: number) {
  const target = targetOf(draft)
  const printed = printedOf(draft)
  if (!printed && !draft.printedLimits) throw refused('governs', 'Nothing is printed in a second unit.', 'governs')
  // The stage that ends on the spec's own target ends on the governing value.
  const stages = draft.stages?.map((stage) => {
    const isTarget = stage.kind === 'torque' && target && sameQuantity(stage.target, target)
    return isTarget && printed ? { ...stage, target: printed } : stage
  }) ?? null
  const tolerance = draft.printedLimits ? { kind: 'limits' as const, ...draft.printedLimits } : draft.tolerance
  const said = { target: printed, tolerance, stages: stages ?? undefined }
  const [wrong] = bandIssues(said)
  if (wrong) throw refused('governs', `The printed value cannot govern: ${wrong.message}`, 'governs')
  return { ...specLimits(said, shopDefaultPercent), stages }
}

const sameQuantity = (a: Quantity, b: Quantity) => a.value === b.value && a.unit === b.unit
