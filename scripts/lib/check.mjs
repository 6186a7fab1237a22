import { mkdirSync } from 'node:fs'
import { artifacts, checks, vitest } from './checks.mjs'
import { ensurePackages } from './install.mjs'
import { runNode } from './run.mjs'
import { duration, say } from './say.mjs'

/** Runs all three at once, says each result when it is there and then what the failed ones said: 1 when one failed. */
export async function check() {
  await ensurePackages()
  mkdirSync(artifacts, { recursive: true })
  const results = await Promise.all(Object.entries({ ...checks, unit: vitest('unit') }).map(async ([name, args]) => {
    const start = Date.now()
    const { code, output } = await runNode(args, { quiet: true, group: true })
    say(name, `${code === 0 ? 'passed' : 'failed'} in ${duration(Date.now() - start)}`)
    return { name, code, output }
  }))
  const failed = results.filter(({ code }) => code !== 0)
  for (const { name, output } of failed) console.log(`\n── ${name} ──\n${output.trim()}`)
  if (failed.length) console.log('')
  say('check', failed.length ? `failed: ${failed.map(({ name }) => name).join(', ')}` : 'all passed')
  return failed.length ? 1 : 0
}
