/** Strength of a bolt material, MPa. */
export interface Strength {
  propertyClass: string
  proofMPa: number
  yieldMPa: number
  tensileMPa: number
}

/** One row: the largest diameter (mm) it holds for, then proof, yield and tensile strength. */
type Row = readonly [maxDiameterMm: number, proof: number, yielding: number, tensile: number]

/** MPa. Source: ISO 898-1. Class 8.8 changes at 16 mm: 600 MPa holds above it only. */
const metricClasses: Record<string, readonly Row[]> = {
  4.6: [[Infinity, 225, 240, 400]],
  5.8: [[Infinity, 380, 420, 520]],
  8.8: [[16, 580, 640, 800], [Infinity, 600, 660, 830]],
  10.9: [[Infinity, 830, 940, 1040]],
  12.9: [[Infinity, 970, 1100, 1220]],
}

const mm = (inches: number) => inches * 25.4 + 1e-9

/** ksi. Source: SAE J429. */
const saeGrades: Record<string, readonly Row[]> = {
  2: [[mm(0.75), 55, 57, 74], [mm(1.5), 33, 36, 60]],
  5: [[mm(1), 85, 92, 120], [mm(1.5), 74, 81, 105]],
  8: [[mm(1.5), 120, 130, 150]],
}

/** 1 ksi in MPa: 4.448 221 615 260 5 N / (25.4 mm)² × 1000. */
const mpaPerKsi = 4448.2216152605 / 25.4 ** 2

/**
 * Strength of a property class or grade at a nominal diameter (mm): "8.8", "10.9", "SAE J429 grade 5", "grade 8".
 * Null when it is not one we know, leaves two grades open, or is not made in that size.
 * Source: ISO 898-1, SAE J429 (as quoted by Shigley).
 */
export function strengthOf(propertyClass: string, diameterMm: number): Strength | null {
  const name = propertyClass.trim()
  const metric = /^(?:class\s*)?(\d{1,2}\.\d)$/i.exec(name)?.[1]
  const grade = /^(?:sae\s*)?(?:j429\s*)?(?:grade|gr\.?)\s*(\d)$/i.exec(name)?.[1]
  const rows = metric ? metricClasses[metric] : grade ? saeGrades[grade] : undefined
  const row = rows?.find(([maxDiameterMm]) => diameterMm <= maxDiameterMm)
  if (!row || !(diameterMm > 0)) return null
  const [, proof, yielding, tensile] = row
  const unit = metric ? 1 : mpaPerKsi
  return { propertyClass: name, proofMPa: proof * unit, yieldMPa: yielding * unit, tensileMPa: tensile * unit }
}
