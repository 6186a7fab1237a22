import { randomBytes } from 'node:crypto'
import { mkdirSync, readFileSync, writeFileSync } from 'node:fs'
import { join } from 'node:path'

const files = { NUXT_SESSION_PASSWORD: 'session-password', JAMNUT_PIN_PEPPER: 'pin-pepper' }

function readOrMake(path) {
  try {
    return { value: readFileSync(path, 'utf8').trim(), made: false }
  } catch (error) {
    if (error.code !== 'ENOENT') throw error
  }
  const value = randomBytes(48).toString('base64url')
  writeFileSync(path, `${value}\n`, { mode: 0o600, flag: 'wx' })
  return { value, made: true }
}

/**
 * The server's secrets, 64 random characters each: those of the environment, else of files under `secrets/` that only
 * their owner can read, made on the first start. Answers `{ env, made }`, env with both by name, made the files written.
 * @param {string} dataDir
 * @param {Record<string, string | undefined>} given
 * @returns {{ env: Record<string, string>, made: string[] }}
 */
export function openSecrets(dataDir, given = process.env) {
  const folder = join(dataDir, 'secrets')
  mkdirSync(folder, { recursive: true, mode: 0o700 })
  const env = {}
  const made = []
  for (const [name, file] of Object.entries(files)) {
    if (given[name]) {
      env[name] = given[name]
      continue
    }
    const secret = readOrMake(join(folder, file))
    env[name] = secret.value
    if (secret.made) made.push(file)
  }
  return { env, made }
}
