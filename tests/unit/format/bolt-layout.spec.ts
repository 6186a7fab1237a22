import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { boltPatterns, headTurnDeg, layoutBolts, type BoltPatternKind } from '../../../utils/bolt-layout'

const numbered = (count: number) => Array.from({ length: count }, (_, index) => ({ position: index + 1 }))

function closest(pattern: BoltPatternKind, count: number, upright = false): number {
  const { bolts } = layoutBolts(numbered(count), pattern, upright)
  return Math.min(...bolts.flatMap((a, index) => bolts.slice(index + 1).map(b => Math.hypot(a.x - b.x, a.y - b.y))))
}

describe('circle', () => {
  it('goes clockwise from the top', () => {
    const [top, right, bottom, left] = layoutBolts(numbered(4), 'circle').bolts
    expect(top?.x).toBeCloseTo(bottom?.x ?? NaN)
    expect(top?.y).toBeLessThan(bottom?.y ?? NaN)
    expect(right?.x).toBeGreaterThan(left?.x ?? NaN)
    expect(right?.y).toBeCloseTo(left?.y ?? NaN)
  })

  it('puts all bolts at one distance from the middle of its opening', () => {
    const { bolts, opening } = layoutBolts(numbered(5), 'circle')
    if (!opening) throw new Error('no opening')
    const middle = { x: opening.x + opening.width / 2, y: opening.y + opening.height / 2 }
    const radii = bolts.map(({ x, y }) => Math.hypot(x - middle.x, y - middle.y))
    expect(Math.max(...radii) - Math.min(...radii)).toBeLessThan(0.1)
  })
})

describe('row', () => {
  it('goes left to right on one line', () => {
    const { bolts } = layoutBolts(numbered(3), 'row')
    expect(bolts.map(bolt => bolt.x)).toEqual([...bolts.map(bolt => bolt.x)].sort((a, b) => a - b))
    expect(new Set(bolts.map(bolt => bolt.y)).size).toBe(1)
  })

  it('goes top to bottom when stood up', () => {
    const { bolts, width, height } = layoutBolts(numbered(3), 'row', true)
    expect(bolts.map(bolt => bolt.y)).toEqual([...bolts.map(bolt => bolt.y)].sort((a, b) => a - b))
    expect(height).toBeGreaterThan(width)
  })
})

describe('two rows', () => {
  it('has the first half above the second, each left to right', () => {
    const [a1, a2, b1, b2] = layoutBolts(numbered(4), 'two_rows').bolts
    expect(a1?.y).toBe(a2?.y)
    expect(a1?.y).toBeLessThan(b1?.y ?? NaN)
    expect(a1?.x).toBe(b1?.x)
    expect(a2?.x).toBe(b2?.x)
    expect(a1?.x).toBeLessThan(a2?.x ?? NaN)
  })
})

describe('free', () => {
  it('keeps the given proportions', () => {
    const { bolts: [a, b, c] } = layoutBolts(
      [{ position: 1, x: 0, y: 0 }, { position: 2, x: 10, y: 0 }, { position: 3, x: 0, y: 20 }], 'free')
    if (!a || !b || !c) throw new Error('bolts are missing')
    expect((c.y - a.y) / (b.x - a.x)).toBeCloseTo(2)
  })

  it('becomes a circle where a place is missing', () => {
    expect(layoutBolts(numbered(5), 'free').bolts.map(({ x, y }) => [x, y]))
      .toEqual(layoutBolts(numbered(5), 'circle').bolts.map(({ x, y }) => [x, y]))
  })

  it('survives two bolts in one place', () => {
    const { bolts, width } = layoutBolts([{ position: 1, x: 3, y: 3 }, { position: 2, x: 3, y: 3 }], 'free')
    expect(bolts).toHaveLength(2)
    expect(Number.isFinite(width)).toBe(true)
  })
})

describe('any pattern', () => {
  it('holds every bolt inside the drawing', () => {
    fc.assert(fc.property(fc.constantFrom(...boltPatterns), fc.integer({ min: 1, max: 24 }), fc.boolean(), (pattern, count, upright) => {
      const { bolts, width, height } = layoutBolts(numbered(count), pattern, upright)
      expect(bolts.map(bolt => bolt.position)).toEqual(numbered(count).map(({ position }) => position))
      for (const { x, y } of bolts) {
        expect(x).toBeGreaterThan(0)
        expect(x).toBeLessThan(width)
        expect(y).toBeGreaterThan(0)
        expect(y).toBeLessThan(height)
      }
    }))
  })

  it('gives twelve bolts in a circle a target of 48 px on a phone of 360 px', () => {
    const { width } = layoutBolts(numbered(12), 'circle')
    expect(closest('circle', 12) * 328 / width).toBeGreaterThanOrEqual(48)
  })

  it('gives two rows of six a target of 48 px with 8 px between when stood up at 0.85', () => {
    expect(closest('two_rows', 12, true) * 0.85).toBeGreaterThanOrEqual(56)
    expect(layoutBolts(numbered(12), 'two_rows', true).width * 0.85).toBeLessThanOrEqual(328)
  })

  it('is empty without bolts', () => {
    expect(layoutBolts([], 'circle').bolts).toEqual([])
  })
})

it('turns heads a little, always the same way', () => {
  const turns = numbered(12).map(({ position }) => headTurnDeg(position))
  expect(turns).toEqual(numbered(12).map(({ position }) => headTurnDeg(position)))
  expect(new Set(turns).size).toBe(12)
  expect(Math.max(...turns.map(Math.abs))).toBeLessThanOrEqual(20)
})
