import { isPermutation, type Pattern } from './order'
import { smallestNm } from './quantity'
import type { StageSpec } from './stages'
import { limitsOf, type Limits, type Tolerance } from './tolerance'
import { toNm, type Quantity } from './units'

/** What is wrong, and with which field. */
export interface RuleIssue {
  path: (string | number)[]
  message: string
}

/** What a spec says of torque. */
export interface SaidTorque {
  target?: Quantity | undefined
  tolerance?: Tolerance | null | undefined
  stages?: readonly StageSpec[] | undefined
}

/** A spec revision as it is entered; each field has been checked on its own before. */
export interface SaidSpec extends SaidTorque {
  boltCount?: number | undefined
  pattern?: Pattern | undefined
  places?: readonly { position: number, x?: number | undefined, y?: number | undefined }[] | undefined
  order?: readonly number[] | undefined
  printed?: Quantity | undefined
  printedLimits?: { lower: Quantity, upper: Quantity } | undefined
  runningTorque?: Quantity | undefined
  preparation?: readonly { code: string }[] | undefined
  appliesTo?: { yearFrom?: number | undefined, yearTo?: number | undefined } | undefined
  retorque?: object | undefined
}

const issue = (message: string, ...path: (string | number)[]): RuleIssue[] => [{ path, message }]

/** The torque that everything is judged about: the target, else that of the last torque stage. */
export function statedTarget({ target, stages }: SaidTorque): Quantity | null {
  return target ?? stages?.findLast(stage => stage.kind === 'torque')?.target ?? null
}

/**
 * Target and limits of a spec in N·m; without a tolerance of its own by the shop's default percent, without a target by
 * the last torque stage or the midpoint of the limits. @throws RangeError where bandIssues finds something
 */
export function specLimits(said: SaidTorque, shopDefaultPercent: number): Limits {
  const target = said.tolerance?.kind === 'limits' ? said.target ?? null : statedTarget(said)
  return limitsOf(target, said.tolerance ?? null, shopDefaultPercent)
}

/** What is wrong with target and tolerance together. */
export function bandIssues(said: SaidTorque): RuleIssue[] {
  const { tolerance } = said
  const target = statedTarget(said)
  const targetNm = target && toNm(target)
  if (targetNm !== null && targetNm < smallestNm) return issue('That is too small for a torque.', 'target')
  if (tolerance?.kind === 'limits') return limitsIssues(tolerance, said.target ? targetNm : null)
  if (targetNm === null) return issue('Give a target, or a lower and an upper limit.', 'target')
  if (tolerance?.kind === 'absolute' && toNm(tolerance) >= targetNm) {
    return issue('The tolerance must be smaller than the target.', 'tolerance', 'value')
  }
  const { lowerNm, upperNm } = specLimits(said, 10)
  return lowerNm < targetNm && targetNm < upperNm ? [] : issue('So small a tolerance leaves no band.', 'tolerance', 'value')
}

function limitsIssues({ lower, upper }: { lower: Quantity, upper: Quantity }, targetNm: number | null): RuleIssue[] {
  const [lowerNm, upperNm] = [toNm(lower), toNm(upper)]
  if (lowerNm < smallestNm) return issue('That is too small for a torque.', 'tolerance', 'lower')
  if (lowerNm >= upperNm) return issue('The upper limit must be above the lower one.', 'tolerance', 'upper')
  const outside = targetNm !== null && (targetNm < lowerNm || targetNm > upperNm)
  return outside ? issue('The target lies outside the limits.', 'target') : []
}

function positionIssues({ boltCount, pattern, places = [], order }: SaidSpec): RuleIssue[] {
  const count = boltCount ?? order?.length ?? 0
  const numbers = places.map(place => place.position)
  const placed = places.filter(place => place.x !== undefined && place.y !== undefined)
  const drawn = new Set(placed.map(place => place.position))
  return [
    ...(order && !isPermutation(order, count)
      ? issue(`Name each position from 1 to ${count} once.`, 'order')
      : []),
    ...(pattern === 'two_rows' && boltCount !== undefined && boltCount % 2 === 1
      ? issue('Two rows need an even number of bolts.', 'boltCount')
      : []),
    ...numbers.flatMap((position, index) => {
      if (numbers.indexOf(position) !== index) return issue('This position is drawn already.', 'places', index, 'position')
      const isThere = boltCount === undefined || position <= boltCount
      return isThere ? [] : issue(`There are only ${boltCount} bolts.`, 'places', index, 'position')
    }),
    ...(pattern === 'free' && boltCount === undefined ? issue('Say how many bolts are drawn.', 'boltCount') : []),
    ...(pattern === 'free' && boltCount !== undefined && drawn.size < boltCount
      ? issue('Say for each bolt where it sits.', 'places')
      : []),
  ]
}

function stageIssues({ stages }: SaidSpec): RuleIssue[] {
  return stages?.every(stage => stage.kind === 'snug')
    ? issue('Give at least one stage that is tightened to a torque or an angle.', 'stages')
    : []
}

function smallIssues({ printed, printedLimits, runningTorque, tolerance, stages = [] }: SaidSpec): RuleIssue[] {
  const quantities: [Quantity | undefined, ...(string | number)[]][] = [
    [printed, 'printed'],
    [printedLimits?.lower, 'printedLimits', 'lower'],
    [printedLimits?.upper, 'printedLimits', 'upper'],
    [runningTorque, 'runningTorque'],
    [tolerance?.kind === 'absolute' ? tolerance : undefined, 'tolerance', 'value'],
    ...stages.map((stage, index): [Quantity | undefined, ...(string | number)[]] =>
      ['target' in stage ? stage.target : undefined, 'stages', index, 'target']),
  ]
  return quantities.flatMap(([quantity, ...path]) =>
    quantity && toNm(quantity) < smallestNm ? issue('That is too small for a torque.', ...path) : [])
}

/**
 * What is wrong with a spec revision taken together, by field: the form says it while it is filled in, and the server
 * refuses it. Source: own rules.
 */
export function specIssues(said: SaidSpec): RuleIssue[] {
  const { printedLimits, preparation = [], appliesTo, retorque } = said
  const codes = preparation.map(step => step.code)
  const small = smallIssues(said)
  return [
    ...positionIssues(said),
    ...stageIssues(said),
    ...small,
    ...(small.length > 0 ? [] : bandIssues(said)),
    ...(printedLimits && toNm(printedLimits.lower) >= toNm(printedLimits.upper)
      ? issue('The upper limit must be above the lower one.', 'printedLimits', 'upper')
      : []),
    ...codes.flatMap((code, index) => codes.indexOf(code) === index
      ? []
      : issue('This step is named already.', 'preparation', index, 'code')),
    ...((appliesTo?.yearFrom ?? 0) > (appliesTo?.yearTo ?? Infinity)
      ? issue('The last year must not be before the first.', 'appliesTo', 'yearTo')
      : []),
    ...(retorque && Object.keys(retorque).length === 0 ? issue('Say after how many kilometres or days.', 'retorque') : []),
  ]
}
