import { createServer } from 'node:net'
import { Stop } from './say.mjs'

function listen(host, port) {
  return new Promise((resolve, reject) => {
    const server = createServer()
    server.once('error', reject)
    server.listen({ host, port, exclusive: true }, () => {
      const { port: given } = server.address()
      server.close(() => resolve(given))
    })
  })
}

/** HOST and PORT as the server will use them: { host, port }. Stops at a port that is none. */
export function address(env) {
  const host = env.HOST || '127.0.0.1'
  const port = Number(env.PORT || 3000)
  if (!Number.isInteger(port) || port < 1 || port > 65535) {
    throw new Stop('server', `PORT is '${env.PORT}': it has to be a whole number from 1 to 65535.`)
  }
  return { host, port }
}

/** True when only this machine can reach what listens there. */
export function isLoopback(host) {
  return host === 'localhost' || host === '::1' || /^127(\.\d{1,3}){3}$/.test(host)
}

/** Stops, naming the port, when something already listens on it or it may not be used. */
export async function requireFree({ host, port }) {
  try {
    await listen(host, port)
  } catch (error) {
    throw new Stop('server', whyNot(error.code, host, port))
  }
}

/** Why an address cannot be listened on, in one line. */
export function whyNot(code, host, port) {
  if (code === 'EADDRINUSE') return `Port ${port} on ${host} is taken by another program: end that, or choose another: PORT=${port + 1} npm start`
  if (code === 'EACCES') return `Port ${port} is reserved for root: choose one above 1023.`
  if (code === 'EADDRNOTAVAIL' || code === 'ENOTFOUND') return `HOST is '${host}': this machine has no such address.`
  return `Cannot listen on ${host}:${port}: ${code}`
}

/** A port on loopback that nothing uses now. */
export const freePort = () => listen('127.0.0.1', 0)
