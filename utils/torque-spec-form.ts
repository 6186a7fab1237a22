import type { BoltPlace } from '#shared/schemas/torque-specs'
import { counterpartUnit } from '#shared/torque/quantity'
import type { Pattern } from '#shared/torque/order'
import type { StageKind } from '#shared/torque/stages'
import type { Tolerance } from '#shared/torque/tolerance'
import type { Quantity, TorqueUnit } from '#shared/torque/units'
import type { JointClass, SpecKind } from '#shared/types/words'
import type { QuantityEntry } from '~/components/torque/QuantityInput.vue'
import type { RunningRule } from './torque-spec-words'

export interface StageEntry {
  key: number
  kind: StageKind
  target: QuantityEntry
  percent: string
  angleDeg: string
  toleranceDeg: string
}

export interface PreparationEntry {
  key: number
  /** Made from the text the first time; kept afterwards, since sign-offs name it. */
  code: string
  text: string
  required: boolean
}

/** Everything a spec's form holds, as typed. */
export interface SpecForm {
  kind: SpecKind
  component: string
  application: string
  make: string
  model: string
  engine: string
  yearFrom: string
  yearTo: string
  jointClass: JointClass
  boltCount: string
  pattern: Pattern | ''
  order: string
  longBolts: string
  /** Where bolts sit, as an earlier revision drew them. */
  places: BoltPlace[]
  thread: string
  propertyClass: string
  threadCondition: string
  leftHand: boolean
  runningTorque: QuantityEntry
  runningRule: RunningRule
  target: QuantityEntry
  printed: QuantityEntry
  toleranceKind: 'shop' | Tolerance['kind']
  percent: string
  margin: QuantityEntry
  lower: QuantityEntry
  upper: QuantityEntry
  printedLower: QuantityEntry
  printedUpper: QuantityEntry
  stages: StageEntry[]
  preparation: PreparationEntry[]
  secondCheckRequired: boolean
  oneTimeUse: boolean
  retorqueKm: string
  retorqueDays: string
  retorqueNote: string
  caution: string
  sourceTitle: string
  sourceSection: string
  sourcePage: string
  sourceDate: string
}

export const emptyQuantity = (unit: TorqueUnit): QuantityEntry => ({ text: '', value: null, unit })
export const quantityEntry = ({ value, unit }: Quantity): QuantityEntry => ({ text: String(value), value, unit })
/** The torque typed, or null while there is none. */
export const quantityOf = ({ value, unit }: QuantityEntry): Quantity | null => value === null ? null : { value, unit }

/** A form with nothing in it; `unit` is offered first. */
export function emptySpecForm(unit: TorqueUnit = 'N.m'): SpecForm {
  const beside = counterpartUnit(unit)
  return {
    kind: 'joint', component: '', application: '', make: '', model: '', engine: '', yearFrom: '', yearTo: '',
    jointClass: 'general', boltCount: '', pattern: '', order: '', longBolts: '', places: [], thread: '', propertyClass: '',
    threadCondition: '', leftHand: false, runningTorque: emptyQuantity(unit), runningRule: 'not_added',
    target: emptyQuantity(unit), printed: emptyQuantity(beside), toleranceKind: 'shop', percent: '10',
    margin: emptyQuantity(unit), lower: emptyQuantity(unit), upper: emptyQuantity(unit),
    printedLower: emptyQuantity(beside), printedUpper: emptyQuantity(beside), stages: [], preparation: [],
    secondCheckRequired: false, oneTimeUse: false, retorqueKm: '', retorqueDays: '', retorqueNote: '', caution: '',
    sourceTitle: '', sourceSection: '', sourcePage: '', sourceDate: '',
  }
}

/** A key no entry of the list has. */
export const nextKey = (entries: readonly { key: number }[]): number => Math.max(0, ...entries.map(entry => entry.key)) + 1

/** The next stage, of the kind that most often follows: a torque first, then an angle. */
export function newStage(stages: readonly StageEntry[], unit: TorqueUnit): StageEntry {
  return {
    key: nextKey(stages), kind: stages.length === 0 ? 'torque' : 'angle',
    target: emptyQuantity(unit), percent: '', angleDeg: '', toleranceDeg: '',
  }
}

/** The list with one entry moved by `step` places; unchanged where it cannot move. */
export function moved<T>(list: readonly T[], index: number, step: -1 | 1): T[] {
  const next = [...list]
  const [one, other] = [next[index], next[index + step]]
  if (one !== undefined && other !== undefined) next.splice(Math.min(index, index + step), 2, ...(step === 1 ? [other, one] : [one, other]))
  return next
}
