// Read by any Node that knows modules, also one too old for the rest: nothing newer than its needs in here.
import { readFileSync } from 'node:fs'

/**
 * True when a version satisfies an engines range of comparators, all of which must hold, such as '>=20.19 <21'.
 * A part left out counts as 0.
 */
export function satisfies(version, range) {
  const numbers = text => text.split('.').map(Number).concat(0, 0).slice(0, 3)
  const compare = (a, b) => a[0] - b[0] || a[1] - b[1] || a[2] - b[2]
  return range.split(' ').every((comparator) => {
    const difference = compare(numbers(version), numbers(comparator.replace(/^[<>=]+/, '')))
    return comparator.startsWith('>=') ? difference >= 0 : difference < 0
  })
}

/** Ends the process with one line unless this is the Node that package.json asks for. */
export function requireNode() {
  const { engines } = JSON.parse(readFileSync(new URL('../../package.json', import.meta.url), 'utf8'))
  if (satisfies(process.versions.node, engines.node)) return
  console.error(`node       Jamnut needs Node ${engines.node}, this is ${process.versions.node}.`)
  process.exit(1)
}
