import { describe, expect, it } from 'vitest'
import { circleOrder, rowOrder, twoRowLabels, twoRowsOrder } from '#shared/torque/order'
import { customaryPasses, passesFor } from '#shared/torque/stages'
import { fromNm, toNm } from '#shared/torque/units'

// Source: ASME PCC-1 legacy table for 4, 8, 12, 16 and 20 bolts [memory]; the stars of 5 and 6 are common practice, no
// source; our own rule reproduces all of them.
const circles = [
  { count: 4, expected: [1, 3, 2, 4] },
  { count: 5, expected: [1, 3, 5, 2, 4] },
  { count: 6, expected: [1, 4, 2, 5, 3, 6] },
  { count: 8, expected: [1, 5, 3, 7, 2, 6, 4, 8] },
  { count: 12, expected: [1, 7, 4, 10, 2, 8, 5, 11, 3, 9, 6, 12] },
  { count: 16, expected: [1, 9, 5, 13, 3, 11, 7, 15, 2, 10, 6, 14, 4, 12, 8, 16] },
  { count: 20, expected: [1, 11, 6, 16, 3, 13, 8, 18, 5, 15, 10, 20, 2, 12, 7, 17, 4, 14, 9, 19] },
]

describe('tightening order', () => {
  it.each(circles)('circle of $count (PCC-1 legacy table [memory]; 5 and 6 common practice, no source)', (row) => {
    expect(circleOrder(row.count)).toEqual(row.expected)
  })

  it('row of nine, centre out (US Army TM 5-3805-298-23-2, ranks 9 7 5 3 1 2 4 6 8) [seen: tpub.com]', () => {
    expect(rowOrder(9)).toEqual([5, 6, 4, 7, 3, 8, 2, 9, 1])
  })

  it('two rows of five, centre out (own rule; the maker’s sequence always wins)', () => {
    const labels = twoRowLabels(10)
    expect(twoRowsOrder(10).map(position => labels[position - 1]))
      .toEqual(['A3', 'B3', 'A4', 'B2', 'B4', 'A2', 'A5', 'B1', 'B5', 'A1'])
  })
})

describe('passes', () => {
  it('30, 70 and 100 % (ASME PCC-1 rounds [memory]; 30/60/100 and a circular pass [seen: gasket-supplier FAQ])', () => {
    expect(passesFor(100, [30, 70, 100])).toEqual([30, 70, 100])
  })

  it('60 lbf·ft goes to 42 first (US Army TM: above 30 lbf·ft to 70 %, then final) [seen: tpub.com]', () => {
    const passes = customaryPasses(toNm({ value: 60, unit: 'lbf.ft' })).map(nm => fromNm(nm, 'lbf.ft'))
    expect(passes).toEqual([expect.closeTo(42, 12), expect.closeTo(60, 12)])
  })
})
