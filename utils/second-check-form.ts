import { secondCheckBody, type SecondCheckBody, type SecondCheckWaiting } from '#shared/schemas/sign-offs'
import { wrenchSetting } from '#shared/torque/adapter'
import { formatNumber, parseQuantity } from '#shared/torque/quantity'
import type { Quantity, TorqueUnit } from '#shared/torque/units'
import type { SecondCheckMethod } from '#shared/types/words'
import { FieldReader, readForm } from './form-issues'

export interface TorqueEntry {
  text: string
  value: number | null
  unit: TorqueUnit
}

/** A second check while it is being made. */
export interface SecondCheckEntry {
  method: SecondCheckMethod | ''
  wrenchId: string
  /** What the wrench was set to, for every bolt. */
  setting: TorqueEntry
  /** By position: whether the bolt held until the click, or turned before it. */
  turned: Record<number, 'held' | 'turned' | ''>
  /** By position: the torque at which the bolt moved on. */
  residual: Record<number, TorqueEntry>
  note: string
}

/** A torque as if it had been typed. */
export const typed = ({ value, unit }: Quantity): TorqueEntry => ({ text: formatNumber(value), value: Number(formatNumber(value)), unit })

/** Nothing chosen yet; torques are entered in the unit of the target. */
export function emptyCheck({ positions, signOff }: Pick<SecondCheckWaiting, 'positions'> & { signOff: Pick<SecondCheckWaiting['signOff'], 'target'> }): SecondCheckEntry {
  const unit = signOff.target?.unit ?? 'N.m'
  const blank = () => ({ text: '', value: null, unit })
  return {
    method: '',
    wrenchId: '',
    setting: blank(),
    turned: Object.fromEntries(positions.map(position => [position, '' as const])),
    residual: Object.fromEntries(positions.map(position => [position, blank()])),
    note: '',
  }
}

/** What to set on a wrench for checking a target (N·m): its nearest graduation, else the target in the unit asked for. */
export function settingFor(targetNm: number, unit: TorqueUnit, graduation: Quantity | null): TorqueEntry {
  const { setting, rounded } = wrenchSetting({ targetNm, unit, graduation })
  return typed(rounded ?? setting)
}

function readReadings(entry: SecondCheckEntry, positions: readonly number[], read: FieldReader) {
  if (entry.method === 'witness') return undefined
  if (entry.method === 'residual') {
    return positions.flatMap((position) => {
      const given = entry.residual[position]
      if (!given?.text.trim()) read.issues.push({ path: `residual.${position}`, message: `Read bolt ${position} as well.` })
      const quantity = given && read.quantity(`residual.${position}`, given)
      return quantity ? [{ position, ...quantity }] : []
    })
  }
  const parsed = parseQuantity(entry.setting.text, entry.setting.unit)
  if (!parsed.ok) read.issues.push({ path: 'setting', message: parsed.message })
  return positions.flatMap((position) => {
    const found = entry.turned[position]
    if (!found) read.issues.push({ path: `turned.${position}`, message: `Say whether bolt ${position} held.` })
    return parsed.ok && found ? [{ position, value: parsed.value, unit: parsed.unit, turned: found === 'turned' }] : []
  })
}

/**
 * The check as it is signed, without the PIN.
 * @throws ApiError 400 `invalid` with every issue; paths of bolts are `turned.<position>` and `residual.<position>`
 */
export function readSecondCheck(entry: SecondCheckEntry, { signOffId, positions, at }: { signOffId: string, positions: readonly number[], at: string }): SecondCheckBody {
  const read = new FieldReader()
  if (entry.method === '') read.issues.push({ path: 'method', message: 'Say how you checked it.' })
  if (entry.method !== '' && entry.method !== 'witness' && !entry.wrenchId) read.issues.push({ path: 'wrenchId', message: 'Say with which wrench.' })
  const readings = entry.method === '' ? undefined : readReadings(entry, positions, read)
  const value = {
    signOffId,
    method: entry.method,
    ...(entry.method === 'witness' ? {} : { wrenchId: entry.wrenchId, readings }),
    note: read.text(entry.note),
    at,
    capturedOffline: false,
  }
  return readForm(secondCheckBody, { value, issues: read.issues })
}
