import { describe, expect, it } from 'vitest'
import { convertTorque, type TorqueUnit } from '#shared/torque/units'

// Source: exact definitions (lb 0.453 592 37 kg; g_n 9.806 65 m/s²; ft 0.3048 m), recomputed with exact fractions;
// GNU units 2.22 and mathjs 15.2.0 agree; NIST SP 811 App. B.8 prints the same rounded digits [memory].
const rows: { value: number, from: TorqueUnit, to: TorqueUnit, expected: number }[] = [
  { value: 1, from: 'lbf.ft', to: 'N.m', expected: 1.3558179483314 },
  { value: 1, from: 'lbf.in', to: 'N.m', expected: 0.112984829027617 },
  { value: 1, from: 'ozf.in', to: 'N.m', expected: 0.00706155181422604 },
  { value: 1, from: 'kgf.m', to: 'N.m', expected: 9.80665 },
  { value: 1, from: 'kgf.cm', to: 'N.m', expected: 0.0980665 },
  { value: 1, from: 'dN.m', to: 'N.m', expected: 0.1 },
  { value: 1, from: 'cN.m', to: 'N.m', expected: 0.01 },
  { value: 1, from: 'kN.m', to: 'N.m', expected: 1000 },
  { value: 1, from: 'N.m', to: 'lbf.ft', expected: 0.737562149277265 },
  { value: 1, from: 'N.m', to: 'lbf.in', expected: 8.85074579132718 },
  { value: 1, from: 'kgf.m', to: 'lbf.ft', expected: 7.23301385120989 },
  { value: 22, from: 'lbf.ft', to: 'N.m', expected: 29.8279948632908 },
  { value: 37, from: 'lbf.ft', to: 'N.m', expected: 50.1652640882618 },
  { value: 30, from: 'N.m', to: 'lbf.ft', expected: 22.126864478318 },
  { value: 50, from: 'N.m', to: 'lbf.ft', expected: 36.8781074638633 },
  { value: 12, from: 'lbf.in', to: 'lbf.ft', expected: 1 },
  { value: 16, from: 'ozf.in', to: 'lbf.in', expected: 1 },
]

describe('torque units: exact definitions, GNU units, mathjs, NIST SP 811 B.8 [memory]', () => {
  it.each(rows)('$value $from is $expected $to', ({ value, from, to, expected }) => {
    expect(Math.abs(convertTorque(value, from, to) / expected - 1)).toBeLessThan(2e-14)
  })
})
