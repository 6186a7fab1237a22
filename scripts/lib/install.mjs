import { existsSync, readFileSync, rmSync, writeFileSync } from 'node:fs'
import { refuseFullDisk, requireSpace } from './disk.mjs'
import { hashTexts, storedHash } from './hash.mjs'
import { bin, dataDir, inRoot, root } from './paths.mjs'
import { run, runNode } from './run.mjs'
import { duration, say, Stop } from './say.mjs'

const stamp = inRoot('node_modules/.jamnut-lock-hash')

/** Changes when what npm would install changes; a new script in package.json does not. */
export function packagesHash(packageJson, packageLock) {
  const { dependencies, devDependencies, overrides } = JSON.parse(packageJson)
  return hashTexts(JSON.stringify([dependencies, devDependencies, overrides]), packageLock)
}

/** What went wrong, from npm's many words. */
export function npmReason(output) {
  const lines = output.split('\n').map(line => line.match(/^npm (?:error|ERR!) (?!code |errno |syscall |A complete log)(.+)/)?.[1])
  return `npm ci failed: ${lines.find(Boolean) ?? 'see the log'}`
}

async function install() {
  requireSpace(root, 1000)
  say('packages', existsSync(inRoot('node_modules'))
    ? 'node_modules does not fit package-lock.json, installing again (npm ci, about a minute)'
    : 'installing (npm ci, about a minute)')
  const began = Date.now()
  rmSync(stamp, { force: true })
  const log = inRoot(dataDir, 'logs/npm-ci.log')
  const npm = process.env.npm_execpath
  const args = ['ci', '--ignore-scripts', '--include=dev', '--no-audit', '--no-fund', '--loglevel=error']
  const { code, output } = npm
    ? await runNode([npm, ...args], { quiet: true, log })
    : await run('npm', args, { quiet: true, log })
  if (code !== 0) refuseFullDisk('packages', output)
  if (code !== 0) throw new Stop('packages', `${npmReason(output)} (${log})`)
  say('packages', `installed in ${duration(Date.now() - began)}`)
}

/** Has Nuxt write the types and settings under .nuxt that lint, types and tests read. */
async function prepare() {
  const log = inRoot(dataDir, 'logs/nuxt-prepare.log')
  const { code, output } = await runNode([bin('nuxt'), 'prepare'], { quiet: true, log })
  if (code !== 0) refuseFullDisk('packages', output)
  if (code !== 0) throw new Stop('packages', `nuxt prepare failed: see ${log}`)
}

/** Brings node_modules in line with package-lock.json; costs a few milliseconds when it is. */
export async function ensurePackages() {
  const hash = packagesHash(readFileSync(inRoot('package.json'), 'utf8'), readFileSync(inRoot('package-lock.json'), 'utf8'))
  const stale = storedHash(stamp) !== hash
  if (stale) await install()
  if (stale || !existsSync(inRoot('.nuxt/tsconfig.json'))) await prepare()
  if (stale) writeFileSync(stamp, `${hash}\n`)
}
