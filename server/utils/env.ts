import { existsSync, readFileSync } from 'node:fs'
import { join } from 'node:path'

/** The settings of the process, read and judged once. */
export interface Env {
  databaseUrl: string
  pinPepper: string
  logLevel: string
  /** Behind a proxy of our own, whose X-Forwarded-For may be believed. */
  trustProxy: boolean
}

const secretFile = (name: string) => join(process.env.JAMNUT_DATA_DIR ?? '.data', 'secrets', name)

/**
 * Reads the environment; throws one error that lists all that is wrong.
 * The pepper of the PIN verifiers comes from JAMNUT_PIN_PEPPER or a 0600 file, never from the database.
 */
export function readEnv(source: NodeJS.ProcessEnv = process.env): Env {
  const wrong: string[] = []
  const databaseUrl = source.DATABASE_URL ?? ''
  if (!/^postgres(ql)?:\/\//.test(databaseUrl)) wrong.push('DATABASE_URL must be a postgres:// address')
  const file = secretFile('pin-pepper')
  const pinPepper = source.JAMNUT_PIN_PEPPER ?? (existsSync(file) ? readFileSync(file, 'utf8').trim() : '')
  if (pinPepper.length < 32) wrong.push('JAMNUT_PIN_PEPPER must have 32 characters or more')
  const sessionPassword = source.NUXT_SESSION_PASSWORD ?? ''
  if (sessionPassword.length < 32) wrong.push('NUXT_SESSION_PASSWORD must have 32 characters or more')
  if (wrong.length > 0) throw new Error(`The settings are not complete: ${wrong.join('; ')}.`)
  return { databaseUrl, pinPepper, logLevel: source.LOG_LEVEL ?? 'info', trustProxy: source.JAMNUT_TRUST_PROXY === '1' }
}

let known: Env | undefined
/** The environment of this process. */
export function env(): Env {
  known ??= readEnv()
  return known
}
