import { type Browser, type BrowserContext, chromium, type Page } from 'playwright-core'
import { afterAll, afterEach, beforeAll, expect } from 'vitest'

/** Where the built application serves the demo scenario. */
export const baseUrl = process.env.JAMNUT_E2E_URL ?? ''

export const DEMO_PASSPHRASE = 'jamnut-demo-garage'
export const DEMO_PIN = '408152'

const flags = [
  '--headless', '--no-sandbox', '--disable-gpu', '--disable-quic', '--no-first-run', '--disable-background-networking',
  '--disable-component-update', '--disable-sync',
]

/** What a page did that no page may do. */
const faults: string[] = []

/** Watches a page: console errors, thrown errors, hydration mismatches, failed answers of ours, requests to anywhere else. */
function watch(page: Page, expected: () => readonly number[]): void {
  page.on('console', (message) => {
    const text = message.text()
    const answered = /status of (\d{3})/.exec(text)?.[1]
    if (answered && expected().includes(Number(answered))) return
    if (message.type() === 'error' || /hydration/i.test(text)) faults.push(`console: ${text}`)
  })
  page.on('pageerror', error => faults.push(`error: ${error.message}`))
  page.on('request', (request) => {
    const url = request.url()
    if (!url.startsWith(baseUrl) && !/^(data|blob):/.test(url)) faults.push(`outside request: ${url}`)
  })
  page.on('response', (response) => {
    if (response.status() >= 500) faults.push(`${response.status()} ${response.url()}`)
  })
}

export interface Visit {
  page: Page
  context: BrowserContext
  /** Statuses that the next steps are meant to get, so that the browser's own line about them is no fault. */
  expect: (...statuses: number[]) => void
}

interface Visitor {
  width?: number
  height?: number
  dark?: boolean
}

/** A real browser for a file of journeys; every visit has a context, and so a session, of its own. */
export function useBrowser() {
  let browser: Browser
  const contexts: BrowserContext[] = []
  beforeAll(async () => {
    if (!baseUrl) throw new Error('Run journeys by `npm run test:e2e`: it builds and serves the application.')
    browser = await chromium.launch({ executablePath: process.env.JAMNUT_CHROMIUM ?? '/usr/bin/chromium', args: flags })
  })
  afterEach(async () => {
    await Promise.all(contexts.splice(0).map(context => context.close()))
    expect(faults.splice(0), 'what the pages did wrong').toEqual([])
  })
  afterAll(async () => {
    await browser?.close()
  })
  return {
    async visit({ width = 1180, height = 820, dark = false }: Visitor = {}): Promise<Visit> {
      const context = await browser.newContext({
        baseURL: baseUrl, viewport: { width, height }, colorScheme: dark ? 'dark' : 'light', reducedMotion: 'reduce', locale: 'en-GB',
      })
      contexts.push(context)
      context.setDefaultTimeout(15_000)
      const page = await context.newPage()
      let statuses: number[] = []
      watch(page, () => statuses)
      return { page, context, expect: (...list) => void (statuses = list) }
    },
  }
}

/** Signs a demo person in by the form, by mouse. */
export async function signIn(page: Page, who: 'technician' | 'technician2' | 'foreman' | 'quality' | 'advisor' | 'admin'): Promise<void> {
  await page.goto('/sign-in')
  await page.getByLabel('E-mail').fill(`${who}@jamnut.example`)
  await page.getByLabel('Passphrase').fill(DEMO_PASSPHRASE)
  await page.getByRole('button', { name: 'Sign in' }).click()
  await page.waitForURL(url => !url.pathname.startsWith('/sign-in'))
}

/** The API as the signed-in person of a page uses it: for setting a scene, not for what a journey is about. */
export async function api<Body>(page: Page, method: 'GET' | 'POST' | 'PUT' | 'PATCH', path: string, body?: unknown): Promise<Body> {
  const answer = await page.request.fetch(`${baseUrl}/api${path}`, { method, ...(body === undefined ? {} : { data: body }) })
  if (!answer.ok()) throw new Error(`${method} ${path}: ${answer.status()} ${await answer.text()}`)
  return answer.json()
}
