import type { WrenchAnswer } from '#shared/schemas/wrenches'
import { toNm, type TorqueUnit } from '#shared/torque/units'
import type { WrenchKind } from '#shared/types/words'
import { classOf, permissiblePercent, type ToolClass } from '#shared/wrench/classes'
import { FieldReader, type FormReading } from './form-issues'

/** Everything a wrench's form holds, as typed. Range and graduation share one unit, the one on the scale. */
export interface WrenchForm {
  assetTag: string
  serial: string
  kind: WrenchKind
  toolClass: ToolClass | ''
  min: string
  max: string
  unit: TorqueUnit
  graduation: string
  gripLengthMm: string
  drive: string
  clockwise: boolean
  anticlockwise: boolean
  permissiblePercent: string
  intervalMonths: string
  intervalCycles: string
  location: string
}

/** A new wrench, with the interval that stands where a shop has none of its own: ISO 6789-1:2017 cl. 5.3 [memory]. */
export function emptyWrenchForm(unit: TorqueUnit = 'N.m'): WrenchForm {
  return {
    assetTag: '', serial: '', kind: 'setting', toolClass: '', min: '', max: '', unit, graduation: '', gripLengthMm: '',
    drive: '', clockwise: true, anticlockwise: false, permissiblePercent: '', intervalMonths: '12',
    intervalCycles: '5000', location: '',
  }
}

const typed = (value: number | string | null) => value === null ? '' : String(value)

/** The form as it would have been filled in to give this wrench. */
export function wrenchFormFrom(wrench: WrenchAnswer): WrenchForm {
  // What the class says anyway was not typed, and follows the class when that is changed.
  const ownPercent = wrench.permissiblePercent !== permissiblePercent(classOf(wrench), wrench.range.maxNm)
  return {
    assetTag: wrench.assetTag, serial: wrench.serial, kind: wrench.kind, toolClass: wrench.toolClass ?? '',
    min: typed(wrench.range.min), max: typed(wrench.range.max), unit: wrench.range.unit,
    graduation: typed(wrench.graduation?.value ?? null), gripLengthMm: typed(wrench.gripLengthMm), drive: typed(wrench.drive),
    clockwise: wrench.directions?.includes('clockwise') ?? false, anticlockwise: wrench.directions?.includes('anticlockwise') ?? false,
    permissiblePercent: ownPercent ? typed(wrench.permissiblePercent) : '', intervalMonths: typed(wrench.intervalMonths),
    intervalCycles: typed(wrench.intervalCycles), location: typed(wrench.location),
  }
}

/** What the form says, in the words of the API; what is empty is left out. */
export function readWrenchForm(form: WrenchForm): FormReading {
  const read = new FieldReader()
  const graduation = read.number('graduation.value', form.graduation)
  const directions = [...form.clockwise ? ['clockwise'] : [], ...form.anticlockwise ? ['anticlockwise'] : []]
  const value = {
    assetTag: form.assetTag,
    serial: form.serial,
    kind: form.kind,
    toolClass: form.toolClass || undefined,
    range: { min: read.number('range.min', form.min), max: read.number('range.max', form.max), unit: form.unit },
    graduation: graduation === undefined ? undefined : { value: graduation, unit: form.unit },
    gripLengthMm: read.number('gripLengthMm', form.gripLengthMm),
    drive: read.text(form.drive),
    directions: directions.length > 0 ? directions : undefined,
    permissiblePercent: read.number('permissiblePercent', form.permissiblePercent),
    intervalMonths: read.number('intervalMonths', form.intervalMonths),
    intervalCycles: read.number('intervalCycles', form.intervalCycles),
    location: read.text(form.location),
  }
  return { value, issues: read.issues }
}

/**
 * The deviation that class and range permit, where none of its own is typed: said when a wrench is changed, since the one
 * kept would otherwise stay behind. The form as it is while the range is no number.
 */
function withPermissiblePercent(form: WrenchForm): WrenchForm {
  const max = Number(form.max.replace(',', '.'))
  if (form.permissiblePercent.trim() || !(max > 0)) return form
  const toolClass = classOf({ kind: form.kind, toolClass: form.toolClass || null })
  return { ...form, permissiblePercent: String(permissiblePercent(toolClass, toNm({ value: max, unit: form.unit }))) }
}

/** Only what the form after a change says otherwise than before, for a PATCH. */
export function wrenchChange(before: WrenchForm, after: WrenchForm): FormReading {
  const { value, issues } = readWrenchForm(withPermissiblePercent(after))
  const old = Object.entries(readWrenchForm(withPermissiblePercent(before)).value ?? {})
  const changed = Object.entries(value ?? {})
    .filter(([key, said]) => JSON.stringify(said) !== JSON.stringify(old.find(([name]) => name === key)?.[1]))
  return { value: Object.fromEntries(changed), issues }
}
