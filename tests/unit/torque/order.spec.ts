import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import {
  circleOrder, defaultPattern, isPermutation, mostPositions, orderFor, patterns, rowOrder, twoRowLabels, twoRowsOrder,
} from '#shared/torque/order'

const count = fc.integer({ min: 1, max: 120 })

describe('tightening order', () => {
  it.each([
    [1, [1]], [2, [1, 2]], [3, [1, 2, 3]], [7, [1, 4, 7, 3, 6, 2, 5]], [10, [1, 6, 3, 8, 5, 10, 2, 7, 4, 9]],
  ])('circle of %d', (bolts, order) => {
    expect(circleOrder(bolts)).toEqual(order)
  })

  it.each([[1, [1]], [2, [1, 2]], [3, [2, 3, 1]], [4, [2, 3, 1, 4]]])('row of %d', (bolts, order) => {
    expect(rowOrder(bolts)).toEqual(order)
  })

  it('starts an even two-row set with the ring around the centre', () => {
    const labels = twoRowLabels(8)
    expect(labels).toEqual(['A1', 'A2', 'A3', 'A4', 'B1', 'B2', 'B3', 'B4'])
    expect(twoRowsOrder(8).map(position => labels[position - 1]))
      .toEqual(['A3', 'B2', 'B3', 'A2', 'A4', 'B1', 'B4', 'A1'])
    expect(twoRowsOrder(2)).toEqual([1, 2])
  })

  it('keeps a free pattern as it is drawn', () => {
    expect(orderFor('free', 4)).toEqual([1, 2, 3, 4])
  })

  it('is a permutation for every pattern and count', () => {
    fc.assert(fc.property(fc.constantFrom(...patterns), count, (pattern, n) => {
      const bolts = pattern === 'two_rows' ? 2 * n : n
      expect(isPermutation(orderFor(pattern, bolts), bolts)).toBe(true)
    }))
  })

  it('crosses an even circle with every second bolt', () => {
    fc.assert(fc.property(fc.integer({ min: 2, max: 60 }), (half) => {
      const order = circleOrder(2 * half)
      order.forEach((position, index) => {
        if (index % 2 === 1) expect(position - (order[index - 1] ?? 0)).toBe(half)
      })
    }))
  })

  it('goes from the centre outward in rows and two rows, two rows crossing over each time', () => {
    const farther = (distances: number[]) => distances.every((far, index) => far >= (distances[index - 1] ?? 0))
    fc.assert(fc.property(fc.integer({ min: 1, max: 60 }), (columns) => {
      const fromCentre = (column: number) => Math.abs(column - (columns + 1) / 2)
      expect(farther(rowOrder(columns).map(fromCentre))).toBe(true)
      const order = twoRowsOrder(2 * columns)
      expect(farther(order.map(position => fromCentre(position > columns ? position - columns : position)))).toBe(true)
      order.forEach((position, index) => {
        const partner = order[index - 1] ?? 0
        if (columns % 2 === 0 && index % 2 === 1) expect(position > columns).not.toBe(partner > columns)
      })
    }))
  })

  it.each([0, -1, 2.5, Number.NaN, Infinity, mostPositions + 1])('refuses a count of %d', (bolts) => {
    for (const pattern of patterns) expect(() => orderFor(pattern, bolts)).toThrow(RangeError)
  })

  it('refuses two rows of an odd count', () => {
    expect(() => twoRowsOrder(7)).toThrow(/even/)
    expect(() => twoRowLabels(7)).toThrow(RangeError)
  })

  it('accepts a printed order only when it names each position once', () => {
    expect(isPermutation([3, 1, 2], 3)).toBe(true)
    for (const order of [[1, 2], [1, 2, 2], [1, 2, 4], [0, 1, 2], [1, 2, 3, 3], [1, 2, 2.5]]) {
      expect(isPermutation(order, 3)).toBe(false)
    }
  })

  it('draws up to two bolts as a row, more as a circle', () => {
    expect([1, 2, 3, 12].map(defaultPattern)).toEqual(['row', 'row', 'circle', 'circle'])
  })
})
