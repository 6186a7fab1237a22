import { readdirSync, readFileSync, statSync } from 'node:fs'
import { dirname, join, relative, resolve } from 'node:path'
import { describe, expect, it } from 'vitest'

const root = resolve(import.meta.dirname, '../../..')
const folders = ['app.vue', 'error.vue', 'components', 'composables', 'layouts', 'middleware', 'pages', 'plugins', 'stores', 'utils', 'shared', 'server', 'scripts', 'seeds']

function filesIn(path: string): string[] {
  const full = join(root, path)
  if (!statSync(full).isDirectory()) return [path]
  return readdirSync(full, { recursive: true, encoding: 'utf8' }).filter(name => /\.(ts|vue|mjs)$/.test(name)).map(name => join(path, name))
}

/** What a file imports, dynamic and type imports included, as paths from the root where they are files of ours. */
function importsOf(file: string): string[] {
  const text = readFileSync(join(root, file), 'utf8')
  const found = [...text.matchAll(/(?:from\s+|import\s*\(\s*|import\s+)['"]([^'"]+)['"]/g)].map(match => match[1] ?? '')
  return found.map((name) => {
    if (name.startsWith('#shared/')) return `shared/${name.slice('#shared/'.length)}`
    if (/^[~@]{1,2}\//.test(name)) return name.replace(/^[~@]{1,2}\//, '')
    return name.startsWith('.') ? relative(root, resolve(root, dirname(file), name)) : name
  })
}

const all = folders.flatMap(filesIn).map(file => ({ file, imports: importsOf(file) }))
const isIn = (path: string, ...names: string[]) => names.some(name => path === name || path.startsWith(`${name}/`))
const client = ['app.vue', 'error.vue', 'components', 'composables', 'layouts', 'middleware', 'pages', 'plugins', 'stores', 'utils']

/** Imports that break a rule, as "file → import". */
const broken = (from: string[], forbidden: (name: string) => boolean) =>
  all.filter(({ file }) => isIn(file, ...from)).flatMap(({ file, imports }) => imports.filter(forbidden).map(name => `${file} → ${name}`))

describe('imports run one way', () => {
  it('finds imports at all', () => {
    expect(all.length).toBeGreaterThan(200)
    expect(all.flatMap(({ imports }) => imports).filter(name => name.startsWith('shared/')).length).toBeGreaterThan(100)
  })
  it('the client never imports the server', () => expect(broken(client, name => isIn(name, 'server'))).toEqual([]))
  it('the server never imports the client', () => expect(broken(['server'], name => isIn(name, ...client))).toEqual([]))
  it('shared/ imports itself and five packages', () => {
    const packages = ['zod/mini', 'zod/v4/core', 'convert-units', 'dayjs', 'canonicalize']
    expect(broken(['shared'], name => !isIn(name, 'shared') && !packages.includes(name) && !name.startsWith('dayjs/'))).toEqual([])
  })
  it('services know nothing of HTTP, routes or presenters', () => {
    const http = ['h3', '#imports', 'server/api', 'server/contract', 'server/presenters', 'server/middleware', 'server/utils/defineRoute', 'server/utils/answer', 'server/utils/session']
    expect(broken(['server/services'], name => isIn(name, ...http))).toEqual([])
  })
  it('policies are pure: no database, no services', () => {
    expect(broken(['server/policies'], name => isIn(name, 'server/db', 'server/services', 'server/utils'))).toEqual([])
  })
  it('nothing of the product imports seeds or tests', () => {
    expect(broken([...client, 'server', 'shared'], name => isIn(name, 'seeds', 'tests'))).toEqual([])
  })
  it('bay screens load neither tables nor validation nor dates of the desk', () => {
    const heavy = ['@tanstack/vue-table', 'zod', 'zod/mini', 'dayjs']
    expect(broken(['pages/bay', 'components/fastener-group', 'components/sign-off-entry', 'components/bolt', 'components/torque'], name => heavy.includes(name))).toEqual([])
  })
})
