export const verdicts = ['in_band', 'edge', 'low', 'high'] as const

export type Verdict = typeof verdicts[number]

/** The rule behind every verdict: the limits stand as they are, with no guard band. Source: ILAC-G8, JCGM 106. */
export const decisionRuleText = 'simple acceptance, risk up to 50 % at the limit'

export interface VerdictInput {
  nm: number
  lowerNm: number
  upperNm: number
  /** What the reading may be off by, N·m: the wrench's W′, or its permissible deviation. */
  uNm: number
}

/** Unit conversion leaves an error in the last bits; so close to a limit counts as on it. */
const relativeNoise = 1e-12

/**
 * The verdict of one reading at the fastener. The limits are inclusive; `edge` is inside, but nearer to a limit than U.
 * @throws RangeError when a number is missing (NaN), which would otherwise pass as in band.
 */
export function verdictOf({ nm, lowerNm, upperNm, uNm }: VerdictInput): Verdict {
  if ([nm, lowerNm, upperNm, uNm].some(Number.isNaN)) throw new RangeError('A verdict needs numbers.')
  const noise = relativeNoise * Math.max(Math.abs(nm), Math.abs(upperNm))
  if (nm < lowerNm - noise) return 'low'
  if (nm > upperNm + noise) return 'high'
  return Math.min(nm - lowerNm, upperNm - nm) < uNm - noise ? 'edge' : 'in_band'
}

/** The place of a verdict in sorted lists: in_band, edge, low, high. */
export function verdictRank(verdict: Verdict): number {
  return verdicts.indexOf(verdict)
}

/** A reading as the worst one is looked for: its limits are null where it was not judged by torque. */
export interface JudgedReading {
  verdict: Verdict | null
  nm: number | null
  lowerNm: number | null
  upperNm: number | null
}

function outByNm({ nm, lowerNm, upperNm }: JudgedReading): number {
  if (nm === null || lowerNm === null || upperNm === null) return 0
  return Math.max(lowerNm - nm, nm - upperNm, 0)
}

const isOut = (verdict: Verdict) => verdict === 'low' || verdict === 'high'

/**
 * The verdict of several readings together: high and low before edge before in_band; of high and low the one farther
 * out in N·m, and high where they are equally far. Null when nothing was judged.
 */
export function worstVerdict(readings: readonly JudgedReading[]): Verdict | null {
  let worst: { verdict: Verdict, outNm: number } | null = null
  for (const reading of readings) {
    const { verdict } = reading
    if (verdict === null) continue
    const outNm = outByNm(reading)
    const sameKind = worst !== null && isOut(worst.verdict) && isOut(verdict) && worst.outNm !== outNm
    const worse = worst === null || (sameKind ? outNm > worst.outNm : verdictRank(verdict) > verdictRank(worst.verdict))
    if (worse) worst = { verdict, outNm }
  }
  return worst?.verdict ?? null
}
