import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { afterEach, beforeEach, describe, expect, it } from 'vitest'
import { isNoSource } from '../../../scripts/lib/build.mjs'
import { hashFiles, hashTexts, listFiles, storedHash } from '../../../scripts/lib/hash.mjs'
import { packagesHash } from '../../../scripts/lib/install.mjs'

let folder: string

beforeEach(() => {
  folder = mkdtempSync(join(tmpdir(), 'jamnut-hash-'))
  for (const path of ['server/api', 'node_modules/vue', 'tests/unit', '.data']) mkdirSync(join(folder, path), { recursive: true })
  for (const path of ['app.vue', 'server/api/health.get.ts', 'node_modules/vue/index.js', 'tests/unit/a.spec.ts', '.data/x', 'README.md']) {
    writeFileSync(join(folder, path), path)
  }
})

afterEach(() => rmSync(folder, { recursive: true }))

describe('the hash of the sources', () => {
  const hash = () => hashFiles(folder, isNoSource)

  it('reads what a build reads and nothing else', () => {
    expect(listFiles(folder, isNoSource)).toEqual(['app.vue', 'server/api/health.get.ts'])
  })

  it('stays while nothing changes, whatever happens beside the sources', () => {
    const before = hash()
    writeFileSync(join(folder, 'tests/unit/b.spec.ts'), 'new')
    writeFileSync(join(folder, 'README.md'), 'new')
    writeFileSync(join(folder, 'npm-debug.log'), 'new')
    expect(hash()).toBe(before)
  })

  it('changes with a content, a name, a new file', () => {
    const seen = new Set([hash()])
    writeFileSync(join(folder, 'app.vue'), 'other')
    seen.add(hash())
    writeFileSync(join(folder, 'error.vue'), '')
    seen.add(hash())
    rmSync(join(folder, 'error.vue'))
    writeFileSync(join(folder, 'errors.vue'), '')
    seen.add(hash())
    expect(seen.size).toBe(4)
  })

  it('is undefined where none is stored', () => {
    expect(storedHash(join(folder, 'nowhere'))).toBeUndefined()
    writeFileSync(join(folder, 'stamp'), 'abc\n')
    expect(storedHash(join(folder, 'stamp'))).toBe('abc')
  })
})

describe('the hash of the packages', () => {
  const json = (scripts: object, vue: string) => JSON.stringify({ scripts, dependencies: { vue } })
  const base = packagesHash(json({}, '3.5.0'), 'lock')

  it('does not change with a script', () => {
    expect(packagesHash(json({ start: 'x' }, '3.5.0'), 'lock')).toBe(base)
  })

  it('changes with a dependency and with the lock file', () => {
    expect(packagesHash(json({}, '3.5.1'), 'lock')).not.toBe(base)
    expect(packagesHash(json({}, '3.5.0'), 'lock2')).not.toBe(base)
  })

  it('keeps its texts apart', () => {
    expect(hashTexts('ab', 'c')).not.toBe(hashTexts('a', 'bc'))
  })
})
