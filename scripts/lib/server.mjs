import http from 'node:http'
import https from 'node:https'
import { serverEntry } from './build.mjs'
import { ended, launch, openLog, stop } from './run.mjs'
import { Stop } from './say.mjs'
import { whyNot } from './port.mjs'

const everywhere = { '0.0.0.0': '127.0.0.1', '::': '::1' }

/** The address at which this machine reaches the server. */
export function origin({ host, port }, env = process.env) {
  const name = everywhere[host] ?? host
  return `${env.NITRO_SSL_CERT ? 'https' : 'http'}://${name.includes(':') ? `[${name}]` : name}:${port}`
}

function healthy(base) {
  const { get } = base.startsWith('https:') ? https : http
  return new Promise((resolve) => {
    const request = get(`${base}/api/health`, { timeout: 2000, rejectUnauthorized: false }, (response) => {
      response.resume()
      resolve(response.statusCode === 200)
    })
    request.once('timeout', () => request.destroy())
    request.once('error', () => resolve(false))
  })
}

/** Waits until the server's health answers 200; ends early when the server does. */
async function waitHealthy(base, child, seconds) {
  let code
  ended(child).then(value => code = value, () => code = 1)
  for (const end = Date.now() + seconds * 1000; Date.now() < end;) {
    if (code !== undefined) return false
    if (await healthy(base)) return true
    await new Promise(resolve => setTimeout(resolve, 50))
  }
  return false
}

/**
 * Serves the built application and answers `{ child, url }` once its health does. With `log`, a path, the server's words
 * go there instead of the terminal; errors are read from them in either case.
 */
export async function serve({ host, port, env, log, args = [serverEntry], seconds = 30 }) {
  const child = launch(process.execPath, args, {
    env: { ...env, HOST: host, NITRO_HOST: host, PORT: String(port), NITRO_PORT: String(port) },
    stdio: ['ignore', 'pipe', 'pipe'],
    group: true,
  })
  const file = log && openLog(log)
  const out = file ?? process.stdout
  const err = file ?? process.stderr
  let words = ''
  child.stdout.on('data', chunk => out.write(chunk))
  child.stderr.on('data', (chunk) => {
    err.write(chunk)
    words = `${words}${chunk}`.slice(-10_000)
  })
  const url = origin({ host, port }, env)
  if (await waitHealthy(url, child, seconds)) return { child, url }
  await stop(child)
  throw new Stop('server', serverReason(words, host, port))
}

/** Why the server did not come up, from its last words. */
export function serverReason(words, host, port) {
  const code = words.match(/EADDRINUSE|EACCES|EADDRNOTAVAIL/)?.[0]
  if (code) return whyNot(code, host, port)
  const line = words.split('\n').find(text => /error|invalid|missing/i.test(text))
  return `The server did not become healthy: ${line?.trim() ?? 'it did not say why.'}`
}
