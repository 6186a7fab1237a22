import { readFileSync } from 'node:fs'
import { join } from 'node:path'
import type { Page } from 'playwright-core'
import { describe, expect, it } from 'vitest'
import { api, DEMO_PASSPHRASE, DEMO_PIN, signIn, useBrowser } from './support/browser'

const browser = useBrowser()
const axe = readFileSync(join(import.meta.dirname, '../../node_modules/axe-core/axe.min.js'), 'utf8')

interface Listed {
  items: { id: string, signOff?: { id: string } }[]
}

/** What axe finds against WCAG 2.2 AA on a page, as "rule: element". */
async function axeFindings(page: Page): Promise<string[]> {
  await page.evaluate(axe)
  return page.evaluate(`axe.run(document, { runOnly: ['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa'] })
    .then(found => found.violations.flatMap(rule => rule.nodes.map(node => rule.id + ': ' + node.target.join(' '))))`)
}

/** The addresses of every screen, with records of the demo in them. */
async function screens(page: Page): Promise<string[]> {
  const first = async (path: string) => (await api<Listed>(page, 'GET', path)).items[0]
  const order = await first('/repair-orders?q=26-1205')
  const { fastenerGroups: [group] } = await api<{ fastenerGroups: { id: string }[] }>(page, 'GET', `/repair-orders/${order?.id}`)
  const spec = (await first('/torque-specs?q=Cylinder head'))?.id
  const wrench = (await first('/wrenches?q=W-07'))?.id
  return [
    '/bay', `/bay/repair-orders/${order?.id}`, `/bay/fastener-groups/${group?.id}`, '/repair-orders', '/repair-orders/new', '/sign-offs',
    `/sign-offs/${(await first('/sign-offs?limit=1'))?.id}`, '/torque-specs', `/torque-specs/${spec}`, '/torque-specs/new', '/torque-specs/import',
    '/wrenches', `/wrenches/${wrench}`, '/second-checks', '/converter', '/me',
  ]
}

describe('every screen', () => {
  it.each([
    { width: 390, height: 844, dark: false }, { width: 820, height: 1180, dark: true }, { width: 1440, height: 900, dark: false },
  ])('fits $width px, passes axe, and says no word on the console (dark: $dark)', async ({ width, height, dark }) => {
    const { page } = await browser.visit({ width, height, dark })
    await signIn(page, 'foreman')
    for (const path of await screens(page)) {
      await page.goto(path, { waitUntil: 'networkidle' })
      expect(await page.getByRole('heading', { level: 1 }).count(), `${path} has one h1`).toBe(1)
      expect(await page.evaluate('document.documentElement.scrollWidth - innerWidth'), `${path} does not scroll sideways`).toBeLessThanOrEqual(0)
      expect(await axeFindings(page), path).toEqual([])
    }
  }, 240_000)

  it('keeps the bay\'s targets at 48 px, the main and sign buttons at 76 px', async () => {
    const { page } = await browser.visit({ width: 390, height: 844 })
    await signIn(page, 'technician')
    for (const path of (await screens(page)).filter(name => name.startsWith('/bay'))) {
      await page.goto(path, { waitUntil: 'networkidle' })
      const small = await page.locator('main :is(button, [role=button], a, input, select, summary)').evaluateAll(elements => elements.flatMap((element) => {
        const target = element.closest('label') ?? element
        const { height, width } = target.getBoundingClientRect()
        const inText = getComputedStyle(element).display === 'inline'
        return height > 0 && height < 48 && width > 0 && !inText ? [`${Math.round(height)} px: ${element.textContent?.trim().slice(0, 40) || element.outerHTML.slice(0, 60)}`] : []
      }))
      expect(small, path).toEqual([])
    }
  })
})

describe('who may not', () => {
  it('is sent to sign in, and from there to where they were going', async () => {
    const { page } = await browser.visit()
    await page.goto('/sign-offs?sort=-verdict')
    await page.waitForURL(/sign-in/)
    await page.getByLabel('E-mail').fill('advisor@jamnut.example')
    await page.getByLabel('Passphrase').fill(DEMO_PASSPHRASE)
    await page.keyboard.press('Enter')
    await page.waitForURL('**/sign-offs?sort=-verdict')
    expect(await page.getByRole('link', { name: 'People' }).count()).toBe(0)
  })

  it('reads an error in words for a record that is not there', async () => {
    const { page, expect: expectStatus } = await browser.visit()
    await signIn(page, 'advisor')
    expectStatus(404)
    await page.goto('/sign-offs/01a22b8a-1780-79e9-af5d-1c5076b2c610')
    await page.getByText('This sign-off is not there.').waitFor()
  })
})

describe('by keyboard alone', () => {
  it('a joint is prepared, tightened and signed', async () => {
    const { page } = await browser.visit()
    await page.goto('/sign-in', { waitUntil: 'networkidle' })
    await page.getByLabel('E-mail').focus()
    await page.keyboard.type('technician2@jamnut.example')
    await page.keyboard.press('Tab')
    await page.keyboard.type(DEMO_PASSPHRASE)
    await page.keyboard.press('Enter')
    await page.waitForURL('**/bay')
    const { items: [order] } = await api<Listed>(page, 'GET', '/repair-orders?q=26-1205')
    const { fastenerGroups } = await api<{ fastenerGroups: { id: string, name: string }[] }>(page, 'GET', `/repair-orders/${order?.id}`)
    const elbow = fastenerGroups.find(group => group.name === 'Outlet elbow')
    await page.goto(`/bay/fastener-groups/${elbow?.id}`, { waitUntil: 'networkidle' })
    await page.getByRole('button', { name: 'Choose a wrench' }).focus()
    await page.keyboard.press('Enter')
    const wrench = page.getByRole('dialog').getByRole('button', { name: /^W-04/ })
    await wrench.focus()
    await page.keyboard.press('Enter')
    const steps = page.getByRole('region', { name: 'Before bolt 1' }).getByRole('checkbox')
    for (let index = 0; index < await steps.count(); index += 1) {
      await steps.nth(index).focus()
      await page.keyboard.press('Space')
    }
    for (const name of [/^Wrench set to/, /^Bolt 2 clicked/, /^Sign/]) {
      await page.getByRole('button', { name }).first().focus()
      await page.keyboard.press('Enter')
    }
    await page.getByRole('dialog').getByLabel('Your PIN').waitFor({ state: 'attached' })
    await page.keyboard.type(DEMO_PIN)
    await page.keyboard.press('Enter')
    await page.locator('#recorded-heading').waitFor()
    const group = await api<{ state: string }>(page, 'GET', `/fastener-groups/${elbow?.id}`)
    expect(group.state).toBe('signed')
  })
})
