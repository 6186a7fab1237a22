import { mountSuspended } from '@nuxt/test-utils/runtime'
import { describe, expect, it } from 'vitest'
import { CalibrationEntry, CalibrationForm } from '#components'
import { calibration, wrench } from './records'

const mountForm = (props: Partial<InstanceType<typeof CalibrationForm>['$props']> = {}) =>
  mountSuspended(CalibrationForm, { props: { wrench, today: '2026-12-01', ...props } })
type Mounted = Awaited<ReturnType<typeof mountForm>>

const outcome = (form: Mounted) => form.findAll('section').find(section => section.text().startsWith('What this comes to'))?.text() ?? ''
const references = (form: Mounted) => form.findAll<HTMLInputElement>('input[aria-label$="reference"]')
const tick = (form: Mounted, text: string) =>
  form.findAll('label').find(label => label.text().startsWith(text))?.get('input').setValue(true)

function paste(form: Mounted, index: number, text: string) {
  const data = new DataTransfer()
  data.setData('text/plain', text)
  return references(form)[index]?.trigger('paste', { clipboardData: data })
}

const good = '20\t20\t20\t20\t20\n60\t60\t60\t60\t60\n100\t100\t100\t100\t100'

describe('CalibrationForm', () => {
  it('has the usual points, with the readings of the class', async () => {
    const form = await mountForm()
    expect(references(form)).toHaveLength(15)
  })

  it('says each deviation at once, with its sign in words', async () => {
    const form = await mountForm()
    await references(form)[10]?.setValue('96')
    expect(form.text()).toContain('+4.17 %reads high, outside')
    expect(form.text()).toContain('reads high: the bolt gets less')
    await references(form)[11]?.setValue('101')
    expect(form.text()).toContain('−0.99 %reads low')
  })

  it('takes a block from a spreadsheet and says the result before saving', async () => {
    const form = await mountForm()
    await paste(form, 0, good)
    expect(references(form).map(input => input.element.value).slice(10)).toEqual(['100', '100', '100', '100', '100'])
    expect(outcome(form)).toContain('As found passes')
    expect(outcome(form)).toContain('The wrench may be used, and is due again on 1 Dec 2027.')
  })

  it('an ordinary paste of one value stays with the browser', async () => {
    const form = await mountForm()
    await paste(form, 0, '20.1')
    expect(references(form)[0]?.element.value).toBe('')
  })

  it('after a failed as found waits for an as left that passes', async () => {
    const form = await mountForm()
    await paste(form, 10, '90\t90\t90\t90\t90')
    expect(outcome(form)).toContain('stays in quarantine until an as left passes')
    await tick(form, 'It was adjusted')
    expect(outcome(form)).toContain('The readings as left are still to come.')
    await paste(form, 15, good)
    expect(outcome(form)).toContain('As left passes')
    expect(outcome(form)).toContain('Joints tightened with it since its last good calibration need a look.')
    expect(outcome(form)).toContain('may be used')
  })

  it('asks why where there is no as found, and then for as left', async () => {
    const form = await mountForm()
    await form.get('input[type=radio][value=unavailable]').setValue(true)
    expect(form.text()).toContain('Why there are none')
    expect(references(form)).toHaveLength(15)
    await form.trigger('submit')
    expect(form.emitted('submit')?.[0]).toMatchObject([{ asFoundMeasured: false }])
  })

  it('takes indicated values too, where they are not the point itself', async () => {
    const form = await mountForm({ wrench: { ...wrench, kind: 'indicating' } })
    expect(form.findAll('input[aria-label$="indicated"]')).toHaveLength(15)
  })

  it('shows an issue beside its reading', async () => {
    const form = await mountForm({ issues: [{ path: 'asFound.1.readings.2.reference', message: 'This reading is missing.' }] })
    expect(references(form)[7]?.attributes('aria-invalid')).toBe('true')
    expect(form.text()).toContain('This reading is missing.')
  })

  it('points follow the unit of the certificate until something is measured', async () => {
    const form = await mountForm()
    const unit = form.findAll('select').find(select => select.html().includes('lbf.ft'))
    await unit?.setValue('lbf.ft')
    const point = () => form.findAll<HTMLInputElement>('fieldset input').find(input => /^\d/.test(input.element.value))?.element.value
    expect(point()).toBe('14.75')
    await references(form)[0]?.setValue('14.8')
    await unit?.setValue('N.m')
    expect(point()).toBe('14.75')
  })
})

describe('CalibrationEntry', () => {
  it('holds every reading with its deviation', async () => {
    const entry = await mountSuspended(CalibrationEntry, { props: { calibration, timeZone: 'UTC', open: true } })
    expect(entry.get('summary').text()).toContain('as found fails')
    expect(entry.get('summary').text()).toContain('not to be used after it')
    expect(entry.findAll('ol li').map(item => item.text())).toEqual(['100 gave 1000.00 %', '100 gave 96+4.17 % outside'])
  })
})
