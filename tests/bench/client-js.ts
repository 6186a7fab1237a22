import { spawn } from 'node:child_process'
import { createRequire } from 'node:module'
import { mkdir, mkdtemp, readdir, readFile, rm, symlink, writeFile } from 'node:fs/promises'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { gzipSync } from 'node:zlib'
import type { BrowserType } from 'playwright-core'
import type { Call } from './session'

const root = join(import.meta.dirname, '../..')
// Its bundle does not load as a module under the runner of the scripts.
const { chromium }: { chromium: BrowserType } = createRequire(import.meta.url)('playwright-core')

/** A bare Nuxt page of the same versions, built for comparison. @returns gzip bytes of the JavaScript that it loads */
async function bareNuxtBytes(): Promise<number> {
  const folder = await mkdtemp(join(tmpdir(), 'jamnut-bare-'))
  try {
    await symlink(join(root, 'node_modules'), join(folder, 'node_modules'))
    await writeFile(join(folder, 'package.json'), '{ "private": true, "type": "module" }')
    await writeFile(join(folder, 'nuxt.config.ts'), `export default defineNuxtConfig({
      future: { compatibilityVersion: 4 }, srcDir: '.', compatibilityDate: '2026-12-01', telemetry: false, experimental: { appManifest: false } })`)
    await writeFile(join(folder, 'app.vue'), '<template><NuxtPage /></template>')
    await mkdir(join(folder, 'pages'))
    await writeFile(join(folder, 'pages/index.vue'), '<template><p>Bare</p></template>')
    await run('npx', ['nuxt', 'build'], folder)
    const scripts = join(folder, '.output/public/_nuxt')
    const entry = await entryFiles(scripts)
    return sum(await Promise.all(entry.map(async name => gzipSync(await readFile(join(scripts, name))).length)))
  } finally {
    await rm(folder, { recursive: true, force: true })
  }
}

const sum = (values: readonly number[]) => values.reduce((total, value) => total + value, 0)

/** The scripts of the bare build: all but the error pages', which no good page loads. */
async function entryFiles(scripts: string): Promise<string[]> {
  const names = (await readdir(scripts)).filter(name => name.endsWith('.js'))
  const kept: string[] = []
  for (const name of names) {
    const text = await readFile(join(scripts, name), 'utf8')
    if (!/error-404|error-500|statusMessage.{0,40}description/.test(text.slice(0, 2000))) kept.push(name)
  }
  return kept
}

function run(command: string, args: string[], cwd: string): Promise<void> {
  return new Promise((resolve, reject) => {
    const child = spawn(command, args, { cwd, stdio: 'ignore' })
    child.on('exit', code => code === 0 ? resolve() : reject(new Error(`${command} ${args.join(' ')} ended with ${code}.`)))
  })
}

/** Client JavaScript (gzip) that the fastener-group screen loads, against a bare Nuxt page built in the same run. */
export async function benchClientJs(baseUrl: string, call: Call): Promise<string[]> {
  const { items } = await call<{ items: { id: string }[] }>('GET', '/repair-orders?state=open&limit=50')
  let groupId: string | undefined
  for (const { id } of items) {
    const order = await call<{ fastenerGroups: { id: string }[] }>('GET', `/repair-orders/${id}`)
    groupId ??= order.fastenerGroups[0]?.id
  }
  const browser = await chromium.launch({ executablePath: process.env.JAMNUT_CHROMIUM ?? '/usr/bin/chromium', args: ['--headless', '--no-sandbox', '--disable-gpu', '--no-first-run', '--disable-background-networking', '--disable-component-update', '--disable-sync'] })
  try {
    const page = await (await browser.newContext({ baseURL: baseUrl })).newPage()
    await page.goto('/sign-in')
    await page.getByLabel('E-mail').fill('technician@jamnut.example')
    await page.getByLabel('Passphrase').fill('jamnut-demo-garage')
    await page.getByRole('button', { name: 'Sign in' }).click()
    await page.waitForURL(url => !url.pathname.startsWith('/sign-in'))
    const fresh = await (await browser.newContext({ baseURL: baseUrl, storageState: await page.context().storageState() })).newPage()
    const scripts: Promise<number>[] = []
    fresh.on('response', (response) => {
      if (response.url().endsWith('.js')) scripts.push(response.body().then(body => gzipSync(body).length))
    })
    await fresh.goto(`/bay/fastener-groups/${groupId}`, { waitUntil: 'networkidle' })
    const ours = sum(await Promise.all(scripts))
    const bare = await bareNuxtBytes()
    const kilo = (bytes: number) => `${(bytes / 1024).toFixed(1)} kB`
    return [
      `${'client JavaScript, bare Nuxt page'.padEnd(52)} ${kilo(bare)} gzip`,
      `${'client JavaScript, fastener group'.padEnd(52)} ${kilo(ours)} gzip   ${kilo(ours - bare)} more (at most 24 kB)`,
    ]
  } finally {
    await browser.close()
  }
}
