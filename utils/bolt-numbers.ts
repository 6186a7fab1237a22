import type { BoltPlace } from '#shared/schemas/torque-specs'
import { isPermutation, twoRowLabels, type Pattern } from '#shared/torque/order'

/** Whole bolts typed, or null. */
export function countOf(text: string): number | null {
  const count = /^\d{1,3}$/.test(text.trim()) ? Number(text) : 0
  return count >= 1 && count <= 120 ? count : null
}

export type ReadPositions = { ok: true, positions: number[] } | { ok: false, message: string }

/** Bolt numbers as people write them, "1 4 2 5" or "A2, B2"; `count` null while it is not known. */
export function readPositions(text: string, count: number | null, pattern: Pattern | ''): ReadPositions {
  const labels = pattern === 'two_rows' && count !== null && count % 2 === 0 ? twoRowLabels(count) : []
  const positions: number[] = []
  for (const word of text.split(/[\s,;>→–-]+/).filter(Boolean)) {
    const named = labels.indexOf(word.toUpperCase())
    const position = named >= 0 ? named + 1 : /^\d{1,3}$/.test(word) ? Number(word) : 0
    if (position === 0) return { ok: false, message: `“${word}” is no bolt number.` }
    if (count !== null && position > count) return { ok: false, message: `There is no bolt ${position} among ${count}.` }
    if (positions.includes(position)) return { ok: false, message: `Bolt ${position} stands twice.` }
    positions.push(position)
  }
  return { ok: true, positions }
}

/** A printed tightening order, which must name every bolt once. */
export function readPrintedOrder(text: string, count: number | null, pattern: Pattern | ''): ReadPositions {
  const read = readPositions(text, count, pattern)
  if (!read.ok || read.positions.length === 0) return read
  if (count === null) return { ok: false, message: 'Say how many bolts there are, then the order can be checked.' }
  if (isPermutation(read.positions, count)) return read
  const missing = Array.from({ length: count }, (_, index) => index + 1).filter(position => !read.positions.includes(position))
  return { ok: false, message: `${missing.length === 1 ? 'Bolt' : 'Bolts'} ${missing.join(', ')} ${missing.length === 1 ? 'is' : 'are'} missing.` }
}

/** A place for each of `count` bolts, 0 to 1000 across and down: as drawn so far, the others on a circle. */
export function placesFor(drawn: readonly BoltPlace[], count: number): { position: number, x: number, y: number }[] {
  return Array.from({ length: count }, (_, index) => {
    const known = drawn.find(place => place.position === index + 1)
    const angle = 2 * Math.PI * index / count
    return {
      position: index + 1,
      x: known?.x ?? Math.round(500 + 400 * Math.sin(angle)),
      y: known?.y ?? Math.round(500 - 400 * Math.cos(angle)),
    }
  })
}
