import { mkdirSync, rmSync } from 'node:fs'
import { ensureBuild } from './build.mjs'
import { artifacts, checks, report, vitest } from './checks.mjs'
import { ensureChromium } from './chromium.mjs'
import { withoutOurs } from './env.mjs'
import { ensurePackages } from './install.mjs'
import { inRoot } from './paths.mjs'
import { freePort } from './port.mjs'
import { add, none, readReport, summary } from './results.mjs'
import { isHalted, runNode, stop } from './run.mjs'
import { duration, explain, say } from './say.mjs'
import { openSecrets } from './secrets.mjs'
import { serve } from './server.mjs'
import { chosen, needs } from './suites.mjs'
import { mark, newRun, sweep, sweepAbandoned } from './sweep.mjs'
import { dropAbandoned, dropCluster, makeCluster, makeDatabase, testDataDir } from './test-cluster.mjs'

const began = Date.now()
const run = newRun()
let total = none

// All that a run starts carries its mark, and nothing of ours that happens to be set here.
const clean = { ...withoutOurs(process.env), [mark]: run }

/** Runs one step under a heading. A step answers its result; one that throws is a failure. */
async function step(name, work) {
  console.log(`\n── ${name} ${'─'.repeat(Math.max(4, 72 - name.length))}`)
  const start = Date.now()
  let result
  try {
    result = await work() ?? none
  } catch (error) {
    const line = explain(error)
    if (line) console.error(line)
    result = { passed: 0, failed: 1 }
  }
  if (isHalted()) return new Promise(() => {}) // the last words are already being said
  total = add(total, result)
  say(name, `${result.failed ? 'failed' : 'done'} in ${duration(Date.now() - start)}`)
  return result.failed === 0
}

/** A program without tests of its own: silent when it succeeds, one failure when not. */
async function check(args) {
  const { code, output } = await runNode(args, { env: clean, quiet: true, group: true })
  if (code === 0) return none
  console.log(output.trim())
  return { passed: 0, failed: 1 }
}

async function project(name, env) {
  rmSync(report(name), { force: true })
  const { code } = await runNode(vitest(name), { env, group: true })
  return readReport(report(name), code)
}

/** Serves the built application on a database of its own while `work(env)` runs; its words go to the artifacts. */
async function withServer(name, env, work) {
  const urls = await makeDatabase(`jamnut_${name}`, env, { demo: true })
  const { DATABASE_URL } = urls
  const log = inRoot(artifacts, `server-${name}.log`)
  const { child, url } = await serve({
    host: '127.0.0.1', port: await freePort(), env: { ...env, DATABASE_URL, NODE_ENV: 'production' }, log,
  })
  try {
    return await work({ ...env, ...urls, JAMNUT_E2E_URL: url })
  } finally {
    await stop(child)
  }
}

async function bench(env) {
  const { code } = await runNode(['--import', 'jiti/register', inRoot('tests/bench/run.ts')], { env, group: true })
  return { passed: 0, failed: code === 0 ? 0 : 1 }
}

/** Prepares what the suites need, then runs them: 1 when anything failed. */
export async function test(args) {
  const names = chosen(args)
  const need = needs(names)
  mkdirSync(artifacts, { recursive: true })
  const env = { ...clean, JAMNUT_DATA_DIR: testDataDir }

  const prepared = await step('set-up', async () => {
    await dropAbandoned()
    await sweepAbandoned()
    await ensurePackages()
    if (need.chromium) env.JAMNUT_CHROMIUM = await ensureChromium()
    if (!need.cluster) return
    await makeCluster({ durable: names.includes('bench') })
    Object.assign(env, openSecrets(testDataDir, {}).env)
  })
  if (!prepared) return 1

  const work = {
    lint: () => check(checks.lint),
    types: () => check(checks.types),
    unit: () => project('unit', clean),
    elsewhere: () => project('elsewhere', clean),
    nuxt: () => project('nuxt', clean),
    server: async () => project('server', { ...env, ...await makeDatabase('jamnut_server', env) }),
    e2e: () => withServer('e2e', env, served => project('e2e', served)),
    bench: () => withServer('bench', env, bench),
  }
  let built
  for (const name of names) {
    if (needs([name]).built) built ??= await step('build', ensureBuild)
    if (needs([name]).built && !built) continue
    await step(name, work[name])
  }
  return total.failed ? 1 : 0
}

/** After a signal. */
export function interrupted(code) {
  console.error('\ntest       interrupted')
  return code
}

/** Leaves nothing running, then says the last line. A run that did not come to its end counts as a failure. */
export async function finish(code) {
  if (code !== 0 && total.failed === 0) total = add(total, { passed: 0, failed: 1 })
  await dropCluster()
  await sweep(run)
  console.log(`\ntest       took ${duration(Date.now() - began)}`)
  console.log(summary(total))
  return code
}
