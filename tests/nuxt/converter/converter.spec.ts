import { mountSuspended } from '@nuxt/test-utils/runtime'
import { describe, expect, it } from 'vitest'
import { ConverterBandCheck, ConverterOrder, ConverterSetting, ConverterUnits } from '#components'

describe('units', () => {
  it('shows the counterpart large and every other unit', async () => {
    const units = await mountSuspended(ConverterUnits)
    await units.get('input').setValue('450 in lbs')
    expect(units.get('.text-setting').text()).toBe('50.84')
    expect(units.findAll('dt').map(dt => dt.text())).toEqual(['N·m', 'ft·lb', 'oz·in', 'kgf·m', 'kgf·cm', 'cN·m', 'dN·m', 'kN·m'])
    expect(units.text()).toContain('37.5')
  })

  it('shows nothing of what is no torque', async () => {
    const units = await mountSuspended(ConverterUnits)
    await units.get('input').setValue('soon')
    expect(units.find('.text-setting').exists()).toBe(false)
    expect(units.text()).toContain('Write a number and a unit.')
  })
})

describe('band check', () => {
  it('judges as it is typed, by the shop\'s tolerance, and states a probability once the uncertainty is known', async () => {
    const check = await mountSuspended(ConverterBandCheck, { props: { shopPercent: 10 } })
    const [target, entered, uncertainty] = check.findAll('input:not([type=radio])')
    await target?.setValue('50 Nm')
    expect(check.find('[role=img]').attributes('aria-label')).toContain('Band 45.0 to 55.0 N·m')
    await entered?.setValue('56 Nm')
    expect(check.text()).toContain('High')
    expect(check.text()).toContain('needs an uncertainty')
    await uncertainty?.setValue('4')
    expect(check.text()).toMatch(/Probability in band\s*18\.\d %/)
  })

  it('takes limits without a target', async () => {
    const check = await mountSuspended(ConverterBandCheck, { props: { shopPercent: 10 } })
    await check.get('input[value=limits]').setValue(true)
    const fields = check.findAll('input:not([type=radio])')
    await fields[1]?.setValue('12')
    await fields[2]?.setValue('15')
    expect(check.text()).toContain('13.5 ft·lb')
  })
})

it('the setting is rounded to the graduation and says what it then gives', async () => {
  const setting = await mountSuspended(ConverterSetting)
  const [target, graduation, extension, , length] = setting.findAll('input')
  await target?.setValue('100 Nm')
  await graduation?.setValue('5 Nm')
  await extension?.setValue('60')
  expect(setting.text()).toContain('the effective length counts')
  await length?.setValue('380')
  expect(setting.get('.text-setting').text()).toBe('85')
  expect(setting.text()).toContain('86.36 N·m')
  expect(setting.text()).toContain('98.4 N·m')
})

it('the order is drawn for the pattern, and odd rows are refused in words', async () => {
  const order = await mountSuspended(ConverterOrder)
  expect(order.text()).toContain('1 4 2 5 3 6')
  await order.get('input[value=two_rows]').setValue(true)
  await order.get('input[inputmode=numeric]').setValue('7')
  expect(order.text()).toContain('Two rows need an even number of bolts.')
  expect(order.find('ol').exists()).toBe(false)
})
