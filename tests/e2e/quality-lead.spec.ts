import { describe, expect, it } from 'vitest'
import { api, signIn, useBrowser } from './support/browser'

const browser = useBrowser()

describe('the quality lead', () => {
  it('sees first what needs somebody, and takes a dropped wrench out of use with a reason', async () => {
    const { page } = await browser.visit({ width: 1440, height: 900 })
    await signIn(page, 'quality')
    await page.waitForURL('**/wrenches')
    expect(await page.getByRole('row').nth(1).innerText()).toMatch(/W-02[\s\S]*Overdue/)
    await page.getByRole('link', { name: /W-01/ }).first().click()
    await page.getByRole('heading', { name: /W-01/ }).first().waitFor()
    expect(await page.getByText('Tarn Metrology, invented for this demo').count()).toBeGreaterThan(0)
  })

  it('records a calibration whose figures follow from what was read', async () => {
    const { page } = await browser.visit({ width: 1440, height: 900 })
    await signIn(page, 'quality')
    const { items: [wrench] } = await api<{ items: { id: string }[] }>(page, 'GET', '/wrenches?q=W-02')
    const before = await api<{ calibration: { status: string } }>(page, 'GET', `/wrenches/${wrench?.id}`)
    expect(before.calibration.status).toBe('overdue')
    await page.goto(`/wrenches/${wrench?.id}/calibrations/new`, { waitUntil: 'networkidle' })
    await page.getByLabel('Laboratory').fill('Invented laboratory')
    await page.getByLabel(/Certificate number/).fill('IL-2026-77')
    await page.getByLabel(/uncertainty/i).first().fill('0.5')
    const cells = page.getByRole('table').first().getByRole('textbox')
    const count = await cells.count()
    expect(count).toBeGreaterThan(14)
  })
})
