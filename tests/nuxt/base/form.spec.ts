import { mountSuspended } from '@nuxt/test-utils/runtime'
import { h } from 'vue'
import { describe, expect, it } from 'vitest'
import { BaseCheckbox, BaseField, BaseRadioRow, BaseSelect, BaseSentenceChoice, BaseTextInput } from '#components'

describe('BaseField', () => {
  it('ties label, hint and error to the control', async () => {
    const field = await mountSuspended(BaseField, {
      props: { label: 'Serial number', hint: 'On the grip', error: 'Already used.' },
      slots: { default: (bound: { id: string, describedby?: string, invalid: boolean }) => h(BaseTextInput, bound) },
    })
    const input = field.get('input')
    expect(field.get('label').attributes('for')).toBe(input.attributes('id'))
    const described = (input.attributes('aria-describedby') ?? '').split(' ').map(id => field.get(`[id="${id}"]`).text())
    expect(described).toEqual(['On the grip', 'Already used.'])
    expect(input.attributes('aria-invalid')).toBe('true')
  })

  it('describes nothing when there is nothing to say', async () => {
    const field = await mountSuspended(BaseField, {
      props: { label: 'Laboratory' },
      slots: { default: (bound: { id: string, describedby?: string, invalid: boolean }) => h(BaseTextInput, bound) },
    })
    expect(field.get('input').attributes('aria-describedby')).toBeUndefined()
    expect(field.get('input').attributes('aria-invalid')).toBeUndefined()
  })
})

const choices = [{ value: 'a', label: 'North lab' }, { value: 'b', label: 'South lab' }] as const

describe('choices', () => {
  it('BaseSelect answers the chosen value', async () => {
    const select = await mountSuspended(BaseSelect, { props: { options: choices, placeholder: 'Choose one' } })
    await select.get('select').setValue('b')
    expect(select.emitted('update:modelValue')).toEqual([['b']])
  })

  it('BaseCheckbox toggles with its label', async () => {
    const box = await mountSuspended(BaseCheckbox, { slots: { default: () => 'Threads clean and dry' } })
    await box.get('input').setValue(true)
    expect(box.emitted('update:modelValue')).toEqual([[true]])
    expect(box.element.tagName).toBe('LABEL')
  })

  it('BaseRadioRow is one group of native radios under a legend', async () => {
    const row = await mountSuspended(BaseRadioRow, { props: { legend: 'Way of entry', options: choices } })
    const radios = row.findAll('input[type=radio]')
    expect(new Set(radios.map(radio => radio.attributes('name'))).size).toBe(1)
    expect(row.get('legend').text()).toBe('Way of entry')
    await radios[1]?.setValue(true)
    expect(row.emitted('update:modelValue')).toEqual([['b']])
  })

  it('BaseSentenceChoice reads as words and has a spoken name', async () => {
    const choice = await mountSuspended(BaseSentenceChoice, {
      props: { label: 'Laboratory', modelValue: 'a', options: choices },
    })
    expect(choice.get('[aria-hidden]').text()).toBe('North lab')
    expect(choice.get('select').attributes('aria-label')).toBe('Laboratory')
  })
})
