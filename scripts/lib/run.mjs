import { spawn } from 'node:child_process'
import { createWriteStream, mkdirSync } from 'node:fs'
import { dirname } from 'node:path'
import { root } from './paths.mjs'
import { Stop } from './say.mjs'

let halted = false
const alive = new Map()
const endings = new WeakMap()

/**
 * Starts a program that stopAll() will end. `group` gives it a process group of its own, so that all it starts ends with
 * it; not for what may ask for a password, which needs the terminal. After stopAll() only what is marked `last` starts.
 */
export function launch(command, args, { env = process.env, stdio = 'inherit', group = false, last = false } = {}) {
  if (halted && !last) throw new Stop('', '')
  const child = spawn(command, args, { cwd: root, env, stdio, detached: group })
  alive.set(child, group)
  const ending = new Promise((resolve, reject) => {
    child.once('error', reject)
    child.once('close', code => resolve(code ?? 1))
  })
  ending.catch(() => {}).then(() => alive.delete(child))
  endings.set(child, ending)
  return child
}

/** Waits for the end of a launched program: its exit code; 1 when a signal ended it. */
export const ended = child => endings.get(child)

/** A file for a program's words. A full disk loses words, it does not end the program that hears them. */
export function openLog(path) {
  mkdirSync(dirname(path), { recursive: true })
  return createWriteStream(path).on('error', () => {})
}

/**
 * Runs a program to its end: `{ code, output }`. With `quiet` its words are kept in `output` instead of being shown, and
 * with `log`, a path, written there as well.
 */
export async function run(command, args, { quiet = false, log, ...options } = {}) {
  if (!quiet) return { code: await ended(launch(command, args, options)), output: '' }
  const child = launch(command, args, { ...options, stdio: ['ignore', 'pipe', 'pipe'] })
  const file = log && openLog(log)
  const chunks = []
  for (const stream of [child.stdout, child.stderr]) {
    stream.on('data', (chunk) => {
      chunks.push(chunk)
      file?.write(chunk)
    })
  }
  const code = await ended(child)
  if (file) await new Promise(done => file.end(done))
  return { code, output: Buffer.concat(chunks).toString() }
}

/** Runs a program of Node's, such as node_modules/.bin/nuxt or a script. */
export const runNode = (args, options) => run(process.execPath, args, options)

/** The last line of some output that says something. */
export function lastLine(output) {
  return output.trimEnd().split('\n').at(-1)?.trim() ?? ''
}

function signal(child, group, name) {
  try {
    process.kill(group ? -child.pid : child.pid, name)
  } catch (error) {
    if (error.code !== 'ESRCH') throw error
  }
}

/** Ends a launched program and what belongs to its group; one that does not listen for ten seconds is killed. */
export async function stop(child) {
  if (!alive.has(child)) return
  const group = alive.get(child)
  const timer = setTimeout(() => signal(child, group, 'SIGKILL'), 10_000)
  signal(child, group, 'SIGTERM')
  await ended(child).catch(() => {})
  clearTimeout(timer)
}

/** True once stopAll() was called: nothing new is to begin. */
export const isHalted = () => halted

/** Ends all that still runs, and keeps anything new from starting. */
export async function stopAll() {
  halted = true
  await Promise.all([...alive.keys()].map(stop))
}
