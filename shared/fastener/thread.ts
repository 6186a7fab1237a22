const mmPerInch = 25.4

/** A thread as far as its designation tells; lengths in mm, area in mm², null where the pitch is not known. */
export interface Thread {
  system: 'metric' | 'inch'
  designation: string
  diameterMm: number
  pitchMm: number | null
  stressAreaMm2: number | null
}

/** Pitch diameter d2 = d − 0.649519·P, in the unit of d and P. Source: ISO 68-1 basic profile. */
export function pitchDiameter(diameter: number, pitch: number): number {
  return diameter - 0.649519 * pitch
}

/** Minor diameter d3 = d − 1.226869·P, in the unit of d and P. Source: ISO 68-1 basic profile. */
export function minorDiameter(diameter: number, pitch: number): number {
  return diameter - 1.226869 * pitch
}

function checkThread(diameter: number, pitch: number): void {
  if (!(pitch > 0 && minorDiameter(diameter, pitch) > 0 && Number.isFinite(diameter))) {
    throw new RangeError('A thread needs a diameter and a pitch well below it, both greater than zero.')
  }
}

/**
 * Stress area of a metric thread, (π/4)·((d2 + d3)/2)², mm² from mm. Source: ISO 898-1, nominal stress area.
 * @throws RangeError when diameter and pitch make no thread.
 */
export function stressAreaMetric(diameterMm: number, pitchMm: number): number {
  checkThread(diameterMm, pitchMm)
  const mean = (pitchDiameter(diameterMm, pitchMm) + minorDiameter(diameterMm, pitchMm)) / 2
  return Math.PI / 4 * mean ** 2
}

/**
 * Stress area of an inch thread, (π/4)·(D − 0.9743/n)², in² from inches and threads per inch,
 * with the coefficient, 9√3/16, to six digits like the metric ones. Source: ASME B1.1, Shigley 9e Table 8-2.
 * @throws RangeError when diameter and pitch make no thread.
 */
export function stressAreaInch(diameterIn: number, threadsPerInch: number): number {
  checkThread(diameterIn, 1 / threadsPerInch)
  return Math.PI / 4 * (diameterIn - 0.974279 / threadsPerInch) ** 2
}

/** Coarse pitches, mm, by nominal diameter. Source: ISO 261, ISO 262. */
const coarsePitchMm = new Map([
  [5, 0.8], [6, 1], [7, 1], [8, 1.25], [10, 1.5], [12, 1.75],
  [14, 2], [16, 2], [18, 2.5], [20, 2.5], [22, 2.5], [24, 3],
])

/** Threads per inch, coarse (UNC) and fine (UNF), by diameter in inches. Source: ASME B1.1, Shigley 9e Table 8-2. */
const unifiedSeries: readonly (readonly [inches: number, unc: number, unf: number])[] = [
  [0.19, 24, 32], [0.25, 20, 28], [0.3125, 18, 24], [0.375, 16, 24], [0.4375, 14, 20], [0.5, 13, 20],
  [0.5625, 12, 18], [0.625, 11, 18], [0.75, 10, 16], [0.875, 9, 14], [1, 8, 12],
]

function threadsOfSeries(diameterIn: number, suffix: string): number | null {
  const row = unifiedSeries.find(([inches]) => Math.abs(inches - diameterIn) < 1e-9)
  if (!row) return null
  if (suffix === 'unc') return row[1]
  return suffix === 'unf' ? row[2] : null
}

function metricThread(designation: string, diameterMm: number, pitchMm: number | null): Thread | null {
  if (pitchMm !== null && !(pitchMm > 0 && minorDiameter(diameterMm, pitchMm) > 0)) return null
  const stressAreaMm2 = pitchMm === null ? null : stressAreaMetric(diameterMm, pitchMm)
  return { system: 'metric', designation, diameterMm, pitchMm, stressAreaMm2 }
}

function inchThread(designation: string, diameterIn: number, threadsPerInch: number | null): Thread | null {
  const diameterMm = diameterIn * mmPerInch
  if (threadsPerInch === null) {
    return { system: 'inch', designation, diameterMm, pitchMm: null, stressAreaMm2: null }
  }
  if (!(threadsPerInch > 0 && minorDiameter(diameterIn, 1 / threadsPerInch) > 0)) return null
  const stressAreaMm2 = stressAreaInch(diameterIn, threadsPerInch) * mmPerInch ** 2
  return { system: 'inch', designation, diameterMm, pitchMm: mmPerInch / threadsPerInch, stressAreaMm2 }
}

/** Inches of "3/8", "1", "1-1/8", "0.25" or "#10" (number sizes: 0.060 + 0.013·n, ASME B1.1). */
function inchesOf(text: string): number | null {
  const numbered = /^#(\d{1,2})$/.exec(text)
  if (numbered) return 0.06 + 0.013 * Number(numbered[1])
  const parts = /^(?:(\d+(?:\.\d+)?)|(?:(\d+)[- ])?(\d+)\/(\d+))$/.exec(text)
  if (!parts) return null
  const [, decimal, whole = '0', over, under] = parts
  const inches = decimal === undefined ? Number(whole) + Number(over) / Number(under) : Number(decimal)
  return inches > 0 && inches <= 6 ? inches : null
}

/**
 * Reads a thread designation: "M8", "M8x1.25", "3/8-16", "1-1/8-7 UNC", "7/16 UNF", "#10-24", "5/16 in". M alone means
 * the coarse pitch; an inch size alone leaves the pitch open, since it may be coarse or fine. Null when it is no thread
 * we know.
 */
export function parseThread(text: string): Thread | null {
  const designation = text.trim()
  if (designation.length > 40) return null
  const plain = designation.replace(/[‐‑‒–—−]/g, '-').replace(/,/g, '.')
  const metric = /^m\s*(\d{1,3}(?:\.\d+)?)(?:\s*[x×*]\s*(\d(?:\.\d+)?))?$/i.exec(plain)
  if (metric) {
    const diameterMm = Number(metric[1])
    if (diameterMm === 0) return null
    return metricThread(designation, diameterMm, metric[2] ? Number(metric[2]) : coarsePitchMm.get(diameterMm) ?? null)
  }
  const inch = /^([#\d/ .-]*?\d)\s*(?:-\s*(\d{1,2}))?\s*(un[cf]?|unef|in(?:ch)?|")?$/i.exec(plain)
  if (!inch) return null
  const [, size = '', count, suffix = ''] = inch
  // "1-8" alone is 1 inch with 8 threads; in "1-1/8-7" the first dash joins the fraction.
  const diameterIn = inchesOf(size)
  if (diameterIn === null) return null
  return inchThread(designation, diameterIn, count ? Number(count) : threadsOfSeries(diameterIn, suffix.toLowerCase()))
}
