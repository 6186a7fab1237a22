import { mountSuspended } from '@nuxt/test-utils/runtime'
import { describe, expect, it } from 'vitest'
import {
  TorqueBandRule, TorqueCertaintyWord, TorqueQuantityInput, TorqueQuantityPair, TorqueSetting, TorqueVerdictBadge,
  WrenchCalibrationNotches,
} from '#components'

describe('TorqueBandRule', () => {
  const band = { lowerNm: 36.9, upperNm: 45.1, targetNm: 41 }

  it('says in words what it draws', async () => {
    const rule = await mountSuspended(TorqueBandRule, {
      props: { ...band, readings: [{ nm: 41.1, verdict: 'in_band', clicks: 6 }, { nm: 46, verdict: 'high' }] },
    })
    expect(rule.get('svg').attributes('aria-label'))
      .toBe('Band 36.9 to 45.1 N·m, target 41.0 N·m. 41.1 N·m, 6 clicks, in band. 46.0 N·m, high')
  })

  it('draws one stroke for a setting, however many clicks', async () => {
    const rule = await mountSuspended(TorqueBandRule, { props: { ...band, readings: [{ nm: 41.1, verdict: 'in_band', clicks: 6 }] } })
    expect(rule.findAll('.stroke-ok')).toHaveLength(1)
    expect(rule.text()).toContain('6 clicks')
  })

  it('hatches the wrench\'s own uncertainty only where it is known, never over more than the band', async () => {
    const rule = await mountSuspended(TorqueBandRule, { props: band })
    expect(rule.findAll('rect')).toHaveLength(0)
    await rule.setProps({ uncertaintyNm: 100 })
    expect(rule.findAll('rect').map(rect => Number(rect.attributes('width')))).toEqual([96, 96])
  })

  it('shows its figures in the unit asked for', async () => {
    const rule = await mountSuspended(TorqueBandRule, { props: { ...band, unit: 'lbf.ft' } })
    expect(rule.text()).toContain('30.2')
    expect(rule.text()).toContain('ft·lb')
  })
})

describe('words', () => {
  it.each([['in_band', 'In band'], ['edge', 'Edge'], ['low', 'Low'], ['high', 'High'], [null, 'not judged']] as const)(
    'verdict %s', async (verdict, words) => {
      expect((await mountSuspended(TorqueVerdictBadge, { props: { verdict } })).text()).toBe(words)
    })

  it.each([[0.999, 'sure'], [0.95, 'nearly sure'], [0.5, 'not sure'], [null, 'cannot be told']])(
    'certainty %s', async (probability, words) => {
      expect((await mountSuspended(TorqueCertaintyWord, { props: { probability } })).text()).toBe(words)
    })
})

describe('TorqueQuantityPair', () => {
  it('puts the printed value first, untouched and marked', async () => {
    const pair = await mountSuspended(TorqueQuantityPair, { props: { nm: 50.1654, printed: { value: 37, unit: 'lbf.ft' } } })
    expect(pair.text()).toBe('37 ft·lb as printed50.2 N·m')
  })

  it('shows both systems when nothing is printed', async () => {
    const pair = await mountSuspended(TorqueQuantityPair, { props: { nm: 41 } })
    expect(pair.text()).toBe('41.0 N·m30.2 ft·lb')
  })
})

it('TorqueSetting shows value and unit', async () => {
  const setting = await mountSuspended(TorqueSetting, { props: { label: 'Set the wrench to', quantity: { value: 36.5, unit: 'N.m' } } })
  expect(setting.text()).toBe('Set the wrench to36.5N·m')
})

describe('TorqueQuantityInput', () => {
  const empty = { text: '', value: null, unit: 'lbf.ft' as const }

  it('takes the unit people type with the number and shows the other system', async () => {
    const input = await mountSuspended(TorqueQuantityInput, { props: { label: 'Target', modelValue: empty } })
    await input.get('input').setValue('50 Nm')
    expect(input.emitted('update:modelValue')?.at(-1)).toEqual([{ text: '50 Nm', value: 50, unit: 'N.m' }])
    await input.setProps({ modelValue: { text: '50 Nm', value: 50, unit: 'N.m' } })
    expect(input.text()).toContain('= 36.88 ft·lb')
  })

  it('keeps what was typed and says what is wrong only when the field is left', async () => {
    const input = await mountSuspended(TorqueQuantityInput, { props: { label: 'Target', modelValue: { ...empty, text: 'tight' } } })
    expect(input.get('input').attributes('aria-invalid')).toBeUndefined()
    await input.get('input').trigger('blur')
    expect(input.get('input').attributes('aria-invalid')).toBe('true')
    expect(input.text()).toContain('Begin with a number')
  })

  it('lets the list overrule a typed unit', async () => {
    const input = await mountSuspended(TorqueQuantityInput, {
      props: { label: 'Target', modelValue: { text: '37 ft-lb', value: 37, unit: 'lbf.ft' } },
    })
    await input.get('select').setValue('N.m')
    expect(input.emitted('update:modelValue')?.at(-1)).toEqual([{ text: '37', value: 37, unit: 'N.m' }])
  })
})

describe('WrenchCalibrationNotches', () => {
  const notches = async (props: { dueOn: string | null, on: string, status?: 'at_laboratory' }) => {
    const drawing = await mountSuspended(WrenchCalibrationNotches, { props })
    return [drawing.findAll('.stroke-ink').length, drawing.text()]
  }

  it('runs out month by month, in words as well', async () => {
    expect(await notches({ dueOn: '2027-03-14', on: '2026-12-02' })).toEqual([4, 'Calibration due 14 Mar 2027'])
    expect(await notches({ dueOn: '2028-12-02', on: '2026-12-02' })).toEqual([12, 'Calibration due 2 Dec 2028'])
    expect(await notches({ dueOn: '2026-11-24', on: '2026-12-02' })).toEqual([0, 'Calibration due 24 Nov 2026, overdue'])
    expect(await notches({ dueOn: null, on: '2026-12-02' })).toEqual([0, 'no calibration'])
    expect(await notches({ dueOn: '2027-03-14', on: '2026-12-02', status: 'at_laboratory' })).toEqual([0, 'at the laboratory'])
  })
})
