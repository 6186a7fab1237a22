import { describe, expect, it } from 'vitest'
import { signWithPin } from './support/bay'
import { api, signIn, useBrowser } from './support/browser'

const browser = useBrowser()

interface Listed {
  items: { id: string, can: Record<string, boolean> }[]
}

describe('the foreman', () => {
  it('sees sign-offs, sorts them by every column, filters them, and finds the state again after a reload', async () => {
    const { page } = await browser.visit({ width: 1440, height: 900 })
    await signIn(page, 'foreman')
    await page.goto('/sign-offs')
    for (const column of ['Repair order', 'Component', 'Target', 'Verdict', 'Wrench', 'Technician', 'Signed']) {
      await page.getByRole('columnheader', { name: column }).getByRole('button').click()
      await page.waitForURL(url => url.searchParams.has('sort') || column === 'Signed')
      await page.getByRole('row').nth(1).waitFor()
    }
    await page.goto('/sign-offs?sort=-verdict')
    expect(await page.getByRole('row').nth(1).innerText()).toContain('High')
    expect(await page.getByRole('columnheader', { name: 'Verdict' }).getAttribute('aria-sort')).toBe('descending')
    await page.reload()
    expect(await page.getByRole('row').nth(1).innerText()).toContain('High')
  })

  it('makes the second checks of an order, then releases the vehicle', async () => {
    const { page } = await browser.visit({ width: 1440, height: 900 })
    await signIn(page, 'foreman')
    for (const joint of ['Lower ball joint', 'Tie rod end nut']) {
      await page.goto('/second-checks')
      await page.getByRole('link', { name: new RegExp(joint) }).first().click()
      await page.getByRole('heading', { name: joint }).waitFor()
      await page.getByText('Watched while it was tightened').click()
      await page.getByRole('button', { name: 'Sign the second check' }).click()
      await signWithPin(page, 'Sign')
      await page.waitForURL('**/second-checks')
    }
    const { items: [order] } = await api<Listed>(page, 'GET', '/repair-orders?q=26-1208')
    await page.goto(`/bay/repair-orders/${order?.id}`)
    await page.getByRole('button', { name: 'Release the vehicle' }).click()
    await signWithPin(page, 'Release')
    await page.getByText(/Released/).first().waitFor()
    const released = await api<{ release: { by: { name: string } } | null }>(page, 'GET', `/repair-orders/${order?.id}`)
    expect(released.release?.by.name).toBe('Marek Solveig')
  })

  it('cannot release what is held back, and reads why', async () => {
    const { page } = await browser.visit()
    await signIn(page, 'foreman')
    const { items: [order] } = await api<Listed>(page, 'GET', '/repair-orders?q=26-1206')
    await page.goto(`/bay/repair-orders/${order?.id}`)
    await page.getByText('What holds the release back').waitFor()
    expect(await page.getByText(/hold.? it back/).count()).toBeGreaterThan(0)
  })
})
