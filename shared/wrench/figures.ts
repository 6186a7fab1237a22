/** One point of a calibration as it was recorded. */
export interface CalibrationPoint {
  phase: 'as_found' | 'as_left'
  targetNm: number
  direction?: string | null
  meanDeviationPercent: number | null
  wPercent: number | null
  wPrimePercent: number | null
}

/** What a calibration says about the wrench at one torque, percent; null where the certificate does not say. */
export interface Figures {
  biasPercent: number | null
  wPercent: number | null
  wPrimePercent: number | null
}

/**
 * Linear between the points, which come in ascending x; the nearest point's value outside them. Null as soon as a point
 * that is needed has none, and without points.
 */
export function interpolate(points: readonly { x: number, y: number | null }[], x: number): number | null {
  const above = points.find(point => point.x >= x)
  const below = points.findLast(point => point.x <= x)
  const right = above ?? below
  const left = below ?? above
  if (!left || !right || left.y === null || right.y === null) return null
  return left.x === right.x ? left.y : left.y + (right.y - left.y) * (x - left.x) / (right.x - left.x)
}

/** Of points at the same torque (two directions, say) the one that speaks worst of the wrench stays. */
function worstAtEachTarget(points: readonly CalibrationPoint[]): CalibrationPoint[] {
  const badness = (point: CalibrationPoint) => point.wPrimePercent ?? Math.abs(point.meanDeviationPercent ?? 0)
  const sorted = points.toSorted((a, b) => a.targetNm - b.targetNm || badness(b) - badness(a))
  return sorted.filter((point, index) => point.targetNm !== sorted[index - 1]?.targetNm)
}

/**
 * Bias, W and W′ of a calibration at the torque shown on the wrench (`nm`, N·m): those of as left where there are any,
 * else as found; linear in torque between points, clamped outside them. With `direction` only its points are used,
 * where there are any. Null without points. Source: own rule.
 */
export function figuresAt(points: readonly CalibrationPoint[], nm: number, direction?: string): Figures | null {
  const asLeft = points.filter(point => point.phase === 'as_left')
  const inPhase = asLeft.length > 0 ? asLeft : points
  const inDirection = inPhase.filter(point => point.direction === direction)
  const used = worstAtEachTarget(direction !== undefined && inDirection.length > 0 ? inDirection : inPhase)
  if (used.length === 0) return null
  const at = (read: (point: CalibrationPoint) => number | null) =>
    interpolate(used.map(point => ({ x: point.targetNm, y: read(point) })), nm)
  return {
    biasPercent: at(point => point.meanDeviationPercent),
    wPercent: at(point => point.wPercent),
    wPrimePercent: at(point => point.wPrimePercent),
  }
}
