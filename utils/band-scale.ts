export interface BandScale {
  /** Where a torque (N·m) stands on the drawing, kept inside its edges. */
  place: (nm: number) => number
  /** The torque lies so far out that its stroke stands at the edge instead. */
  beyond: (nm: number) => boolean
}

/** Scales N·m so that the limits fall on `from` and `to` of a drawing that goes from `edge` to `width - edge`. */
export function bandScale(lowerNm: number, upperNm: number, from: number, to: number, width: number, edge: number): BandScale {
  const perNm = upperNm > lowerNm ? (to - from) / (upperNm - lowerNm) : 0
  const exact = (nm: number) => from + (nm - lowerNm) * perNm
  return {
    place: nm => Math.round(10 * Math.min(width - edge, Math.max(edge, exact(nm)))) / 10,
    beyond: nm => exact(nm) < edge || exact(nm) > width - edge,
  }
}
