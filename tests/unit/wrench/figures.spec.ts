import { describe, expect, it } from 'vitest'
import { figuresAt, interpolate, type CalibrationPoint } from '#shared/wrench/figures'

type Point = CalibrationPoint

function point(targetNm: number, bias: number, w: number | null, change: Partial<Point> = {}): Point {
  const wPrimePercent = w === null ? null : Math.abs(bias) + w
  return { phase: 'as_found', targetNm, meanDeviationPercent: bias, wPercent: w, wPrimePercent, ...change }
}

describe('interpolation', () => {
  const points = [{ x: 20, y: 1 }, { x: 60, y: 3 }, { x: 100, y: 2 }]

  it.each([[20, 1], [40, 2], [60, 3], [80, 2.5], [100, 2], [10, 1], [200, 2]])('at %d: %d', (x, y) => {
    expect(interpolate(points, x)).toBeCloseTo(y, 12)
  })

  it('is null without points, or where a needed one has none', () => {
    expect(interpolate([], 20)).toBeNull()
    const gap = [{ x: 20, y: 1 }, { x: 60, y: null }, { x: 100, y: 2 }]
    expect([20, 40, 60, 80, 100].map(x => interpolate(gap, x))).toEqual([1, null, null, null, 2])
  })
})

describe('figures of a calibration', () => {
  it('takes as left where there is any', () => {
    const points = [point(20, 5, 1), point(20, 0.5, 1, { phase: 'as_left' })]
    expect(figuresAt(points, 20)).toEqual({ biasPercent: 0.5, wPercent: 1, wPrimePercent: 1.5 })
    expect(figuresAt(points.slice(0, 1), 20)).toMatchObject({ biasPercent: 5 })
  })

  it('goes linearly between points in any order, and stays at the ends', () => {
    const points = [point(100, 2, 1), point(20, 1, 3)]
    expect(figuresAt(points, 60)).toEqual({ biasPercent: 1.5, wPercent: 2, wPrimePercent: 3.5 })
    expect(figuresAt(points, 5)).toMatchObject({ biasPercent: 1 })
    expect(figuresAt(points, 500)).toMatchObject({ biasPercent: 2 })
  })

  it('takes the direction asked for, else the worse of two', () => {
    const points = [
      point(60, 1, 1, { direction: 'clockwise' }),
      point(60, -3, 1, { direction: 'anticlockwise' }),
    ]
    expect(figuresAt(points, 60, 'clockwise')).toMatchObject({ biasPercent: 1 })
    expect(figuresAt(points, 60, 'sideways')).toMatchObject({ biasPercent: -3 })
    expect(figuresAt(points, 60)).toMatchObject({ biasPercent: -3 })
  })

  it('keeps null what the certificate does not say', () => {
    expect(figuresAt([point(60, 1, null, { wPrimePercent: 2.5 })], 60))
      .toEqual({ biasPercent: 1, wPercent: null, wPrimePercent: 2.5 })
    expect(figuresAt([], 60)).toBeNull()
  })
})
