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

/** Newton metres in one of each unit, exact: the library's own factors are rounded (lbf·ft is 3.8e-8 too large). */
const newtonMetres: Record<TorqueUnit, number> = {
  'N.m': 1,
  'lbf.ft': poundForceN * 0.3048,
  'lbf.in': poundForceN * 0.0254,
  'ozf.in': poundForceN * 0.0254 / 16,
  'kgf.m': kilogramForceN,
  'kgf.cm': kilogramForceN / 100,
  'cN.m': 0.01,
  'dN.m': 0.1,
  'kN.m': 1000,
}

const named = (unit: TorqueUnit) => ({ name: { singular: unit, plural: unit }, to_anchor: newtonMetres[unit] })

let configured: ReturnType<typeof configure> | undefined
/** The converter with our torque measure. Made when first asked for, so that a screen that only reads N·m loads none of it. */
const configure = () => configureMeasurements<'torque', 'all', TorqueUnit>({
  torque: {
    systems: {
      all: {
        'N.m': named('N.m'),
        'lbf.ft': named('lbf.ft'),
        'lbf.in': named('lbf.in'),
        'ozf.in': named('ozf.in'),
        'kgf.m': named('kgf.m'),
        'kgf.cm': named('kgf.cm'),
        'cN.m': named('cN.m'),
        'dN.m': named('dN.m'),
        'kN.m': named('kN.m'),
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
  if (Number.isNaN(value)) return value
  configured ??= configure()
  return configured(value).from(from).to(to)
}

/** The torque in N·m, at full precision: one multiplication by the same exact factor that the converter has. */
export function toNm(quantity: Quantity): number {
  return quantity.value * newtonMetres[quantity.unit]
}

/** A torque of `nm` N·m in another unit, at full precision. */
export function fromNm(nm: number, unit: TorqueUnit): number {
  return nm / newtonMetres[unit]
}
