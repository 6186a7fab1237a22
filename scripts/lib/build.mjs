import { existsSync, rmSync, writeFileSync } from 'node:fs'
import { refuseFullDisk, requireSpace } from './disk.mjs'
import { hashFiles, storedHash } from './hash.mjs'
import { bin, dataDir, inRoot, root } from './paths.mjs'
import { runNode } from './run.mjs'
import { duration, say, Stop } from './say.mjs'

const stamp = inRoot('.output/.jamnut-build-hash')

/** The built server. */
export const serverEntry = inRoot('.output/server/index.mjs')

const folders = new Set([
  '.git', '.ci', '.nuxt', '.output', '.data', 'node_modules', 'tests', 'scripts', 'seeds', 'docs', 'coverage',
])

/** True for what a build does not read: made folders, tests, scripts, documents. Takes a path below the project and its last name. */
export function isNoSource(path, name) {
  return folders.has(path) || name === 'node_modules' || name.endsWith('.log') || name.endsWith('.md')
}

/** Builds the application into .output unless the one there is of these sources. */
export async function ensureBuild() {
  const hash = hashFiles(root, isNoSource)
  if (existsSync(serverEntry) && storedHash(stamp) === hash) return
  requireSpace(root, 1000)
  say('build', existsSync(serverEntry) ? 'the sources changed, building (about a minute)' : 'building the application (about a minute)')
  const began = Date.now()
  rmSync(stamp, { force: true })
  const log = inRoot(dataDir, 'logs/build.log')
  const { code, output } = await runNode([bin('nuxt'), 'build'], { quiet: true, log })
  if (code !== 0) refuseFullDisk('build', output)
  if (code !== 0 || !existsSync(serverEntry)) throw new Stop('build', `nuxt build failed: ${buildReason(output)} (${log})`)
  writeFileSync(stamp, `${hash}\n`)
  say('build', `built in ${duration(Date.now() - began)}`)
}

/** The first line of a build's output that speaks of an error. */
export function buildReason(output) {
  // eslint-disable-next-line no-control-regex -- the colours of a terminal begin with an escape
  const lines = output.replace(/\u001B\[[0-9;]*m/g, '').split('\n').map(line => line.trim())
  return lines.find(line => /error/i.test(line)) ?? 'see the log'
}
