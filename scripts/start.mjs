// npm start, npm run dev: from a bare clone to a served application, each step only when it is needed.
import { requireNode } from './lib/node-version.mjs'

requireNode()
const { main } = await import('./lib/main.mjs')
const { start, stopped } = await import('./lib/start.mjs')
main(() => start({ dev: process.argv.includes('--dev') }), { interrupted: stopped })
