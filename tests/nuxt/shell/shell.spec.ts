import { mountSuspended } from '@nuxt/test-utils/runtime'
import { afterEach, describe, expect, it, vi } from 'vitest'
import { ShellAppHeader, ShellBayHeader, ShellToaster } from '#components'
import { useToasts } from '#imports'

describe('ShellAppHeader', () => {
  const props = {
    links: [{ to: '/sign-offs', label: 'Sign-offs' }, { to: '/wrenches', label: 'Wrench crib', count: 1 }],
    path: '/wrenches/TW-07',
    person: { name: 'Ruth Salvesen', role: 'Foreman' },
    theme: 'device' as const,
  }

  it('marks the word of the page shown, also deeper in', async () => {
    const header = await mountSuspended(ShellAppHeader, { props })
    expect(header.get('[aria-current=page]').text()).toContain('Wrench crib')
    expect(header.findAll('[aria-current=page]')).toHaveLength(1)
  })

  it('offers theme and sign-out under the person\'s name and closes on Esc', async () => {
    const header = await mountSuspended(ShellAppHeader, { props })
    const button = header.findAll('button').find(candidate => candidate.text().includes('Ruth Salvesen'))
    await button?.trigger('click')
    await header.get('input[value=night]').setValue(true)
    expect(header.emitted('update:theme')).toEqual([['night']])
    await header.findAll('button').find(candidate => candidate.text() === 'Sign out')?.trigger('click')
    expect(header.emitted('signOut')).toHaveLength(1)
    await header.get('header').trigger('keydown', { key: 'Escape' })
    expect(header.find('fieldset').exists()).toBe(false)
  })

  it('has no person menu before sign-in', async () => {
    const header = await mountSuspended(ShellAppHeader, { props: { ...props, person: null } })
    expect(header.text()).not.toContain('Ruth')
  })
})

it('ShellBayHeader shows order, unit and progress, and the way back', async () => {
  const header = await mountSuspended(ShellBayHeader, {
    props: { backTo: '/bay', backLabel: 'My repair orders', number: '24-1187', unit: 'S-14', vehicle: 'Halyard 450', progress: '3 of 7 groups signed' },
  })
  expect(header.text()).toContain('RO 24-1187')
  expect(header.text()).toContain('3 of 7 groups signed')
  expect(header.get('a').attributes('aria-label')).toBe('My repair orders')
})

describe('toasts', () => {
  afterEach(() => {
    vi.useRealTimers()
    const { toasts, remove } = useToasts()
    toasts.value.forEach(({ id }) => remove(id))
  })

  it('are spoken politely and can be closed', async () => {
    const toaster = await mountSuspended(ShellToaster)
    useToasts().add('Wrench TW-07 saved')
    await toaster.vm.$nextTick()
    expect(toaster.attributes('aria-live')).toBe('polite')
    expect(toaster.text()).toBe('Wrench TW-07 saved')
    await toaster.get('button').trigger('click')
    expect(toaster.text()).toBe('')
  })

  it('go by themselves, unless they tell of an error', () => {
    vi.useFakeTimers()
    const { toasts, add } = useToasts()
    add('Saved')
    add('Not saved', 'error')
    vi.advanceTimersByTime(10_000)
    expect(toasts.value.map(({ text }) => text)).toEqual(['Not saved'])
  })
})
