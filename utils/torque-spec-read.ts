import type { BoltPlace, CreateSpecBody } from '#shared/schemas/torque-specs'
import { preparationTexts } from '#shared/torque/preparation'
import { countOf, placesFor, readPrintedOrder, readPositions } from './bolt-numbers'
import { FieldReader, type FormReading } from './form-issues'
import type { PreparationEntry, SpecForm, StageEntry } from './torque-spec-form'

/** A code for a preparation step that no other step has: the usual one for a usual step, else made from its words. */
export function preparationCode(text: string, taken: readonly string[]): string {
  const plain = text.trim().toLowerCase()
  const usual = Object.entries(preparationTexts).find(([, words]) => words.toLowerCase() === plain)?.[0]
  const made = plain.normalize('NFKD').replace(/[^a-z0-9]+/g, '_').replace(/^[^a-z]+|_+$/g, '').slice(0, 32)
  const base = usual ?? (made || 'step')
  if (!taken.includes(base)) return base
  for (let n = 2; ; n++) if (!taken.includes(`${base}_${n}`)) return `${base}_${n}`
}

/** What the form says, in the words of the API. `revise`: a further revision, which does not name the joint again. */
export function readSpecForm(form: SpecForm, revise = false): FormReading {
  const read = new FieldReader()
  const count = countOf(form.boltCount)
  const order = readPrintedOrder(form.order, count, form.pattern)
  const long = readPositions(form.longBolts, count, form.pattern)
  if (!order.ok) read.issues.push({ path: 'order', message: order.message })
  if (!long.ok) read.issues.push({ path: 'places', message: long.message })

  const appliesTo = {
    make: read.text(form.make), model: read.text(form.model), engine: read.text(form.engine),
    yearFrom: read.number('appliesTo.yearFrom', form.yearFrom), yearTo: read.number('appliesTo.yearTo', form.yearTo),
  }
  const retorque = {
    afterKm: read.number('retorque.afterKm', form.retorqueKm), afterDays: read.number('retorque.afterDays', form.retorqueDays),
    note: read.text(form.retorqueNote),
  }
  const running = read.quantity('runningTorque', form.runningTorque)
  const identity: Partial<Record<keyof CreateSpecBody, unknown>> = revise
    ? {}
    : { kind: form.kind, component: form.component, application: form.application, appliesTo: said(appliesTo) }
  const value: Partial<Record<keyof CreateSpecBody, unknown>> = {
    ...identity,
    jointClass: form.jointClass,
    boltCount: read.number('boltCount', form.boltCount),
    pattern: form.pattern || undefined,
    places: readPlaces(form, long.ok ? long.positions : [], count),
    order: order.ok && order.positions.length > 0 ? order.positions : undefined,
    thread: read.text(form.thread),
    propertyClass: read.text(form.propertyClass),
    threadCondition: read.text(form.threadCondition),
    leftHand: form.leftHand || undefined,
    runningTorque: running && { ...running, rule: form.runningRule },
    target: read.quantity('target', form.target),
    printed: read.quantity('printed', form.printed),
    ...readTolerance(form, read),
    stages: form.stages.length > 0 ? form.stages.map((stage, index) => readStage(stage, `stages.${index}`, read)) : undefined,
    preparation: readPreparation(form.preparation),
    secondCheckRequired: form.secondCheckRequired,
    oneTimeUse: form.oneTimeUse || undefined,
    retorque: said(retorque),
    caution: read.text(form.caution),
    source: {
      title: form.sourceTitle, section: read.text(form.sourceSection),
      page: read.text(form.sourcePage), date: read.text(form.sourceDate),
    },
  }
  return { value, issues: read.issues }
}

/** The object, where anything in it is said at all. */
function said<T extends object>(fields: T): T | undefined {
  return Object.values(fields).some(value => value !== undefined) ? fields : undefined
}

function readTolerance(form: SpecForm, read: FieldReader) {
  if (form.toleranceKind === 'shop') return { tolerance: null }
  if (form.toleranceKind === 'percent') return { tolerance: { kind: 'percent', value: read.number('tolerance.value', form.percent) } }
  if (form.toleranceKind === 'absolute') return { tolerance: { kind: 'absolute', ...read.quantity('tolerance.value', form.margin) } }
  const lower = read.quantity('tolerance.lower', form.lower)
  const upper = read.quantity('tolerance.upper', form.upper)
  const printed = { lower: read.quantity('printedLimits.lower', form.printedLower), upper: read.quantity('printedLimits.upper', form.printedUpper) }
  return { tolerance: { kind: 'limits', lower, upper }, printedLimits: said(printed) }
}

function readStage(stage: StageEntry, path: string, read: FieldReader) {
  switch (stage.kind) {
    case 'snug':
    case 'torque':
      return { kind: stage.kind, target: read.quantity(`${path}.target`, stage.target) }
    case 'percent':
      return { kind: stage.kind, percent: read.number(`${path}.percent`, stage.percent) }
    case 'angle':
      return {
        kind: stage.kind, angleDeg: read.number(`${path}.angleDeg`, stage.angleDeg),
        toleranceDeg: read.number(`${path}.toleranceDeg`, stage.toleranceDeg),
      }
  }
}

function readPreparation(entries: readonly PreparationEntry[]) {
  const taken = entries.map(entry => entry.code).filter(Boolean)
  const steps = entries.map(({ code, text, required }) => {
    const made = code || preparationCode(text, taken)
    taken.push(made)
    return { code: made, text, required }
  })
  return steps.length > 0 ? steps : undefined
}

/** Where the bolts sit, for a pattern drawn as it is; else only which ones are long. */
function readPlaces(form: SpecForm, long: readonly number[], count: number | null): BoltPlace[] | undefined {
  const drawn = form.pattern === 'free' && count !== null
    ? placesFor(form.places, count)
    : long.map(position => ({ position }))
  const places = drawn.map(place => long.includes(place.position) ? { ...place, long: true } : place)
  return places.length > 0 ? places : undefined
}

/** Fields of the API that have their own place in the form. */
export const specFields = [
  'component', 'application', 'appliesTo', 'boltCount', 'pattern', 'order', 'places', 'thread', 'propertyClass',
  'threadCondition', 'runningTorque', 'target', 'printed', 'printedLimits', 'tolerance', 'stages', 'preparation',
  'retorque', 'caution', 'source',
]
