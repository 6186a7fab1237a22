import { existsSync, readdirSync, readFileSync } from 'node:fs'

/** The name of the variable by which a run's processes are known, whatever process group they moved to. */
export const mark = 'JAMNUT_TEST_RUN'

/** The living processes that carry a run's mark in their environment: [{ pid, run }]. */
function marked() {
  return readdirSync('/proc').filter(name => /^\d+$/.test(name) && Number(name) !== process.pid).flatMap((pid) => {
    try {
      const entry = readFileSync(`/proc/${pid}/environ`, 'utf8').split('\0').find(text => text.startsWith(`${mark}=`))
      return entry ? [{ pid: Number(pid), run: entry.slice(mark.length + 1) }] : []
    } catch {
      return [] // gone, or another user's
    }
  })
}

function signal(pids, name) {
  for (const pid of pids) {
    try {
      process.kill(pid, name)
    } catch (error) {
      if (error.code !== 'ESRCH') throw error
    }
  }
}

async function end(find) {
  const pids = () => marked().filter(find).map(({ pid }) => pid)
  signal(pids(), 'SIGTERM')
  for (const limit = Date.now() + 2000; Date.now() < limit && pids().length > 0;) {
    await new Promise(resolve => setTimeout(resolve, 50))
  }
  signal(pids(), 'SIGKILL')
}

/** A name for this run. It begins with the id of its process, so that others can tell whether that still lives. */
export const newRun = () => `${process.pid}-${Date.now()}`

/** Ends what a run has left behind, a browser say; kills what does not listen within two seconds. */
export const sweep = run => end(process => process.run === run)

/** The same for all runs that were killed themselves. */
export const sweepAbandoned = () => end(process => !existsSync(`/proc/${process.run.split('-')[0]}`))
