import { describe, expect, it } from 'vitest'
import { parseThread, stressAreaInch, stressAreaMetric } from '#shared/fastener/thread'

// Nominal stress areas, mm²: coarse after reproduced ISO 898-1 tables, fine [memory].
const metric: [diameter: number, pitch: number, area: number][] = [
  [5, 0.8, 14.2], [6, 1, 20.1], [7, 1, 28.9], [8, 1.25, 36.6], [8, 1, 39.2], [10, 1.5, 58], [10, 1.25, 61.2],
  [10, 1, 64.5], [12, 1.75, 84.3], [12, 1.5, 88.1], [12, 1.25, 92.1], [14, 2, 115], [14, 1.5, 125], [16, 2, 157],
  [16, 1.5, 167], [18, 2.5, 192], [18, 1.5, 216], [20, 2.5, 245], [20, 1.5, 272], [22, 2.5, 303], [22, 1.5, 333],
  [24, 3, 353], [24, 2, 384],
]
// Tensile stress areas, in², Shigley 9e Table 8-2: size, UNC and UNF threads per inch with their areas.
const inch: [size: string, unc: number, uncArea: number, unf: number, unfArea: number][] = [
  ['#10', 24, 0.0175, 32, 0.0200], ['1/4', 20, 0.0318, 28, 0.0364], ['5/16', 18, 0.0524, 24, 0.0580],
  ['3/8', 16, 0.0775, 24, 0.0878], ['7/16', 14, 0.1063, 20, 0.1187], ['1/2', 13, 0.1419, 20, 0.1599],
  ['9/16', 12, 0.182, 18, 0.203], ['5/8', 11, 0.226, 18, 0.256], ['3/4', 10, 0.334, 16, 0.373],
  ['7/8', 9, 0.462, 14, 0.509], ['1', 8, 0.606, 12, 0.663],
]
const in2 = 25.4 ** 2

describe('stress areas', () => {
  it.each(metric)('M%d×%d: %d mm² as printed', (diameter, pitch, area) => {
    expect(Math.abs(stressAreaMetric(diameter, pitch) / area - 1)).toBeLessThan(0.005)
  })

  it.each(inch)('%s: %d per inch %d in², %d per inch %d in² as printed', (size, unc, uncArea, unf, unfArea) => {
    for (const [count, series, area] of [[unc, 'UNC', uncArea], [unf, 'UNF', unfArea]] as const) {
      const thread = parseThread(`${size}-${count}`)
      expect(Math.abs((thread?.stressAreaMm2 ?? 0) / in2 / area - 1)).toBeLessThan(0.004)
      expect(parseThread(`${size} ${series}`)?.pitchMm).toBeCloseTo(25.4 / count, 12)
    }
  })

  it('refuse what is no thread', () => {
    expect(() => stressAreaMetric(8, 0)).toThrow(RangeError)
    expect(() => stressAreaMetric(1, 1)).toThrow(RangeError)
    expect(() => stressAreaMetric(Number.NaN, 1)).toThrow(RangeError)
    expect(() => stressAreaInch(0.25, 2)).toThrow(RangeError)
  })
})

describe('thread designations', () => {
  it.each<[string, number, number | null]>([
    ['M8', 8, 1.25], ['m8', 8, 1.25], ['M8x1', 8, 1], ['M8 × 1', 8, 1], ['M10x1,25', 10, 1.25], ['M9', 9, null],
    ['3/8-16', 9.525, 1.5875], ['3/8–16 UNC', 9.525, 1.5875], ['1-8 UNC', 25.4, 3.175],
    ['1-1/8-7 UNC', 28.575, 25.4 / 7],
    ['1 1/2-6', 38.1, 25.4 / 6], ['5/16 in', 7.9375, null], ['1-1/8', 28.575, null], ['1"', 25.4, null],
    ['1/4 UNEF', 6.35, null],
  ])('%s', (text, diameterMm, pitchMm) => {
    const thread = parseThread(text)
    expect(thread?.designation).toBe(text)
    expect(thread?.diameterMm).toBeCloseTo(diameterMm, 12)
    if (pitchMm === null) expect(thread).toMatchObject({ pitchMm: null, stressAreaMm2: null })
    else expect(thread?.pitchMm).toBeCloseTo(pitchMm, 12)
  })

  it.each([
    '', 'banana', 'M', 'M0', 'M8x', 'M8x0', 'M8x9', '1/0-3', '9-', '1/4-1', '#', 'x'.repeat(5000),
  ])('is no thread: %.20s', (text) => {
    expect(parseThread(text)).toBeNull()
  })
})
