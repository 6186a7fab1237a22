import { mountSuspended } from '@nuxt/test-utils/runtime'
import { describe, expect, it } from 'vitest'
import { BaseButton } from '#components'

describe('BaseButton', () => {
  it('does what it says when pressed', async () => {
    const button = await mountSuspended(BaseButton, { slots: { default: () => 'Save wrench' } })
    await button.trigger('click')
    expect(button.emitted('click')).toHaveLength(1)
    expect(button.attributes('type')).toBe('button')
  })

  it('shows the reason it cannot be pressed, stays reachable and does nothing', async () => {
    const button = await mountSuspended(BaseButton, { props: { disabled: '4 bolts still to go', type: 'submit' }, slots: { default: () => 'Sign' } })
    await button.trigger('click')
    expect(button.emitted('click')).toBeUndefined()
    expect(button.text()).toContain('4 bolts still to go')
    expect(button.attributes('aria-disabled')).toBe('true')
    expect(button.attributes('disabled')).toBeUndefined()
  })

  it('ignores further presses while busy', async () => {
    const button = await mountSuspended(BaseButton, { props: { busy: true }, slots: { default: () => 'Saving' } })
    await button.trigger('click')
    expect(button.emitted('click')).toBeUndefined()
    expect(button.attributes('aria-busy')).toBe('true')
  })

  it('is a link where it leads somewhere', async () => {
    const link = await mountSuspended(BaseButton, { props: { to: '/wrenches' }, slots: { default: () => 'Wrench crib' } })
    expect(link.element.tagName).toBe('A')
    expect(link.attributes('href')).toBe('/wrenches')
  })
})
