import { strengthOf } from './strength'
import { minorDiameter, parseThread, pitchDiameter } from './thread'

/** Nut factors K of T = K·F·d. Source: Shigley 9e Table 8-15. */
export const nutFactors = {
  plain: 0.30,
  zinc: 0.20,
  lubricated: 0.18,
  cadmium: 0.16,
  anti_seize: 0.12,
} as const

export type BoltCondition = keyof typeof nutFactors

/**
 * How far the preload scatters about what a torque wrench is meant to give, as a share.
 * Source: NASA-STD-5020B Table 3, torque wrench on unlubricated and on lubricated threads.
 */
export const torqueScatter = { unlubricated: 0.35, lubricated: 0.25 } as const

/** T = K·F·d, in the product of the units of preload and diameter. Source: Shigley 9e Eq. (8-27). */
export function torqueFromPreload(nutFactor: number, preload: number, diameter: number): number {
  return nutFactor * preload * diameter
}

export interface ShigleyInput {
  preload: number
  diameter: number
  meanDiameter: number
  lead: number
  threadFriction: number
  collarFriction: number
}

/**
 * T = [(d_m/2d)·(tan λ + f·sec α)/(1 − f·tan λ·sec α) + 0.625·f_c]·F·d with tan λ = lead/(π·d_m), α = 30°, in the
 * product of the units of preload and diameter. Source: Shigley 9e Eq. (8-26).
 */
export function torqueByShigley(input: ShigleyInput): number {
  const { preload, diameter, meanDiameter, lead, threadFriction, collarFriction } = input
  const tanLead = lead / (Math.PI * meanDiameter)
  const frictionOnFlank = threadFriction / Math.cos(Math.PI / 6)
  const thread = meanDiameter / (2 * diameter) * (tanLead + frictionOnFlank) / (1 - tanLead * frictionOnFlank)
  return (thread + 0.625 * collarFriction) * preload * diameter
}

export interface LongFormInput {
  preloadN: number
  diameterMm: number
  pitchMm: number
  threadFriction: number
  bearingFriction: number
  /** Mean friction diameter under the head or nut, mm. */
  bearingDiameterMm: number
}

/**
 * T = F·(P/2π + µ_t·r_t/cos 30° + µ_n·r_n): where the torque goes, N·m, and the nut factor that would give the same.
 * Source: long form after Motosh.
 */
export function torqueByLongForm(input: LongFormInput) {
  const { preloadN, diameterMm, pitchMm } = input
  const perMetre = preloadN / 1000
  const pitchNm = perMetre * pitchMm / (2 * Math.PI)
  const threadNm = perMetre * input.threadFriction * pitchDiameter(diameterMm, pitchMm) / 2 / Math.cos(Math.PI / 6)
  const bearingNm = perMetre * input.bearingFriction * input.bearingDiameterMm / 2
  const totalNm = pitchNm + threadNm + bearingNm
  return { pitchNm, threadNm, bearingNm, totalNm, nutFactor: totalNm / (perMetre * diameterMm) }
}

export interface AssemblyInput {
  diameterMm: number
  pitchMm: number
  yieldMPa: number
  friction: number
  /** Outer diameter of the bearing face and diameter of the hole, mm. */
  headDiameterMm: number
  holeDiameterMm: number
  /** Share of the yield strength that tension and twist together may use. */
  utilisation?: number
}

/**
 * Largest assembly preload (N) and its torque (N·m), at 90 % of yield under tension and twist together: an upper bound,
 * never a target for the shop. Source: formulas of VDI 2230 Part 1 [memory], checked against its fine-thread table.
 */
export function assemblyByVdi2230(input: AssemblyInput): { preloadN: number, torqueNm: number } {
  const { diameterMm, pitchMm, friction } = input
  const d2 = pitchDiameter(diameterMm, pitchMm)
  const d0 = (d2 + minorDiameter(diameterMm, pitchMm)) / 2
  const twist = 1.5 * d2 / d0 * (pitchMm / (Math.PI * d2) + 1.155 * friction)
  const area = Math.PI / 4 * d0 ** 2
  const preloadN = (input.utilisation ?? 0.9) * input.yieldMPa * area / Math.sqrt(1 + 3 * twist ** 2)
  const bearingDiameter = (input.headDiameterMm + input.holeDiameterMm) / 2
  const lever = 0.16 * pitchMm + 0.58 * d2 * friction + friction * bearingDiameter / 2
  return { preloadN, torqueNm: preloadN * lever / 1000 }
}

/** Proof load, stress area times proof strength: N from mm² and MPa, lbf from in² and psi. Source: ISO 898-1. */
export function proofLoad(stressArea: number, proofStrength: number): number {
  return stressArea * proofStrength
}

/** Share of the proof load for joints that are opened again, and for permanent ones. Source: Shigley 9e Eq. (8-31). */
export const preloadShares = { reused: 0.75, permanent: 0.9 } as const

/** Preload as a share of the proof load, in its unit. Source: Shigley 9e Eqs. (8-31), (8-32). */
export function recommendedPreload(proof: number, share: number = preloadShares.reused): number {
  return proof * share
}

/** Smallest and largest preload about a nominal one, `scatter` as a share. Source: NASA-STD-5020B Table 3. */
export function preloadBand(nominal: number, scatter: number): { min: number, max: number } {
  return { min: nominal * (1 - scatter), max: nominal * (1 + scatter) }
}

export interface EstimateInput {
  thread: string
  propertyClass: string
  condition: BoltCondition
  /** Share of the proof load to aim at; by default that of joints that are opened again. */
  share?: number
}

export interface TorqueEstimate {
  torqueNm: number
  /** The torques that would give the same preload where friction is at its lowest and at its highest, N·m. */
  lowNm: number
  highNm: number
  preloadN: number
  /** The least and the most clamp load that `torqueNm` may give, N. */
  preloadLowN: number
  preloadHighN: number
  proofLoadN: number
  nutFactor: number
  /** Scatter used, as a share. */
  scatter: number
}

/**
 * An estimate behind a shop value, where no spec is published: K·F·d at 75 % of the proof load, with the scatter of a
 * torque wrench. Advice only; service information wins, and a safety joint never takes it. Null when thread, pitch or
 * strength is not known. Source: Shigley 9e ch. 8, ISO 898-1, SAE J429, NASA-STD-5020B.
 */
export function estimateTorque(input: EstimateInput): TorqueEstimate | null {
  const thread = parseThread(input.thread)
  const strength = thread && strengthOf(input.propertyClass, thread.diameterMm)
  if (!strength || thread.stressAreaMm2 === null) return null
  const proofLoadN = proofLoad(thread.stressAreaMm2, strength.proofMPa)
  const preloadN = recommendedPreload(proofLoadN, input.share)
  const nutFactor = nutFactors[input.condition]
  const torqueNm = torqueFromPreload(nutFactor, preloadN, thread.diameterMm / 1000)
  const lubricated = input.condition === 'lubricated' || input.condition === 'anti_seize'
  const scatter = lubricated ? torqueScatter.lubricated : torqueScatter.unlubricated
  const torques = preloadBand(torqueNm, scatter)
  const preloads = preloadBand(preloadN, scatter)
  return {
    torqueNm,
    lowNm: torques.min,
    highNm: torques.max,
    preloadN,
    preloadLowN: preloads.min,
    preloadHighN: preloads.max,
    proofLoadN,
    nutFactor,
    scatter,
  }
}
