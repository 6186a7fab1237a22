export const patterns = ['circle', 'row', 'two_rows', 'free'] as const

export type Pattern = typeof patterns[number]

/** More bolts than any fastener group has; keeps a mistyped count from being computed. */
export const mostPositions = 1000

function checkCount(count: number): void {
  if (!Number.isInteger(count) || count < 1 || count > mostPositions) {
    throw new RangeError(`The number of bolts must be a whole number from 1 to ${mostPositions}.`)
  }
}

const upTo = (count: number) => Array.from({ length: count }, (_, index) => index + 1)

/** 1…q, each time the start farthest round the circle from those already taken; ties: far from the last, then small. */
function spreadStarts(q: number): number[] {
  const distance = (a: number, b: number) => Math.min(Math.abs(a - b), q - Math.abs(a - b))
  const starts = [1]
  let left = upTo(q).slice(1).map(start => ({ start, gap: distance(start, 1) }))
  let last = 1
  while (left.length > 0) {
    const best = left.reduce((a, b) => {
      if (a.gap !== b.gap) return b.gap > a.gap ? b : a
      return distance(b.start, last) > distance(a.start, last) ? b : a
    })
    last = best.start
    starts.push(last)
    left = left
      .filter(other => other !== best)
      .map(({ start, gap }) => ({ start, gap: Math.min(gap, distance(start, last)) }))
  }
  return starts
}

/**
 * Cross pattern for `count` bolts on a circle, numbered clockwise: opposite pairs, the angle halved each time.
 * Source: own rule that reproduces the legacy ASME PCC-1 table for 4 to 32 bolts [memory]; the stars of five and six
 * are common practice. @throws RangeError when count is not a whole number from 1.
 */
export function circleOrder(count: number): number[] {
  checkCount(count)
  if (count < 4) return upTo(count)
  if (count % 2 === 1) {
    const step = (count - 1) / 2
    return upTo(count).map((_, index) => index * step % count + 1)
  }
  const half = count / 2
  if (count % 4 !== 0) return spreadStarts(half).flatMap(start => [start, start + half])
  const quarter = count / 4
  return spreadStarts(quarter).flatMap(start => [start, start + half, start + quarter, start + half + quarter])
}

/**
 * Straight row, from the centre out, sides alternating. Source: US Army TM 5-3805-298-23-2 (nine bolts, as ranks:
 * 9 7 5 3 1 2 4 6 8). @throws RangeError when count is not a whole number from 1.
 */
export function rowOrder(count: number): number[] {
  checkCount(count)
  const centre = Math.ceil(count / 2)
  return [centre, ...upTo(count - 1).map(n => n % 2 === 1 ? centre + (n + 1) / 2 : centre - n / 2)]
}

function columnsOf(count: number): number {
  checkCount(count)
  if (count % 2 === 1) throw new RangeError('Two rows need an even number of bolts.')
  return count / 2
}

/** What each position of two rows is called: A1…An, then B1…Bn. @throws RangeError when count is odd. */
export function twoRowLabels(count: number): string[] {
  const columns = upTo(columnsOf(count))
  return [...columns.map(n => `A${n}`), ...columns.map(n => `B${n}`)]
}

/**
 * Two rows, from the centre out in rings, each bolt followed by one across the centre; A1…An are numbers 1…n, B1…Bn
 * the next n. Source: own rule; the maker's printed order always wins. @throws RangeError when count is odd.
 */
export function twoRowsOrder(count: number): number[] {
  const columns = columnsOf(count)
  const middle = (columns + 1) / 2
  const rings = upTo(Math.floor(columns / 2)).flatMap((ring) => {
    const right = Math.floor(middle) + ring
    const left = columns + 1 - right
    return [right, columns + left, columns + right, left]
  })
  return columns % 2 === 1 ? [middle, columns + middle, ...rings] : rings
}

/** The product's own tightening order; "free" keeps the order in which bolts are drawn. @throws RangeError as above. */
export function orderFor(pattern: Pattern, count: number): number[] {
  if (pattern === 'circle') return circleOrder(count)
  if (pattern === 'row') return rowOrder(count)
  if (pattern === 'two_rows') return twoRowsOrder(count)
  checkCount(count)
  return upTo(count)
}

/** Whether `order` names each of the positions 1…count exactly once, as a printed order must. */
export function isPermutation(order: readonly number[], count: number): boolean {
  const seen = new Set(order)
  return order.length === count && seen.size === count && upTo(count).every(position => seen.has(position))
}

/** The pattern where none is printed: a row up to two bolts, else a circle. Source: own rule. */
export function defaultPattern(count: number): Pattern {
  return count <= 2 ? 'row' : 'circle'
}
