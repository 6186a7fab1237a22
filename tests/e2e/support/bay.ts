import type { Page } from 'playwright-core'
import { expect } from 'vitest'
import { DEMO_PIN } from './browser'

/** Types the PIN on the dialog's own keys and signs. */
export async function signWithPin(page: Page, act: string | RegExp, pin = DEMO_PIN): Promise<void> {
  const dialog = page.getByRole('dialog')
  await dialog.getByLabel('Your PIN').waitFor({ state: 'attached' })
  for (const figure of pin) await dialog.getByRole('button', { name: figure, exact: true }).click()
  await dialog.getByRole('button', { name: act }).click()
}

/** Chooses a wrench of the list by its tag. */
export async function chooseWrench(page: Page, tag: string): Promise<void> {
  await page.getByRole('button', { name: 'Choose a wrench' }).click()
  await page.getByRole('dialog').getByRole('button', { name: new RegExp(`^${tag}\\b`) }).click()
}

/** Ticks every step of the preparation. */
export async function prepare(page: Page): Promise<void> {
  const steps = page.getByRole('region', { name: 'Before bolt 1' }).getByRole('checkbox')
  for (let index = 0; index < await steps.count(); index += 1) await steps.nth(index).check()
}

/** Tightens with a setting wrench: the setting once, then each bolt in order; answers the order that the screen led in. */
export async function tighten(page: Page, bolts: number): Promise<number[]> {
  await page.getByRole('button', { name: /^Wrench set to/ }).click()
  const order: number[] = []
  for (let done = 0; done < bolts; done += 1) {
    const next = page.getByRole('button', { name: /^Bolt \d+ clicked$/ })
    order.push(Number(/\d+/.exec(await next.textContent() ?? '')?.[0]))
    await next.click()
  }
  return order
}

/** Signs what was tightened and waits for the server's word. */
export async function signJoint(page: Page): Promise<void> {
  await page.getByRole('button', { name: /^Sign/ }).last().click()
  await signWithPin(page, /^Sign/)
  await page.locator('#recorded-heading').waitFor()
}

/** The verdict beside "Signed", in words. */
export async function expectSigned(page: Page, verdict: string): Promise<void> {
  expect(await page.locator('#recorded-heading').textContent()).toContain(verdict)
}
