import { mountSuspended } from '@nuxt/test-utils/runtime'
import { flushPromises } from '@vue/test-utils'
import { describe, expect, it } from 'vitest'
import { BaseConfirmDialog, BaseDialog, BaseNumberPad, BasePinDialog } from '#components'

describe('BaseDialog', () => {
  it('opens as a modal with its title as its name, and says when it is closed', async () => {
    const dialog = await mountSuspended(BaseDialog, { props: { open: true, title: 'Void sign-off' }, slots: { default: () => 'Sure?' } })
    await flushPromises()
    const element = dialog.get('dialog')
    expect(element.attributes('open')).toBeDefined()
    expect(dialog.get(`[id="${element.attributes('aria-labelledby')}"]`).text()).toBe('Void sign-off')
    await element.trigger('close')
    expect(dialog.emitted('update:open')?.at(-1)).toEqual([false])
  })

  it('renders nothing inside while closed', async () => {
    const dialog = await mountSuspended(BaseDialog, { props: { open: false, title: 'Void' }, slots: { default: () => 'secret' } })
    expect(dialog.text()).toBe('')
  })
})

describe('BaseConfirmDialog', () => {
  const props = { title: 'Void this sign-off?', confirm: 'Void sign-off' }

  it.each([['Void sign-off', true], ['Keep as it is', false]] as const)('answers %s with %s', async (pressed, answer) => {
    const dialog = await mountSuspended(BaseConfirmDialog, { props })
    const asked: Promise<boolean> = dialog.vm.ask()
    await flushPromises()
    await dialog.findAll('button').find(button => button.text() === pressed)?.trigger('click')
    await expect(asked).resolves.toBe(answer)
  })

  it('takes closing for a no', async () => {
    const dialog = await mountSuspended(BaseConfirmDialog, { props })
    const asked: Promise<boolean> = dialog.vm.ask()
    await flushPromises()
    await dialog.get('dialog').trigger('close')
    await expect(asked).resolves.toBe(false)
  })
})

describe('BaseNumberPad', () => {
  async function type(keys: string[], props: { decimal?: boolean, maxLength?: number } = {}) {
    const pad = await mountSuspended(BaseNumberPad, { props: { 'modelValue': '', 'decimal': true, ...props, 'onUpdate:modelValue': (modelValue: string) => pad.setProps({ modelValue }) } })
    for (const key of keys) {
      await pad.findAll('button').find(button => (button.attributes('aria-label') ?? button.text()) === key)?.trigger('click')
    }
    return pad.props('modelValue')
  }

  it('enters figures, one decimal point, and takes them back', async () => {
    expect(await type(['3', '6', 'Decimal point', '5', 'Decimal point'])).toBe('36.5')
    expect(await type(['Decimal point', '5'])).toBe('0.5')
    expect(await type(['4', '2', 'Delete last figure'])).toBe('4')
    expect(await type(['4', '2', 'Clear'], { decimal: false })).toBe('')
  })

  it('stops at the longest entry', async () => {
    expect(await type(['1', '2', '3', '4'], { maxLength: 3 })).toBe('123')
  })
})

describe('BasePinDialog', () => {
  const props = { open: true, title: 'Sign water pump', lines: ['6 bolts at 36.5 N·m'] }

  it('signs with six figures and not before', async () => {
    const dialog = await mountSuspended(BasePinDialog, { props })
    await flushPromises()
    await dialog.get('input').setValue('40815')
    await dialog.get('form').trigger('submit')
    expect(dialog.emitted('sign')).toBeUndefined()
    await dialog.get('input').setValue('40815x2')
    await dialog.get('form').trigger('submit')
    expect(dialog.emitted('sign')).toEqual([['408152']])
  })

  it('forgets the PIN when it closes', async () => {
    const dialog = await mountSuspended(BasePinDialog, { props })
    await flushPromises()
    await dialog.get('input').setValue('408152')
    await dialog.setProps({ open: false })
    await dialog.setProps({ open: true })
    await flushPromises()
    expect(dialog.get<HTMLInputElement>('input').element.value).toBe('')
    await dialog.get('form').trigger('submit')
    expect(dialog.emitted('sign')).toBeUndefined()
  })

  it('asks anew after a wrong PIN and says how many tries are left', async () => {
    const dialog = await mountSuspended(BasePinDialog, { props })
    await flushPromises()
    await dialog.get('input').setValue('111111')
    await dialog.setProps({ error: 'That PIN is not right.', triesLeft: 1 })
    expect(dialog.get('[role=alert]').text()).toContain('1 try left')
    expect(dialog.get<HTMLInputElement>('input').element.value).toBe('')
  })
})
