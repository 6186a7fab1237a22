import { spawn } from 'node:child_process'
import { createRequire } from 'node:module'
import { createServer } from 'node:net'
import { mkdir, mkdtemp, rm, symlink, writeFile } from 'node:fs/promises'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { gzipSync } from 'node:zlib'
import type { BrowserType, Page } from 'playwright-core'
import type { Call } from './session'

const root = join(import.meta.dirname, '../..')
// Its bundle does not load as a module under the runner of the scripts.
const { chromium }: { chromium: BrowserType } = createRequire(import.meta.url)('playwright-core')

/** Builds a bare Nuxt page of the same versions, serves it while `work(address)` runs, and cleans up. */
async function withBareNuxt<Result>(work: (address: string) => Promise<Result>): Promise<Result> {
  const folder = await mkdtemp(join(tmpdir(), 'jamnut-bare-'))
  try {
    await symlink(join(root, 'node_modules'), join(folder, 'node_modules'))
    await writeFile(join(folder, 'package.json'), '{ "private": true, "type": "module" }')
    await writeFile(join(folder, 'nuxt.config.ts'), `export default defineNuxtConfig({
      future: { compatibilityVersion: 4 }, srcDir: '.', buildDir: '.nuxt', compatibilityDate: '2026-12-01', telemetry: false, experimental: { appManifest: false } })`)
    await writeFile(join(folder, 'app.vue'), '<template><NuxtPage /></template>')
    await mkdir(join(folder, 'pages'))
    await writeFile(join(folder, 'pages/index.vue'), '<template><p>Bare</p></template>')
    await run('npx', ['nuxt', 'build'], folder)
    const port = await freePort()
    const server = spawn('node', ['.output/server/index.mjs'], { cwd: folder, env: { ...process.env, NITRO_HOST: '127.0.0.1', NITRO_PORT: String(port) }, stdio: 'ignore' })
    try {
      const address = `http://127.0.0.1:${port}`
      for (let tries = 0; tries < 100 && !await fetch(address).then(answer => answer.ok, () => false); tries += 1) await new Promise(resolve => setTimeout(resolve, 100))
      return await work(address)
    } finally {
      server.kill('SIGTERM')
    }
  } finally {
    await rm(folder, { recursive: true, force: true })
  }
}

function freePort(): Promise<number> {
  return new Promise((resolve) => {
    const probe = createServer().listen(0, '127.0.0.1', () => {
      const address = probe.address()
      probe.close(() => resolve(typeof address === 'object' && address ? address.port : 0))
    })
  })
}

/** The JavaScript that a page loads until it is still, each file once, gzip bytes. */
async function loadedBytes(page: Page, address: string): Promise<number> {
  const scripts = new Map<string, Promise<number>>()
  page.on('response', (response) => {
    const url = response.url()
    if (url.endsWith('.js') && !scripts.has(url)) scripts.set(url, response.body().then(body => gzipSync(body).length))
  })
  await page.goto(address, { waitUntil: 'networkidle' })
  return sum(await Promise.all(scripts.values()))
}

const sum = (values: readonly number[]) => values.reduce((total, value) => total + value, 0)

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
    const ours = await loadedBytes(fresh, `/bay/fastener-groups/${groupId}`)
    const bare = await withBareNuxt(async address => loadedBytes(await (await browser.newContext()).newPage(), address))
    const kilo = (bytes: number) => `${(bytes / 1024).toFixed(1)} kB`
    return [
      `${'client JavaScript, bare Nuxt page'.padEnd(52)} ${kilo(bare)} gzip`,
      `${'client JavaScript, fastener group'.padEnd(52)} ${kilo(ours)} gzip   ${kilo(ours - bare)} more (at most 24 kB)`,
    ]
  } finally {
    await browser.close()
  }
}
