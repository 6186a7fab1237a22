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
    const { items: [wrench] } = await api<{ items: { id: string }[] }>(page, 'GET', '/wrenches?q=W-09')
    const before = await api<{ calibration: { status: string } }>(page, 'GET', `/wrenches/${wrench?.id}`)
    expect(before.calibration.status).toBe('due_soon')
    await page.goto(`/wrenches/${wrench?.id}/calibrations/new`, { waitUntil: 'networkidle' })
    await page.getByLabel('Laboratory').fill('Invented laboratory')
    await page.getByLabel(/Certificate number/).fill('IL-2026-77')
    await page.getByLabel(/uncertainty/i).first().fill('0.5')
    // A setting wrench is set to the point: only what the reference showed is typed.
    for (const [index, target] of [30, 90, 150].entries()) {
      for (let reading = 1; reading <= 5; reading += 1) await page.getByLabel(`Reading ${reading}, reference`).nth(index).fill(String(target * 0.995))
    }
    await page.getByRole('button', { name: /^Record/ }).click()
    await page.waitForURL(url => url.pathname === `/wrenches/${wrench?.id}`)
    const after = await api<{ calibration: { status: string }, calibrations: { result: string, points: { meanDeviationPercent: number }[] }[] }>(page, 'GET', `/wrenches/${wrench?.id}`)
    expect(after.calibration.status).toBe('valid')
    expect(after.calibrations[0]?.result).toBe('pass')
    // (100 − 99.5) / 99.5: the wrench reads high, the bolt gets less.
    for (const point of after.calibrations[0]?.points ?? []) expect(point.meanDeviationPercent).toBeCloseTo(0.502513, 5)
  })
})
