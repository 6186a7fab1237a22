import { readdirSync, readFileSync } from 'node:fs'

/** The name of the variable by which a run's processes are known, whatever process group they moved to. */
export const mark = 'JAMNUT_TEST_RUN'

/** The ids of living processes that carry this run's mark in their environment. */
export function marked(value) {
  return readdirSync('/proc').filter(name => /^\d+$/.test(name)).map(Number).filter((pid) => {
    try {
      return pid !== process.pid && readFileSync(`/proc/${pid}/environ`, 'utf8').split('\0').includes(`${mark}=${value}`)
    } catch {
      return false // gone, or another user's
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

/** Ends what a run has left behind, a browser say; kills what does not listen within two seconds. */
export async function sweep(value) {
  signal(marked(value), 'SIGTERM')
  for (const end = Date.now() + 2000; Date.now() < end && marked(value).length > 0;) {
    await new Promise(resolve => setTimeout(resolve, 50))
  }
  signal(marked(value), 'SIGKILL')
}
