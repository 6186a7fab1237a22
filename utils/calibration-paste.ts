import { emptyReading, type PointEntry } from './calibration-form'

export interface PasteTarget {
  point: number
  reading: number
  field: 'indicated' | 'reference'
}

const mostReadings = 20

/** The numbers of a block copied from a spreadsheet, row by row; rows without a number, such as headings, are left out. */
export function numbersIn(block: string): string[][] {
  return block.split(/\r?\n/)
    .map(line => line.split(/\t|;/).flatMap(cell => /-?\d+(?:[.,]\d+)?/.exec(cell)?.[0].replace(',', '.') ?? []))
    .filter(row => row.length > 0)
}

/** One value alone is an ordinary paste into one field. */
export const isBlock = (text: string): boolean => /[\t\n;]/.test(text.trim())

/**
 * Lays a pasted block into the grid from one cell on. A single column runs through the readings and on into the next
 * points; rows of several values are a point each, a leading value equal to the point itself left out; two columns
 * pasted into an indicated field are pairs of indicated and reference.
 * @returns the points, and how many values found no place
 */
export function pasteBlock(points: readonly PointEntry[], at: PasteTarget, block: string): { points: PointEntry[], left: number } {
  const rows = numbersIn(block)
  const next = points.map(point => ({ ...point, readings: point.readings.map(reading => ({ ...reading })) }))
  let left = 0
  const put = (point: number, reading: number, values: Partial<PointEntry['readings'][number]>) => {
    const entry = next[point]
    if (!entry || reading >= mostReadings) {
      left += Object.keys(values).length
      return
    }
    while (entry.readings.length <= reading) entry.readings.push(emptyReading())
    entry.readings[reading] = { ...entry.readings[reading] ?? emptyReading(), ...values }
  }

  const pairs = at.field === 'indicated' && rows.length > 1 && rows.every(row => row.length === 2)
  if (pairs || rows.every(row => row.length === 1)) {
    let { point, reading } = at
    for (const [first = '', second = ''] of rows) {
      while (next[point] && reading >= (next[point]?.readings.length ?? 0)) {
        point++
        reading = 0
      }
      put(point, reading, pairs ? { indicated: first, reference: second } : { [at.field]: first })
      reading++
    }
    return { points: next, left }
  }

  rows.forEach((row, index) => {
    const point = next[at.point + index]
    const named = at.reading === 0 && point && Number(row[0]) === Number(point.target) && row.length > point.readings.length
    const values = named ? row.slice(1) : row
    values.forEach((value, column) => put(at.point + index, at.reading + column, { [at.field]: value }))
  })
  return { points: next, left }
}
