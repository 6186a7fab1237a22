import { describe, expect, it } from 'vitest'
import { chooseWrench, expectSigned, prepare, signJoint, signWithPin, tighten } from './support/bay'
import { api, signIn, useBrowser } from './support/browser'

const browser = useBrowser()

interface Listed<Item = { id: string }> {
  items: Item[]
}

describe('from a cited spec to a released vehicle', () => {
  it('is signed by the technician, seen and second-checked by the foreman, and released', async () => {
    const foreman = await browser.visit({ width: 1440, height: 900 })
    await signIn(foreman.page, 'foreman')
    const { items: [vehicle] } = await api<Listed>(foreman.page, 'GET', '/vehicles?q=S-18')
    const { items: [spec] } = await api<Listed<{ revision: { id: string } }>>(foreman.page, 'GET', '/torque-specs?q=Water pump to block')
    const order = await api<{ id: string }>(foreman.page, 'POST', '/repair-orders', { number: '26-1400', vehicleId: vehicle?.id, complaint: 'Pump weeping', bay: '9' })
    const group = await api<{ id: string }>(foreman.page, 'POST', `/repair-orders/${order.id}/fastener-groups`, { specRevisionId: spec?.revision.id })

    const { page } = await browser.visit()
    await signIn(page, 'technician2')
    await page.getByRole('link', { name: /26-1400/ }).click()
    await page.getByRole('link', { name: /Water pump to block/ }).first().click()
    await page.getByRole('heading', { name: /Water pump to block, 6 bolts/ }).waitFor()
    await chooseWrench(page, 'W-07')
    await prepare(page)
    await tighten(page, 6)
    await signJoint(page)
    await expectSigned(page, 'In band')
    await page.getByText('A second person has to check this joint').waitFor()

    await foreman.page.goto('/sign-offs?sort=-signedAt')
    const newest = await foreman.page.getByRole('row').nth(1).innerText()
    for (const words of ['26-1400', 'Water pump to block', 'In band', 'W-07', 'Teo Brandvik']) expect(newest).toContain(words)

    await foreman.page.goto(`/bay/repair-orders/${order.id}`)
    await foreman.page.getByText('What holds the release back').waitFor()
    await foreman.page.goto('/second-checks')
    await foreman.page.getByRole('row', { name: /26-1400/ }).getByRole('link').first().click()
    await foreman.page.getByText('Watched while it was tightened').click()
    await foreman.page.getByRole('button', { name: 'Sign the second check' }).click()
    await signWithPin(foreman.page, 'Sign')
    await foreman.page.waitForURL('**/second-checks')
    expect((await api<{ state: string }>(foreman.page, 'GET', `/fastener-groups/${group.id}`)).state).toBe('signed')

    await foreman.page.goto(`/bay/repair-orders/${order.id}`)
    await foreman.page.getByRole('button', { name: 'Release the vehicle' }).click()
    await signWithPin(foreman.page, 'Release')
    await foreman.page.getByText(/Released/).first().waitFor()
  })
})
