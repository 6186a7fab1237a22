import { mountSuspended } from '@nuxt/test-utils/runtime'
import { describe, expect, it } from 'vitest'
import { BaseStates } from '#components'

const slots = { default: () => 'twelve wrenches' }

describe('BaseStates', () => {
  it.each(['idle', 'pending'] as const)('says what it is loading when %s', async (status) => {
    const states = await mountSuspended(BaseStates, { props: { status, filled: false, what: 'wrenches' }, slots })
    expect(states.text()).toContain('Loading wrenches')
    expect(states.text()).not.toContain('twelve')
  })

  it('says why there is nothing and what to do next', async () => {
    const states = await mountSuspended(BaseStates, {
      props: { status: 'success', filled: false, emptyTitle: 'No wrench yet', emptyText: 'Add the first one.' }, slots,
    })
    expect(states.text()).toBe('No wrench yetAdd the first one.')
  })

  it('offers to try again after an error', async () => {
    const states = await mountSuspended(BaseStates, { props: { status: 'error', filled: false, error: 'No network.' }, slots })
    expect(states.get('[role=alert]').text()).toContain('No network.')
    await states.get('button').trigger('click')
    expect(states.emitted('retry')).toHaveLength(1)
  })

  it('keeps what was there during a refresh and after a failed one', async () => {
    const states = await mountSuspended(BaseStates, { props: { status: 'pending', filled: true }, slots })
    expect(states.text()).toBe('twelve wrenches')
    await states.setProps({ status: 'error' })
    expect(states.text()).toContain('twelve wrenches')
    expect(states.find('[role=alert]').exists()).toBe(true)
  })
})
