import { mkdtempSync, readdirSync, rmSync, statSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { afterEach, beforeEach, describe, expect, it } from 'vitest'
import { openSecrets } from '../../../scripts/lib/secrets.mjs'

let folder: string

beforeEach(() => {
  folder = mkdtempSync(join(tmpdir(), 'jamnut-secrets-'))
})

afterEach(() => rmSync(folder, { recursive: true }))

describe('openSecrets', () => {
  it('makes both once, long, different, for their owner only', () => {
    const first = openSecrets(folder, {})
    expect(first.made).toEqual(['session-password', 'pin-pepper'])
    expect(first.env.NUXT_SESSION_PASSWORD).toHaveLength(64)
    expect(first.env.JAMNUT_PIN_PEPPER).toHaveLength(64)
    expect(first.env.NUXT_SESSION_PASSWORD).not.toBe(first.env.JAMNUT_PIN_PEPPER)
    for (const file of readdirSync(join(folder, 'secrets'))) {
      expect(statSync(join(folder, 'secrets', file)).mode & 0o777).toBe(0o600)
    }
    expect(openSecrets(folder, {})).toEqual({ env: first.env, made: [] })
  })

  it('takes those of the environment and writes none', () => {
    const given = { NUXT_SESSION_PASSWORD: 'p'.repeat(48), JAMNUT_PIN_PEPPER: 'q'.repeat(48) }
    expect(openSecrets(folder, given)).toEqual({ env: given, made: [] })
    expect(readdirSync(join(folder, 'secrets'))).toEqual([])
  })
})
