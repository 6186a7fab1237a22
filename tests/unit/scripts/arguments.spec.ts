import { describe, expect, it } from 'vitest'
import { address, isLoopback, whyNot } from '../../../scripts/lib/port.mjs'
import { origin } from '../../../scripts/lib/server.mjs'
import { firstData } from '../../../scripts/lib/start.mjs'
import { chosen, needs } from '../../../scripts/lib/suites.mjs'

describe('the suites of npm test', () => {
  it('are all but the bench without arguments', () => {
    expect(chosen([])).toEqual(['lint', 'types', 'unit', 'elsewhere', 'nuxt', 'server', 'e2e'])
  })

  it('are the named ones, in our order', () => {
    expect(chosen(['bench', 'server', 'unit'])).toEqual(['unit', 'server', 'bench'])
  })

  it('refuse a name that is none', () => {
    expect(() => chosen(['units'])).toThrow(`There is no suite 'units'`)
  })

  it('need only what they use', () => {
    expect(needs(['lint', 'types', 'unit', 'nuxt'])).toEqual({ cluster: false, built: false, chromium: false })
    expect(needs(['server'])).toEqual({ cluster: true, built: false, chromium: false })
    expect(needs(['e2e'])).toEqual({ cluster: true, built: true, chromium: true })
    expect(needs(['bench'])).toEqual({ cluster: true, built: true, chromium: false })
  })
})

describe('HOST and PORT', () => {
  it('default to loopback and 3000', () => {
    expect(address({})).toEqual({ host: '127.0.0.1', port: 3000 })
    expect(address({ HOST: '0.0.0.0', PORT: '8080' })).toEqual({ host: '0.0.0.0', port: 8080 })
  })

  it.each(['abc', '0', '-1', '65536', '80.5', '1e9'])('refuse the port %s', (PORT) => {
    expect(() => address({ PORT })).toThrow(`PORT is '${PORT}'`)
  })

  it.each([
    ['127.0.0.1', true],
    ['127.1.2.3', true],
    ['localhost', true],
    ['::1', true],
    ['0.0.0.0', false],
    ['::', false],
    ['192.168.1.20', false],
    ['127.0.0.1.example', false],
  ])('%s is loopback: %s', (host, expected) => {
    expect(isLoopback(host)).toBe(expected)
  })

  it('name the port that is taken and another to try', () => {
    expect(whyNot('EADDRINUSE', '127.0.0.1', 3000)).toMatch(/^Port 3000 on 127\.0\.0\.1 is taken .*PORT=3001 npm start$/)
  })

  it('give the address to open', () => {
    expect(origin({ host: '127.0.0.1', port: 3000 }, {})).toBe('http://127.0.0.1:3000')
    expect(origin({ host: '0.0.0.0', port: 8080 }, {})).toBe('http://127.0.0.1:8080')
    expect(origin({ host: '::', port: 8443 }, { NITRO_SSL_CERT: 'pem' })).toBe('https://[::1]:8443')
  })
})

describe('what an empty database is filled with', () => {
  it.each([
    [{}, 'demo'],
    [{ JAMNUT_ADMIN_EMAIL: 'a@shop.example' }, 'demo'],
    [{ JAMNUT_DEMO: '0', JAMNUT_ADMIN_EMAIL: 'a@shop.example' }, 'minimal'],
    [{ JAMNUT_DEMO: '0' }, undefined],
  ])('%o: %s', (env, expected) => {
    expect(firstData(env)).toBe(expected)
  })
})
