import { existsSync, readdirSync, readFileSync } from 'node:fs'
import { join } from 'node:path'
import { describe, expect, it } from 'vitest'
import { contracts } from '../../../server/contract'

const api = join(import.meta.dirname, '../../../server/api')
const files = readdirSync(api, { recursive: true, encoding: 'utf8' }).filter(name => name.endsWith('.ts'))

/** Routes that answer no record: the description itself, and the answer to what is no route. */
const without = ['[...].ts', 'openapi.json.get.ts']

/** The route file that Nitro needs for a contract. */
function fileOf(path: string, method: string): string[] {
  const parts = path.slice(1).replace(/:(\w+)/g, '[$1]')
  const verb = `${method.toLowerCase()}.ts`
  return [`${parts}.${verb}`, `${parts}/index.${verb}`]
}

describe('every route', () => {
  it('is made by defineRoute from one contract, which names its policy', () => {
    const promised = contracts.flatMap(({ path, method }) => fileOf(path, method).filter(name => existsSync(join(api, name))))
    expect(files.filter(name => !without.includes(name)).toSorted()).toEqual(promised.toSorted())
    for (const name of promised) expect(readFileSync(join(api, name), 'utf8'), name).toContain('defineRoute(')
  })

  it('has a contract that is kept by a file', () => {
    for (const { path, method } of contracts) {
      expect(fileOf(path, method).some(name => existsSync(join(api, name))), `${method} ${path}`).toBe(true)
    }
  })

  it('is open to nobody but by name: the public ones are these', () => {
    const open = contracts.filter(route => route.policy === 'public').map(({ method, path }) => `${method} ${path}`)
    expect(open).toEqual(['GET /health', 'POST /auth/sign-in', 'POST /auth/sign-out'])
  })

  it('names a policy of its own resource, with at least one role', () => {
    for (const { policy, path } of contracts) {
      if (policy === 'public') continue
      expect(policy.name, path).toMatch(/^[a-z_]+\.[a-z_]+$/)
      expect(policy.roles.length, path).toBeGreaterThan(0)
    }
  })

  it('is short: a declaration and one service call', () => {
    for (const name of files) {
      const lines = readFileSync(join(api, name), 'utf8').trimEnd().split('\n').length
      expect(lines, name).toBeLessThanOrEqual(40)
    }
  })
})
