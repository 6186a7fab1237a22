import type { SpecDetail, SpecRevisionAnswer } from '#shared/schemas/torque-specs'
import { fromNm, type Quantity, type TorqueUnit } from '#shared/torque/units'
import type { QuantityEntry } from '~/components/torque/QuantityInput.vue'
import { emptyQuantity, emptySpecForm, quantityEntry, type SpecForm, type StageEntry } from './torque-spec-form'

/** A torque answered in N·m alone, in the unit of the spec's target where it comes out round there. */
function inUnitOf(nm: number, unit: TorqueUnit): Quantity {
  const value = Number(fromNm(nm, unit).toPrecision(12))
  return Number(value.toFixed(3)) === value ? { value, unit } : { value: Number(nm.toPrecision(12)), unit: 'N.m' }
}

function stageEntries({ stages, limits }: SpecRevisionAnswer, unit: TorqueUnit): StageEntry[] {
  const only = stages.length === 1 ? stages[0] : undefined
  if (only?.kind === 'torque' && only.targetNm === limits.targetNm) return []
  return stages.map((stage, index) => ({
    key: index + 1,
    kind: stage.kind,
    target: stage.targetNm !== null && stage.kind !== 'percent' ? quantityEntry(inUnitOf(stage.targetNm, unit)) : emptyQuantity(unit),
    percent: stage.kind === 'percent' && stage.targetNm !== null ? String(Number((100 * stage.targetNm / limits.targetNm).toPrecision(10))) : '',
    angleDeg: stage.angleDeg === null ? '' : String(stage.angleDeg),
    toleranceDeg: stage.toleranceDeg === null ? '' : String(stage.toleranceDeg),
  }))
}

const typed = (value: string | number | null | undefined) => value === null || value === undefined ? '' : String(value)

/** The form as it would have been filled in to give this revision. */
export function specFormFrom(spec: SpecDetail, revision: SpecRevisionAnswer): SpecForm {
  const { tolerance, printedLimits, target, printed } = revision
  const unit = target?.unit ?? (tolerance?.kind === 'limits' ? tolerance.lower.unit : 'N.m')
  const form = emptySpecForm(unit)
  const entry = (quantity: Quantity | null | undefined, otherwise: QuantityEntry) => quantity ? quantityEntry(quantity) : otherwise
  return {
    ...form,
    kind: spec.kind, component: spec.component, application: spec.application,
    make: typed(spec.appliesTo?.make), model: typed(spec.appliesTo?.model), engine: typed(spec.appliesTo?.engine),
    yearFrom: typed(spec.appliesTo?.yearFrom), yearTo: typed(spec.appliesTo?.yearTo),
    jointClass: revision.jointClass, boltCount: typed(revision.boltCount), pattern: revision.pattern ?? '',
    order: revision.order?.join(' ') ?? '',
    places: revision.places,
    longBolts: revision.places.filter(place => place.long).map(place => place.position).join(' '),
    thread: typed(revision.thread), propertyClass: typed(revision.propertyClass), threadCondition: typed(revision.threadCondition),
    leftHand: revision.leftHand, runningTorque: entry(revision.runningTorque, form.runningTorque),
    runningRule: revision.runningTorque?.rule ?? 'not_added',
    target: entry(target, form.target), printed: entry(printed, form.printed),
    toleranceKind: tolerance?.kind ?? 'shop',
    percent: tolerance?.kind === 'percent' ? String(tolerance.value) : form.percent,
    margin: tolerance?.kind === 'absolute' ? quantityEntry(tolerance) : form.margin,
    lower: tolerance?.kind === 'limits' ? quantityEntry(tolerance.lower) : form.lower,
    upper: tolerance?.kind === 'limits' ? quantityEntry(tolerance.upper) : form.upper,
    printedLower: entry(printedLimits?.lower, form.printedLower), printedUpper: entry(printedLimits?.upper, form.printedUpper),
    stages: stageEntries(revision, unit),
    preparation: revision.preparation.map((step, index) => ({ key: index + 1, ...step })),
    secondCheckRequired: revision.secondCheckRequired, oneTimeUse: revision.oneTimeUse,
    retorqueKm: typed(revision.retorque?.afterKm), retorqueDays: typed(revision.retorque?.afterDays), retorqueNote: typed(revision.retorque?.note),
    caution: typed(revision.caution), sourceTitle: revision.source.title, sourceSection: typed(revision.source.section),
    sourcePage: typed(revision.source.page), sourceDate: typed(revision.source.date),
  }
}
