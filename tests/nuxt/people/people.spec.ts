import { mountSuspended } from '@nuxt/test-utils/runtime'
import { flushPromises, type VueWrapper } from '@vue/test-utils'
import { describe, expect, it, vi } from 'vitest'
import type { UserAnswer } from '#shared/schemas/auth'
import { PeopleAdd, PeopleChange, PeopleRules, PeopleTable, PeopleTemporary } from '#components'
import { ApiError } from '#imports'

const person: UserAnswer = {
  id: '018f0000-0000-7000-8000-000000000001', name: 'Tomas Brandt', email: 'tomas@shop.example', role: 'technician', active: true,
  hasPin: true, pinLocked: false, createdAt: '2026-01-01T08:00:00.000Z', lastSeenAt: null, can: { rename: true, changeAccess: true },
}
const press = (within: VueWrapper, label: string) => within.findAll('button').find(button => button.text() === label)?.trigger('click')

it('the list shows who is disabled and whose PIN is locked', async () => {
  const table = await mountSuspended(PeopleTable, { props: { rows: [person, { ...person, id: person.id.replace(/1$/, '2'), active: false, pinLocked: true }], sort: 'name', timeZone: 'UTC' } })
  const [well, barred] = table.findAll('tbody tr').map(row => row.text())
  expect(well).toMatch(/can sign in.*set/)
  expect(barred).toMatch(/disabled.*locked/)
  await table.get('tbody button').trigger('click')
  expect(table.emitted('change')).toEqual([[person]])
})

describe('adding', () => {
  it('needs name, e-mail and role', async () => {
    const create = vi.fn(async () => undefined)
    const dialog = await mountSuspended(PeopleAdd, { props: { open: true, create } })
    await dialog.get('form').trigger('submit')
    await flushPromises()
    expect(dialog.findAll('[aria-invalid=true]')).toHaveLength(3)
    expect(create).not.toHaveBeenCalled()
  })

  it('keeps what was typed when the server refuses, and closes when it is done', async () => {
    const create = vi.fn<() => Promise<unknown>>().mockRejectedValueOnce(new ApiError(409, 'There is one with this already.', { code: 'id_taken', issues: [{ path: 'email', message: 'There is one with this already.' }] }))
    const dialog = await mountSuspended(PeopleAdd, { props: { open: true, create } })
    const [name, email] = dialog.findAll('input')
    await name?.setValue('Tomas Brandt')
    await email?.setValue('tomas@shop.example')
    await dialog.get('select').setValue('technician')
    await dialog.get('form').trigger('submit')
    await flushPromises()
    expect(email?.attributes('aria-invalid')).toBe('true')
    expect(name?.element.value).toBe('Tomas Brandt')
    create.mockResolvedValueOnce(undefined)
    await dialog.get('form').trigger('submit')
    await flushPromises()
    expect(create).toHaveBeenLastCalledWith({ name: 'Tomas Brandt', email: 'tomas@shop.example', role: 'technician' })
    expect(dialog.emitted('update:open')).toEqual([[false]])
  })
})

describe('changing', () => {
  const mount = (more: Partial<UserAnswer> = {}) => {
    const change = vi.fn(async () => undefined)
    return mountSuspended(PeopleChange, { props: { open: true, person: { ...person, ...more }, change } }).then(dialog => ({ dialog, change }))
  }

  it('sends only what was changed', async () => {
    const { dialog, change } = await mount()
    await dialog.get('select').setValue('foreman')
    await dialog.get('form').trigger('submit')
    await flushPromises()
    expect(change).toHaveBeenCalledWith({ role: 'foreman' }, 'changed, and signed out everywhere')
  })

  it('asks once more before it disables', async () => {
    const { dialog, change } = await mount()
    await press(dialog, 'Disable')
    await flushPromises()
    await press(dialog, 'Keep as it is')
    await flushPromises()
    expect(change).not.toHaveBeenCalled()
    await press(dialog, 'End sessions')
    await flushPromises()
    expect(change).toHaveBeenCalledWith({ endSessions: true }, 'signed out everywhere')
  })

  it('leaves one\'s own access to somebody else', async () => {
    const { dialog } = await mount({ can: { rename: true, changeAccess: false } })
    expect(dialog.text()).toContain('Somebody else has to change your own access.')
    expect(dialog.findAll('option').filter(option => option.attributes('disabled') === undefined)).toHaveLength(1)
    expect(dialog.text()).not.toContain('Disable')
  })
})

it('a temporary passphrase is copied, or said to be copied by hand', async () => {
  const dialog = await mountSuspended(PeopleTemporary, { props: { open: true, name: 'Tomas Brandt', passphrase: 'aaaa-bbbb-cccc' } })
  const writeText = vi.spyOn(navigator.clipboard, 'writeText').mockResolvedValueOnce().mockRejectedValueOnce(new Error('denied'))
  await press(dialog, 'Copy')
  await flushPromises()
  expect(writeText).toHaveBeenCalledWith('aaaa-bbbb-cccc')
  expect(dialog.get('[role=status]').text()).toBe('Copied.')
  await press(dialog, 'Copy')
  await flushPromises()
  expect(dialog.get('[role=status]').text()).toContain('by hand')
})

it('the rules are read as numbers and choices', async () => {
  const change = vi.fn(async () => undefined)
  const rules = { defaultTolerancePercent: 10, dueSoonDays: 30, unfitWrench: 'refuse' as const, approveOwnDraft: true, releaseOwnJoint: false }
  const form = await mountSuspended(PeopleRules, { props: { rules, change } })
  const [tolerance] = form.findAll('input')
  await tolerance?.setValue('150')
  await form.get('form').trigger('submit')
  await flushPromises()
  expect(form.text()).toContain('Must be less than 100.')
  await tolerance?.setValue('7,5')
  await form.get('input[value=exception]').setValue(true)
  await form.get('form').trigger('submit')
  await flushPromises()
  expect(change).toHaveBeenCalledWith({ ...rules, defaultTolerancePercent: 7.5, unfitWrench: 'exception' })
})
