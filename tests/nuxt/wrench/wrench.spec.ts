import { mountSuspended } from '@nuxt/test-utils/runtime'
import { describe, expect, it } from 'vitest'
import { WrenchForm, WrenchStanding, WrenchStateDialog, WrenchTable } from '#components'
import { wrench } from './records'

describe('WrenchTable', () => {
  it('says how each wrench stands, in words', async () => {
    const table = await mountSuspended(WrenchTable, { props: { rows: [wrench], today: '2026-12-01', sort: 'status' } })
    expect(table.get('tbody a').attributes('href')).toBe(`/wrenches/${wrench.id}`)
    expect(table.get('tbody').text()).toContain('Overdue')
    expect(table.get('tbody').text()).toContain('by 11 days')
    expect(table.get('tbody').text()).toContain('20–100 N·m14.8–73.8 ft·lb')
  })
})

describe('WrenchStanding', () => {
  it.each([
    [{ status: 'none' as const, dueOn: null, daysLeft: null }, {}, 'It cannot be used before a calibration is recorded.'],
    [{ status: 'overdue' as const, cyclesSince: 5000 }, {}, 'Its cycles are used up.'],
    [{ status: 'quarantined' as const }, {}, 'Its last calibration failed: it comes back when an as left passes.'],
    [{ status: 'at_laboratory' as const }, { stateReason: 'Sent on Monday' }, 'Sent on Monday'],
  ])('of %j says why', async (calibration, more, words) => {
    const standing = await mountSuspended(WrenchStanding, {
      props: { wrench: { ...wrench, ...more, calibration: { ...wrench.calibration, ...calibration } }, today: '2026-12-01' },
    })
    expect(standing.text()).toContain(words)
  })
})

describe('WrenchStateDialog', () => {
  it('lets anybody quarantine, with a reason', async () => {
    const dialog = await mountSuspended(WrenchStateDialog, { props: { open: true, assetTag: 'TW-07', state: 'in_use', onlyQuarantine: true } })
    expect(dialog.findAll('input[type=radio]')).toHaveLength(0)
    await dialog.get('textarea').setValue('dropped')
    await dialog.get('form').trigger('submit')
    expect(dialog.emitted('set')).toEqual([['quarantined', 'dropped']])
  })

  it('lets the quality lead say where it is', async () => {
    const dialog = await mountSuspended(WrenchStateDialog, { props: { open: true, assetTag: 'TW-07', state: 'in_use' } })
    await dialog.get('form').trigger('submit')
    expect(dialog.emitted('set')).toBeUndefined()
    await dialog.get('input[value=lost]').setValue(true)
    await dialog.get('form').trigger('submit')
    expect(dialog.emitted('set')).toEqual([['lost', '']])
  })
})

describe('WrenchForm', () => {
  it('offers the classes of the kind, and says what they permit', async () => {
    const form = await mountSuspended(WrenchForm, { props: { initial: { ...emptyWrenchForm(), max: '8', toolClass: 'II-A' as const }, act: 'Add' } })
    const classes = () => form.findAll('option').map(option => option.attributes('value')).filter(value => /^I/.test(value ?? ''))
    expect(classes()).toHaveLength(7)
    expect(form.text()).toContain('6 % by class and range')
    await form.get('input[type=radio][value=indicating]').setValue(true)
    expect(classes()).toEqual(['I-A', 'I-B', 'I-C', 'I-D', 'I-E'])
    await form.trigger('submit')
    expect(form.emitted('submit')?.[0]).toMatchObject([{ kind: 'indicating', toolClass: '' }])
  })
})
