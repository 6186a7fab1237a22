// npm run check: lint, types and unit tests side by side, in less than a minute.
import { requireNode } from './lib/node-version.mjs'

requireNode()
const { main } = await import('./lib/main.mjs')
const { check } = await import('./lib/check.mjs')
main(check)
