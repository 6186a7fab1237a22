import { mountSuspended } from '@nuxt/test-utils/runtime'
import { describe, expect, it } from 'vitest'
import { TorqueSpecApprove, TorqueSpecStanding, TorqueSpecTorque, TorqueSpecWithdrawDialog } from '#components'
import { flaggedRevision, flaggedSpec } from './records'

describe('TorqueSpecApprove', () => {
  it('asks which unit governs, showing what each comes to', async () => {
    const panel = await mountSuspended(TorqueSpecApprove, { props: { revision: flaggedRevision, shopPercent: 10 } })
    expect(panel.findAll('[role=img]').map(band => band.attributes('aria-label'))).toEqual([
      'Band 24.4 to 29.8 N·m, target 27.1 N·m', 'Band 22.5 to 27.5 N·m, target 25.0 N·m',
    ])
    await panel.get('button').trigger('click')
    expect(panel.emitted('approve')).toBeUndefined()
    await panel.get('input[value=printed]').setValue(true)
    await panel.get('button').trigger('click')
    expect(panel.emitted('approve')).toEqual([['printed']])
  })

  it('asks nothing where nothing disagrees', async () => {
    const panel = await mountSuspended(TorqueSpecApprove, { props: { revision: { ...flaggedRevision, flags: [] }, shopPercent: 10 } })
    expect(panel.findAll('input')).toHaveLength(0)
    await panel.get('button').trigger('click')
    expect(panel.emitted('approve')).toEqual([[undefined]])
  })

  it('cannot let a value govern that lies outside its limits', async () => {
    const limits = { kind: 'limits', lower: { value: 18, unit: 'lbf.ft' }, upper: { value: 22, unit: 'lbf.ft' } } as const
    const revision = { ...flaggedRevision, tolerance: limits, printed: { value: 50, unit: 'N.m' as const, nm: 50 } }
    const panel = await mountSuspended(TorqueSpecApprove, { props: { revision, shopPercent: 10 } })
    expect(panel.get('input[value=printed]').attributes('disabled')).toBeDefined()
    expect(panel.text()).toContain('The target lies outside the limits.')
  })
})

describe('TorqueSpecStanding', () => {
  it('says that a draft is a draft', async () => {
    const standing = await mountSuspended(TorqueSpecStanding, { props: { spec: flaggedSpec, revision: flaggedRevision } })
    expect(standing.text()).toContain('This is a draft')
    expect(standing.text()).toContain('not released before it is approved')
  })

  it('leads from the approved one to a newer draft, and back', async () => {
    const approved = { ...flaggedRevision, id: '00000000-0000-4000-8000-000000000009', status: 'approved' as const }
    const draft = { ...flaggedRevision, number: 2 }
    const spec = { ...flaggedSpec, revision: approved, revisions: [draft, approved] }
    const standing = await mountSuspended(TorqueSpecStanding, { props: { spec, revision: approved } })
    expect(standing.get('a').text()).toBe('Show draft 2')
    await standing.setProps({ revision: draft })
    expect(standing.text()).toContain('Revision 1 stays in use')
  })
})

describe('TorqueSpecTorque', () => {
  it('shows the value that governs large, and the other beside it', async () => {
    const revision = { ...flaggedRevision, status: 'approved' as const, governs: 'printed' as const, limits: { targetNm: 25, lowerNm: 22.5, upperNm: 27.5 } }
    const torque = await mountSuspended(TorqueSpecTorque, { props: { revision, shopPercent: 10 } })
    expect(torque.get('p').text()).toContain('25 N·m')
    expect(torque.text()).toContain('Printed beside it20 ft·lb')
  })
})

describe('TorqueSpecWithdrawDialog', () => {
  it('hands on the reason and shows what is wrong with it', async () => {
    const dialog = await mountSuspended(TorqueSpecWithdrawDialog, { props: { open: true, component: 'Oil pump cover', issues: [{ path: 'reason', message: 'Use at least 3 characters.' }] } })
    expect(dialog.get('textarea').attributes('aria-invalid')).toBe('true')
    await dialog.get('textarea').setValue('superseded')
    await dialog.get('form').trigger('submit')
    expect(dialog.emitted('withdraw')).toEqual([['superseded']])
  })
})
