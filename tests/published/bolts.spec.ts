import { describe, expect, it } from 'vitest'
import {
  assemblyByVdi2230, preloadBand, proofLoad, recommendedPreload, torqueByLongForm, torqueByShigley, torqueFromPreload,
  torqueScatter,
} from '#shared/fastener/preload'
import { strengthOf } from '#shared/fastener/strength'
import { parseThread, stressAreaInch, stressAreaMetric } from '#shared/fastener/thread'

// Source: ISO 898-1 Table (A_s,nom) [seen: reproduced tables], recomputed; `table` is the printed nominal area, mm².
const metricAreas = [
  { d: 6, P: 1, expected: 20.1233774803668 },
  { d: 8, P: 1.25, expected: 36.6085432737652 },
  { d: 8, P: 1, expected: 39.1671026774533 },
  { d: 10, P: 1.5, expected: 57.9895969018452 },
  { d: 12, P: 1.75, expected: 84.2665383646069 },
  { d: 16, P: 2, expected: 156.668410709813 },
  { d: 20, P: 2.5, expected: 244.794391734083 },
]
const metricTable = [20.1, 36.6, 39.2, 58.0, 84.3, 157, 245]

// Source: Shigley 9e Table 8-2 (ASME B1.1) [seen: textbook page 413], recomputed; areas in in².
const inchAreas = [
  { D: 0.25, n: 20, expected: 0.031821250048458 },
  { D: 0.375, n: 16, expected: 0.0774901794620381 },
  { D: 0.5, n: 13, expected: 0.141899571161415 },
  { D: 0.75, n: 16, expected: 0.372961423212366 },
]
const inchTable = [0.0318, 0.0775, 0.1419, 0.373]

// Source: ISO 898-1 proof-load table [seen: reproduced table], recomputed; N.
const proofLoads = [
  { cls: '8.8', d: 8, P: 1.25, Sp_MPa: 580, expected: 21232.9550987838 },
  { cls: '10.9', d: 10, P: 1.5, Sp_MPa: 830, expected: 48131.3654285315 },
  { cls: '12.9', d: 12, P: 1.75, Sp_MPa: 970, expected: 81738.5422136687 },
  { cls: '8.8', d: 20, P: 2.5, Sp_MPa: 600, expected: 146876.63504045 },
]
const proofTable = [21200, 48100, 81800, 147000]

// Source: VDI 2230 Part 1, 0.9·R_p0.2; fine threads [seen: table of the 2001 edition], M8 coarse [memory].
const assemblies = [
  {
    d: 8,
    P: 1,
    cls: '8.8',
    Rp02: 640,
    mu: 0.12,
    dw: 11.6,
    dh: 9,
    nu: 0.9,
    expected: { preloadKn: 20.243494380063, torqueNm: 26.1058783163616 },
  },
  {
    d: 12,
    P: 1.25,
    cls: '10.9',
    Rp02: 940,
    mu: 0.12,
    dw: 16.6,
    dh: 13.5,
    nu: 0.9,
    expected: { preloadKn: 70.5606693297876, torqueNm: 132.773436196724 },
  },
  {
    d: 8,
    P: 1.25,
    cls: '8.8',
    Rp02: 640,
    mu: 0.12,
    dw: 11.6,
    dh: 9,
    nu: 0.9,
    expected: { preloadKn: 18.6273192416175, torqueNm: 24.5562430876906 },
  },
]
const assemblyTable = [[20.2, 26.1], [70.5, 133], [18.6, 24.6]] as const

const within = (value: number, reference: number, share: number) =>
  expect(Math.abs(value / reference - 1)).toBeLessThan(share)

describe('threads', () => {
  it.each(metricAreas)('M$d×$P has $expected mm² (ISO 898-1) [seen: reproduced tables]', ({ d, P, expected }) => {
    expect(stressAreaMetric(d, P)).toBeCloseTo(expected, 9)
    expect(parseThread(`M${d}x${P}`)?.stressAreaMm2).toBeCloseTo(expected, 9)
  })

  it('agrees with the printed metric areas within 0.5 %', () => {
    metricAreas.forEach(({ d, P }, index) => within(stressAreaMetric(d, P), metricTable[index] ?? 0, 0.005))
  })

  it.each(inchAreas)('$D in, $n per inch has $expected in² (Shigley 9e Table 8-2) [seen: page 413]', (row) => {
    expect(stressAreaInch(row.D, row.n)).toBeCloseTo(row.expected, 9)
  })

  it('agrees with the printed inch areas within 0.2 %', () => {
    inchAreas.forEach(({ D, n }, index) => within(stressAreaInch(D, n), inchTable[index] ?? 0, 0.002))
  })
})

describe('proof loads (ISO 898-1) [seen: reproduced table]', () => {
  it.each(proofLoads)('class $cls M$d×$P: $expected N', ({ cls, d, P, Sp_MPa, expected }) => {
    const strength = strengthOf(cls, d)
    expect(strength?.proofMPa).toBe(Sp_MPa)
    expect(proofLoad(stressAreaMetric(d, P), strength?.proofMPa ?? 0)).toBeCloseTo(expected, 6)
  })

  it('agrees with the printed loads within 1 %', () => {
    proofLoads.forEach(({ expected }, index) => within(expected, proofTable[index] ?? 0, 0.01))
  })
})

describe('preload and torque', () => {
  it('T = K·F·d: 25 000 lbf, 3/4 in, K 0.2 → 3750 lbf·in (Shigley 9e Ex. 8-3(b)) [seen: p. 439–440]', () => {
    expect(torqueFromPreload(0.2, 25000, 0.75)).toBe(3750)
  })

  it('Eq. (8-26) on the same bolt → 3550.88 lbf·in, book 3551 (Shigley 9e Ex. 8-3(c)) [seen: p. 440]', () => {
    const bolt = { preload: 25000, diameter: 0.75, meanDiameter: 0.7093, lead: 0.0625 }
    expect(torqueByShigley({ ...bolt, threadFriction: 0.15, collarFriction: 0.15 })).toBeCloseTo(3550.88244586181, 8)
  })

  it('reused: 0.75 · 85 000 psi · 0.373 in² → 23 778.75 lbf (Shigley Eqs. (8-31), (8-32)) [seen: p. 442]', () => {
    expect(recommendedPreload(proofLoad(0.373, 85000))).toBeCloseTo(23778.75, 9)
  })

  it('grade 2 1/4-20: 1312 lbf (SAE J429; published table “75 % × proof × area”) [seen], recomputed', () => {
    const area = Number(stressAreaInch(0.25, 20).toFixed(4))
    expect(recommendedPreload(proofLoad(area, 55000))).toBeCloseTo(1311.75, 9)
    const proofPsi = (strengthOf('SAE J429 grade 2', 6.35)?.proofMPa ?? 0) / 0.006894757293168361
    expect(proofPsi).toBeCloseTo(55000, 6)
  })

  it.each(assemblies)('VDI 2230: M$d×$P class $cls, µ $mu → $expected.preloadKn kN', (row) => {
    const index = assemblies.indexOf(row)
    const result = assemblyByVdi2230({
      diameterMm: row.d,
      pitchMm: row.P,
      yieldMPa: strengthOf(row.cls, row.d)?.yieldMPa ?? 0,
      friction: row.mu,
      headDiameterMm: row.dw,
      holeDiameterMm: row.dh,
      utilisation: row.nu,
    })
    expect(strengthOf(row.cls, row.d)?.yieldMPa).toBe(row.Rp02)
    within(result.preloadN / 1000, row.expected.preloadKn, 1e-9)
    within(result.torqueNm, row.expected.torqueNm, 1e-9)
    within(result.preloadN / 1000, assemblyTable[index]?.[0] ?? 0, 0.01)
    within(result.torqueNm, assemblyTable[index]?.[1] ?? 0, 0.01)
  })

  it('long form after Motosh, M10 at 20 kN, µ 0.14 [seen: magazine summary of three long forms], recomputed', () => {
    const result = torqueByLongForm({
      preloadN: 20000,
      diameterMm: 10,
      pitchMm: 1.5,
      threadFriction: 0.14,
      bearingFriction: 0.14,
      bearingDiameterMm: 12.8,
    })
    within(result.pitchNm, 4.77464829275686, 1e-4)
    within(result.threadNm, 14.5908076654357, 1e-4)
    within(result.bearingNm, 17.92, 1e-4)
    within(result.totalNm, 37.2854559581925, 1e-4)
    within(result.nutFactor, 0.186427279790963, 1e-4)
  })

  it('scatters by 35 % unlubricated (NASA-STD-5020B Table 3) [seen: open repository quoting it]', () => {
    expect(preloadBand(20000, torqueScatter.unlubricated)).toEqual({ min: 13000, max: 27000 })
    expect(torqueScatter.lubricated).toBe(0.25)
  })
})
