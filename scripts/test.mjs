// npm test: everything from nothing. Leaves nothing running, and ends with the line `N passed, N failed`.
// usage: node scripts/test.mjs [lint | types | unit | nuxt | server | e2e | bench]…
import { requireNode } from './lib/node-version.mjs'

requireNode()
const { main } = await import('./lib/main.mjs')
const { test, interrupted, finish } = await import('./lib/test.mjs')
main(() => test(process.argv.slice(2)), { interrupted, finish })
