import { Stop } from './say.mjs'

/** What npm test runs, in this order. */
export const suites = ['lint', 'types', 'unit', 'elsewhere', 'nuxt', 'server', 'e2e']

/** The suites that the arguments of scripts/test.mjs name: all without one. 'bench' runs only when named. */
export function chosen(args) {
  const known = [...suites, 'bench']
  const unknown = args.find(arg => !known.includes(arg))
  if (unknown) throw new Stop('test', `There is no suite '${unknown}': ${known.join(', ')}.`)
  return args.length ? known.filter(suite => args.includes(suite)) : suites
}

/** What the suites need: { cluster, built, chromium }. */
export function needs(names) {
  const any = (...wanted) => wanted.some(name => names.includes(name))
  return { cluster: any('server', 'e2e', 'bench'), built: any('e2e', 'bench'), chromium: any('e2e') }
}
