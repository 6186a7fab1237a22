import { mountSuspended } from '@nuxt/test-utils/runtime'
import { describe, expect, it } from 'vitest'
import { TorqueSpecForm } from '#components'

const mountForm = (props: Partial<InstanceType<typeof TorqueSpecForm>['$props']> = {}) =>
  mountSuspended(TorqueSpecForm, { props: { initial: emptySpecForm('lbf.ft'), shopPercent: 10, ...props } })

type Mounted = Awaited<ReturnType<typeof mountForm>>

function field(form: Mounted, label: string) {
  const found = form.findAll('label').find(one => one.text().startsWith(label))
  return form.get<HTMLInputElement>(`[id="${found?.attributes('for')}"]`)
}

const press = (form: Mounted, text: string) => form.findAll('button').find(button => button.text().startsWith(text))?.trigger('click')

describe('TorqueSpecForm', () => {
  it('says at once when two printed units cannot be one torque', async () => {
    const form = await mountForm()
    await field(form, 'Target').setValue('20 ft-lb')
    expect(form.text()).not.toContain('disagree')
    await field(form, 'The same in a second unit').setValue('25 Nm')
    expect(form.text()).toContain('20 ft·lb is 27.1 N·m; 25 N·m printed beside it is 2.1 N·m off, more than rounding explains.')
  })

  it('draws the band as it is typed', async () => {
    const form = await mountForm()
    await field(form, 'Target').setValue('50 Nm')
    expect(form.find('[aria-label^="Band 45.0 to 55.0 N·m"]').exists()).toBe(true)
    await form.get('input[type=radio][value=percent]').setValue(true)
    await field(form, '± percent').setValue('20')
    expect(form.find('[aria-label^="Band 40.0 to 60.0 N·m"]').exists()).toBe(true)
  })

  it('a safety joint is second-checked unless somebody says otherwise', async () => {
    const form = await mountForm()
    const box = form.findAll('label').find(label => label.text().startsWith('Second check'))
    await form.get('input[type=radio][value=safety]').setValue(true)
    expect(box?.get<HTMLInputElement>('input').element.checked).toBe(true)
    await box?.get('input').setValue(false)
    await form.trigger('submit')
    expect(form.emitted('submit')?.[0]).toMatchObject([{ jointClass: 'safety', secondCheckRequired: false }])
  })

  it('checks a printed order against the bolts and draws it', async () => {
    const form = await mountForm()
    await field(form, 'Number of bolts').setValue('4')
    await field(form, 'Order as printed').setValue('1 2 2')
    expect(form.text()).toContain('Bolt 2 stands twice.')
    expect(form.text()).toContain('The usual order')
    await field(form, 'Order as printed').setValue('4 3 2 1')
    expect(form.get('figcaption').text()).toContain('Order as printed')
    expect(form.get('ol[aria-label="Bolts in tightening order"] li').text()).toContain('Bolt 4')
  })

  it('adds, moves and takes out stages', async () => {
    const form = await mountForm()
    await press(form, 'Add a stage')
    await press(form, 'Add the next stage')
    await form.get('[aria-label="Move stage 2 up"]').trigger('click')
    await form.trigger('submit')
    expect(form.emitted('submit')?.[0]).toMatchObject([{ stages: [{ kind: 'angle' }, { kind: 'torque' }] }])
    await form.get('[aria-label="Take out stage 1"]').trigger('click')
    await form.trigger('submit')
    expect(form.emitted('submit')?.[1]).toMatchObject([{ stages: [{ kind: 'torque' }] }])
  })

  it('shows each issue beside its field, and others beside the button', async () => {
    const issues = [{ path: 'source.title', message: 'This is needed.' }, { path: 'jointClass', message: 'Not for a shop value.' }]
    const form = await mountForm({ issues })
    expect(field(form, 'Manual').attributes('aria-invalid')).toBe('true')
    expect(form.get('[role=alert]').text()).toContain('Not for a shop value.')
  })

  it('does not ask for the joint again in a revision', async () => {
    const form = await mountForm({ revise: true })
    expect(form.text()).not.toContain('Component')
    expect(form.text()).toContain('Save as a draft revision')
  })

  it('places the bolts of a pattern drawn as it is by typing', async () => {
    const form = await mountForm({ initial: { ...emptySpecForm(), boltCount: '3', pattern: 'free' } })
    await form.get('[aria-label="Bolt 2, across"]').setValue('700')
    await form.trigger('submit')
    expect(form.emitted('submit')?.[0]).toMatchObject([{ places: [{ position: 1 }, { position: 2, x: 700 }, { position: 3 }] }])
  })
})
