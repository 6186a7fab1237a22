import { fromNm, toNm, type Quantity, type TorqueUnit } from './units'

/** An adapter that moves the fastener away from the drive, such as a crowfoot. */
export interface Adapter {
  /** Drive centre to fastener centre, mm. */
  extensionMm: number
  /** From straight ahead: 0 lengthens the wrench, 90 changes nothing, 180 (folded back) shortens it. */
  angleDeg: number
  /** Drive centre to grip centre, where the hand must be, mm. */
  effectiveLengthMm: number
}

/** E·cos θ, mm; a right angle gives exactly zero. */
export function reachMm({ extensionMm, angleDeg }: Adapter): number {
  return extensionMm * Math.round(Math.cos(angleDeg * Math.PI / 180) * 1e15) / 1e15
}

/**
 * Torque at the fastener over torque shown on the wrench: (L + E·cos θ)/L, times the multiplier's ratio. Exact when the
 * hand pulls at right angles at the grip centre. Source: US Army TM 9-254 figs 4-5, 4-6; TM 1-1500-204-23-9.
 * @throws RangeError when a length or ratio makes no sense, or the adapter turns the torque round (L + E·cos θ ≤ 0).
 */
export function adapterFactor(adapter?: Adapter | null, multiplierRatio?: number | null): number {
  const ratio = multiplierRatio ?? 1
  if (!(ratio > 0 && Number.isFinite(ratio))) throw new RangeError('The multiplier ratio must be greater than zero.')
  if (!adapter) return ratio
  const length = adapter.effectiveLengthMm
  if (!(length > 0 && Number.isFinite(length))) throw new RangeError('The effective length must be greater than zero.')
  if (!(adapter.extensionMm >= 0)) throw new RangeError('The extension must not be negative.')
  const lever = length + reachMm(adapter)
  if (!(lever > 0 && Number.isFinite(lever))) {
    throw new RangeError('Folded back, the adapter reaches past the grip: no setting gives this torque.')
  }
  return lever / length * ratio
}

/** Torque at the fastener, in the unit of `shown`. @throws RangeError as adapterFactor does. */
export function torqueAtFastener(shown: number, adapter?: Adapter | null, multiplierRatio?: number | null): number {
  return shown * adapterFactor(adapter, multiplierRatio)
}

/** The nearest graduation, a tie down, never below the first one. The unit of `value` is that of `graduation`. */
export function nearestGraduation(value: number, graduation: number): number {
  const steps = value / graduation
  const below = Math.floor(steps + 1e-9)
  const count = Math.max(1, steps - below > 0.5 + 1e-9 ? below + 1 : below)
  return Number((count * graduation).toPrecision(12))
}

export interface WrenchSetting {
  /** The exact setting, in the asked unit. */
  setting: Quantity
  /** The nearest graduation, in the wrench's unit. */
  rounded?: Quantity
  /** What the rounded (else the exact) setting gives at the fastener, in the asked unit. */
  gives: Quantity & { nm: number }
}

export interface WrenchSettingInput {
  targetNm: number
  unit: TorqueUnit
  adapter?: Adapter | null
  multiplierRatio?: number | null
  graduation?: Quantity | null
}

/**
 * What to set on the wrench so that the fastener gets the target: T·L/(L + E·cos θ), then the nearest graduation.
 * @throws RangeError as adapterFactor does, or when target or graduation is not greater than zero.
 */
export function wrenchSetting(input: WrenchSettingInput): WrenchSetting {
  const { targetNm, unit, graduation } = input
  if (!(targetNm > 0 && Number.isFinite(targetNm))) throw new RangeError('The target must be greater than zero.')
  const factor = adapterFactor(input.adapter, input.multiplierRatio)
  const setting = { value: fromNm(targetNm / factor, unit), unit }
  if (!graduation) return { setting, gives: { value: fromNm(targetNm, unit), unit, nm: targetNm } }
  if (!(graduation.value > 0)) throw new RangeError('The graduation must be greater than zero.')
  const exact = fromNm(targetNm / factor, graduation.unit)
  const rounded = { value: nearestGraduation(exact, graduation.value), unit: graduation.unit }
  const nm = toNm(rounded) * factor
  return { setting, rounded, gives: { value: fromNm(nm, unit), unit, nm } }
}
