import { describe, expect, it } from 'vitest'
import { buildReason } from '../../../scripts/lib/build.mjs'
import { compareMigrations, failure } from '../../../scripts/lib/database.mjs'
import { refuseFullDisk } from '../../../scripts/lib/disk.mjs'
import { npmReason } from '../../../scripts/lib/install.mjs'
import { serverReason } from '../../../scripts/lib/server.mjs'

describe('why npm ci failed', () => {
  it('is the first line that says something', () => {
    const output = 'npm error code E404\nnpm error 404 Not Found - nothing\nnpm error A complete log of this run'
    expect(npmReason(output)).toBe('npm ci failed: 404 Not Found - nothing')
  })
})

describe('a full disk', () => {
  it.each([
    'npm error code ENOSPC\nnpm error syscall write',
    'error: could not extend file: No space left on device',
  ])('is named: %s', (output) => {
    expect(() => refuseFullDisk('build', output)).toThrow('The disk is full')
  })

  it('is not suspected elsewhere', () => {
    expect(refuseFullDisk('build', 'Could not resolve x')).toBeUndefined()
  })
})

describe('why the build failed', () => {
  it('is its first line about an error, without colours', () => {
    expect(buildReason('\u001B[31m ERROR \u001B[39m Could not resolve x\nmore')).toBe('ERROR  Could not resolve x')
  })
})

describe('why a script failed', () => {
  it('is the line of the error, not of its stack', () => {
    expect(failure('/x/migrate.ts:3\n  throw y\nError: no such table\n    at z')).toBe('Error: no such table')
  })
})

describe('why the server did not come up', () => {
  it('names the port when that was taken in the meantime', () => {
    expect(serverReason('Error: listen EADDRINUSE: address in use', '127.0.0.1', 3000)).toContain('Port 3000 on 127.0.0.1 is taken')
  })

  it('repeats what the server complained of', () => {
    expect(serverReason('starting\nMissing: DATABASE_URL\n', '127.0.0.1', 3000))
      .toBe('The server did not become healthy: Missing: DATABASE_URL')
  })
})

describe('the migrations of a database', () => {
  it.each([
    [['a', 'b'], ['a', 'b'], 'current'],
    [['a', 'b'], ['a'], 'behind'],
    [['a', 'b'], [], 'behind'],
    [['a', 'b'], ['a', 'b', 'c'], 'ahead'],
  ])('ours %o, applied %o: %s', (ours, applied, expected) => {
    expect(compareMigrations(ours, applied)).toBe(expected)
  })
})
