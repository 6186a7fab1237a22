import configureMeasurements from 'convert-units'

/** The torque units the product knows, as they are written in JSON. */
export const torqueUnits = ['N.m', 'lbf.ft', 'lbf.in', 'ozf.in', 'kgf.m', 'kgf.cm', 'cN.m', 'dN.m', 'kN.m'] as const

export type TorqueUnit = typeof torqueUnits[number]

/** A torque as it was entered or printed. */
export interface Quantity {
  value: number
  unit: TorqueUnit
}

// Exact by definition: 1 lb = 0.453 592 37 kg, g_n = 9.806 65 m/s², 1 ft = 0.3048 m, 1 in = 0.0254 m.
const poundForceN = 4.4482216152605
const kilogramForceN = 9.80665

const unit = (name: string, newtonMetres: number) => ({
  name: { singular: name, plural: name },
  to_anchor: newtonMetres,
})

// The library's own torque factors are rounded (lbf·ft is 3.8e-8 too large), so it gets exact ones from us.
const convert = configureMeasurements<'torque', 'all', TorqueUnit>({
  torque: {
    systems: {
      all: {
        'N.m': unit('newton metre', 1),
        'lbf.ft': unit('pound-force foot', poundForceN * 0.3048),
        'lbf.in': unit('pound-force inch', poundForceN * 0.0254),
        'ozf.in': unit('ounce-force inch', poundForceN * 0.0254 / 16),
        'kgf.m': unit('kilogram-force metre', kilogramForceN),
        'kgf.cm': unit('kilogram-force centimetre', kilogramForceN / 100),
        'cN.m': unit('centinewton metre', 0.01),
        'dN.m': unit('decinewton metre', 0.1),
        'kN.m': unit('kilonewton metre', 1000),
      },
    },
  },
})

/** Whether `x` is one of the torque units the product knows. */
export function isTorqueUnit(x: unknown): x is TorqueUnit {
  return torqueUnits.some(known => known === x)
}

/**
 * Converts a torque between two units in one step, at full precision.
 * Source: exact definitions of lb, g_n, ft and in; agrees with GNU units 2.22 and NIST SP 811 B.8 [memory].
 */
export function convertTorque(value: number, from: TorqueUnit, to: TorqueUnit): number {
  // The library takes NaN for zero; here what is no number must stay none.
  return Number.isNaN(value) ? value : convert(value).from(from).to(to)
}

/** The torque in N·m, at full precision. */
export function toNm(quantity: Quantity): number {
  return convertTorque(quantity.value, quantity.unit, 'N.m')
}

/** A torque of `nm` N·m in another unit, at full precision. */
export function fromNm(nm: number, unit: TorqueUnit): number {
  return convertTorque(nm, 'N.m', unit)
}
