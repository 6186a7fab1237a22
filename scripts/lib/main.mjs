import { stopAll } from './run.mjs'
import { explain } from './say.mjs'

function complain(error) {
  const line = explain(error)
  if (line) console.error(line)
}

const signals = { SIGINT: 130, SIGTERM: 143, SIGHUP: 129 }

/**
 * Runs a command to its exit code. An error becomes one line and the code 1. A signal first ends what was launched, then
 * `interrupted(code)` says the last words and answers the exit code. `finish(code)` runs in any case, at the very end, and
 * answers the exit code too.
 */
export function main(work, { interrupted = code => code, finish = code => code } = {}) {
  let ending
  const end = (getCode) => {
    ending ??= getCode().then(finish).then(
      code => process.exit(code),
      (error) => {
        complain(error)
        process.exit(1)
      },
    )
  }
  for (const [name, code] of Object.entries(signals)) {
    process.on(name, () => end(() => stopAll().then(() => interrupted(code))))
  }
  work().catch((error) => {
    if (!ending) complain(error)
    return stopAll().then(() => 1)
  }).then(code => end(async () => code))
}
