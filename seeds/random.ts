/** A small generator that gives the same numbers for the same seed (mulberry32), so that the demo is the same everywhere. */
export function generator(seed: number) {
  let state = seed
  const next = () => {
    state = (state + 0x6D2B79F5) | 0
    let mixed = Math.imul(state ^ (state >>> 15), 1 | state)
    mixed = (mixed + Math.imul(mixed ^ (mixed >>> 7), 61 | mixed)) ^ mixed
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 4_294_967_296
  }
  return {
    next,
    between: (low: number, high: number) => low + (high - low) * next(),
    pick: <Item>(items: readonly Item[]): Item => {
      const item = items[Math.floor(next() * items.length)]
      if (item === undefined) throw new Error('There is nothing to pick from.')
      return item
    },
  }
}

export type Random = ReturnType<typeof generator>
