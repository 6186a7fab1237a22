export const boltPatterns = ['circle', 'row', 'two_rows', 'free'] as const
export type BoltPatternKind = (typeof boltPatterns)[number]

/** What the paint on a bolt says. */
export type BoltState = 'none' | 'tightened' | 'signed' | 'checked' | 'out'

export interface BoltPosition {
  position: number
  /** Where it sits, in any unit, y downwards; only a free pattern needs it. */
  x?: number
  y?: number
  /** Longer than its neighbours. */
  long?: boolean
  /** Shown in place of the position number. */
  label?: string
}

interface Point { x: number, y: number }

export interface PlacedBolt extends Point {
  position: number
  /** Unit vector away from the middle of the part: notes are written on that side. */
  away: Point
}

export interface BoltLayout {
  width: number
  height: number
  bolts: PlacedBolt[]
  /** Corners of the part around the bolts; drawn with a round stroke of twice `flange`. */
  outline: Point[]
  /** The opening in the middle of the part, where there is room for one. */
  opening: { x: number, y: number, width: number, height: number, round: number } | null
}

/** Drawing units: the rim around a head, the flange around a bolt's centre, the room for a note beyond it. */
export const rim = 31
export const flange = 43
const note = 30
/** Least distance between two bolts. At 328 px of width twelve in a circle are then still 56 px apart. */
const pitch = 76
const widestSpan = 900

/** Server and browser may differ in the last bits of a sine; the page must not. */
function round(x: number): number {
  return Math.round(x * 100) / 100
}

function circle(count: number): Point[] {
  if (count === 1) return [{ x: 0, y: 0 }]
  const radius = Math.max(count === 2 ? 70 : 104, pitch / (2 * Math.sin(Math.PI / count)))
  return Array.from({ length: count }, (_, index) => {
    const angle = 2 * Math.PI * index / count
    return { x: radius * Math.sin(angle), y: -radius * Math.cos(angle) }
  })
}

function row(count: number): Point[] {
  return Array.from({ length: count }, (_, index) => ({ x: index * pitch * 1.05, y: 0 }))
}

function twoRows(count: number): Point[] {
  const half = Math.ceil(count / 2)
  return Array.from({ length: count }, (_, index) =>
    ({ x: (index % half) * pitch * 1.2, y: index < half ? 0 : pitch * 2.2 }))
}

/** Spreads given places so that the closest two are a pitch apart, unless the part would grow beyond all measure. */
function asGiven(points: Point[]): Point[] {
  let closest = Infinity
  points.forEach((a, index) => {
    for (const b of points.slice(index + 1)) closest = Math.min(closest, Math.hypot(a.x - b.x, a.y - b.y))
  })
  if (!Number.isFinite(closest)) return points
  const { width, height } = extent(points)
  const scale = Math.min(closest > 0 ? pitch / closest : Infinity, widestSpan / Math.max(width, height, 1e-9))
  return points.map(({ x, y }) => ({ x: x * scale, y: y * scale }))
}

function extent(points: Point[]) {
  const xs = points.map(point => point.x)
  const ys = points.map(point => point.y)
  const left = Math.min(...xs)
  const top = Math.min(...ys)
  return { left, top, width: Math.max(...xs) - left, height: Math.max(...ys) - top }
}

const mean = (xs: number[]) => xs.reduce((sum, x) => sum + x, 0) / xs.length

/** Corners of the convex hull (monotone chain). */
function hull(points: Point[]): Point[] {
  const sorted = [...points].sort((a, b) => a.x - b.x || a.y - b.y)
  const half = (ordered: Point[]) => {
    const chain: Point[] = []
    for (const point of ordered) {
      for (;;) {
        const a = chain.at(-2)
        const b = chain.at(-1)
        if (!a || !b || (b.x - a.x) * (point.y - a.y) - (b.y - a.y) * (point.x - a.x) > 0) break
        chain.pop()
      }
      chain.push(point)
    }
    return chain.slice(0, -1)
  }
  return sorted.length < 3 ? sorted : [...half(sorted), ...half(sorted.toReversed())]
}

function raw(positions: readonly BoltPosition[], pattern: BoltPatternKind): Point[] {
  if (pattern === 'row') return row(positions.length)
  if (pattern === 'two_rows') return twoRows(positions.length)
  const given = positions.flatMap(({ x, y }) => x === undefined || y === undefined ? [] : [{ x, y }])
  if (pattern === 'free' && given.length === positions.length) return asGiven(given)
  return circle(positions.length)
}

function openingOf(pattern: BoltPatternKind, points: Point[], middle: Point): BoltLayout['opening'] {
  const { left, top, width, height } = extent(points)
  const first = points[0]
  if (pattern === 'circle' && first && points.length > 2) {
    const radius = Math.hypot(first.x - middle.x, first.y - middle.y) * Math.cos(Math.PI / points.length) - flange + 4
    return radius < 20
      ? null
      : { x: round(middle.x - radius), y: round(middle.y - radius), width: round(2 * radius), height: round(2 * radius), round: round(radius) }
  }
  if (pattern !== 'two_rows' || points.length < 4) return null
  const inset = flange - 4
  // The rows lie along the longer side, whichever way the part is turned.
  const flat = points[1] && first && points[1].y === first.y
  return flat
    ? { x: left, y: top + inset, width, height: height - 2 * inset, round: 16 }
    : { x: left + inset, y: top, width: width - 2 * inset, height, round: 16 }
}

/**
 * Places the bolts of a part in a drawing of its own size. Circle: clockwise from the top; row: left to right;
 * two_rows: the first half above, the second below; free: as given, or as a circle where a place is missing.
 * `upright` turns the part by a quarter, for a narrow screen: left becomes top, the upper row the right one.
 */
export function layoutBolts(positions: readonly BoltPosition[], pattern: BoltPatternKind, upright = false): BoltLayout {
  const drawn = raw(positions, pattern).map(({ x, y }) => upright ? { x: -y, y: x } : { x, y })
  if (drawn.length === 0) return { width: 0, height: 0, bolts: [], outline: [], opening: null }
  const { left, top, width, height } = extent(drawn)
  const margin = flange + note
  const points = drawn.map(({ x, y }) => ({ x: round(x - left + margin), y: round(y - top + margin) }))
  // Of a circle the centre, of anything else the middle of its extent.
  const middle = pattern === 'circle'
    ? { x: mean(points.map(point => point.x)), y: mean(points.map(point => point.y)) }
    : { x: width / 2 + margin, y: height / 2 + margin }
  const bolts = points.map((point, index) => {
    const across = pattern === 'circle' || pattern === 'free'
    const dx = across || upright ? point.x - middle.x : 0
    const dy = across || !upright ? point.y - middle.y : 0
    const length = Math.hypot(dx, dy)
    const away = length > 1e-6 ? { x: dx / length, y: dy / length } : upright ? { x: 1, y: 0 } : { x: 0, y: 1 }
    return { ...point, away: { x: round(away.x), y: round(away.y) }, position: positions[index]?.position ?? index + 1 }
  })
  return {
    width: round(width + 2 * margin),
    height: round(height + 2 * margin),
    bolts,
    outline: hull(points),
    opening: openingOf(pattern, points, middle),
  }
}

/** How far a head happens to be turned, in degrees: no two bolts of a part stop at the same flat. Always the same for a position. */
export function headTurnDeg(position: number): number {
  return (position * 23) % 41 - 20
}

/** What the paint says, in words. */
export const boltStateWords: Record<BoltState, string> = {
  none: 'not tightened',
  tightened: 'tightened, not signed',
  signed: 'signed',
  checked: 'signed and second-checked',
  out: 'out of band',
}
