import { mountSuspended } from '@nuxt/test-utils/runtime'
import axe from 'axe-core'
import { h, type VNode } from 'vue'
import { describe, expect, it } from 'vitest'
import {
  BaseButton, BaseCheckbox, BaseConfirmDialog, BaseDefinitionRow, BaseField, BaseNotice, BaseNumberPad, BasePager,
  BasePinDialog, BaseRadioRow, BaseSelect, BaseSentenceChoice, BaseSentenceDate, BaseSentenceText, BaseStates, BaseTable,
  BaseTextArea, BaseTextInput, BoltMark, BoltPattern, ShellAppHeader, ShellBayHeader, ShellToaster, TorqueBandRule,
  TorqueCertaintyWord, TorqueQuantityInput, TorqueQuantityPair, TorqueSetting, TorqueVerdictBadge,
  WrenchCalibrationNotches,
} from '#components'

const options = [{ value: 'a', label: 'North lab' }, { value: 'b', label: 'South lab' }]
const positions = [1, 2, 3].map(position => ({ position }))

const drawn: Record<string, () => VNode> = {
  BaseButton: () => h(BaseButton, { disabled: 'Not yet' }, () => 'Sign'),
  BaseCheckbox: () => h(BaseCheckbox, { modelValue: true }, () => 'Threads dry'),
  BaseConfirmDialog: () => h(BaseConfirmDialog, { title: 'Void?', confirm: 'Void' }),
  BaseDefinitionRow: () => h('dl', h(BaseDefinitionRow, { label: 'Due' }, () => '14 Mar 2027')),
  BaseField: () => h(BaseField, { label: 'Serial', hint: 'On the grip', error: 'Used.' },
    { default: (bound: { id: string }) => h(BaseTextInput, bound) }),
  BaseTextArea: () => h(BaseField, { label: 'Reason' }, { default: (bound: { id: string }) => h(BaseTextArea, bound) }),
  BaseNotice: () => h(BaseNotice, { kind: 'error', title: 'Not saved' }, () => 'Try again.'),
  BaseNumberPad: () => h(BaseNumberPad, { modelValue: '3', decimal: true }),
  BasePager: () => h(BasePager, { olderTo: '/?cursor=1' }),
  BasePinDialog: () => h(BasePinDialog, { open: true, title: 'Sign', lines: ['6 bolts'], error: 'Wrong.', triesLeft: 3 }),
  BaseRadioRow: () => h(BaseRadioRow, { legend: 'Way', options, modelValue: 'a' }),
  BaseSelect: () => h(BaseSelect, { label: 'Laboratory', options, placeholder: 'Choose' }),
  BaseSentence: () => h('p', [
    h(BaseSentenceChoice, { label: 'Laboratory', options, modelValue: 'a' }),
    h(BaseSentenceDate, { label: 'Since', any: 'ever', modelValue: '' }),
    h(BaseSentenceText, { label: 'Search', any: 'anything', modelValue: '' }),
  ]),
  BaseStates: () => h(BaseStates, { status: 'error', filled: true }, () => 'data'),
  BaseTable: () => h(BaseTable, {
    caption: 'Wrenches', columns: [{ key: 'tag', label: 'Wrench', sortable: true }], rows: ['TW-07'],
    rowKey: () => 'a', rowTo: () => '/a', sort: 'tag',
  }, { 'cell-tag': () => 'TW-07' }),
  BoltMark: () => h(BoltMark, { state: 'signed' }),
  BoltPattern: () => h(BoltPattern, { positions, pattern: 'circle', order: [1, 2, 3], next: 1, interactive: true }),
  ShellAppHeader: () => h(ShellAppHeader, {
    links: [{ to: '/a', label: 'Sign-offs', count: 2 }], path: '/a', person: { name: 'Ruth', role: 'Foreman' }, theme: 'day',
  }),
  ShellBayHeader: () => h(ShellBayHeader, { backTo: '/bay', backLabel: 'My repair orders', number: '24-1187' }),
  ShellToaster: () => h(ShellToaster),
  TorqueBandRule: () => h(TorqueBandRule, { lowerNm: 36.9, upperNm: 45.1, targetNm: 41, readings: [{ nm: 40, verdict: 'in_band' }] }),
  TorqueQuantityInput: () => h(TorqueQuantityInput, { label: 'Target', modelValue: { text: '37', value: 37, unit: 'lbf.ft' } }),
  TorqueWords: () => h('p', [
    h(TorqueVerdictBadge, { verdict: 'edge' }),
    h(TorqueCertaintyWord, { probability: 0.5 }),
    h(TorqueQuantityPair, { nm: 41, printed: { value: 30.2, unit: 'lbf.ft' } }),
  ]),
  TorqueSetting: () => h(TorqueSetting, { label: 'Set the wrench to', quantity: { value: 36.5, unit: 'N.m' } }),
  WrenchCalibrationNotches: () => h(WrenchCalibrationNotches, { dueOn: '2027-03-14', on: '2026-12-02' }),
}

// Colours are checked by tests/unit/format/contrast.spec.ts; `region` concerns whole pages.
const rules = { 'color-contrast': { enabled: false }, 'region': { enabled: false } }

describe('axe finds nothing in', () => {
  it.each(Object.entries(drawn))('%s', async (_name, render) => {
    const wrapper = await mountSuspended({ render: () => h('main', render()) }, { attachTo: document.body })
    const { violations } = await axe.run(wrapper.element, { rules })
    expect(violations.map(({ id, nodes }) => `${id}: ${nodes.map(node => node.html).join(' ')}`)).toEqual([])
    wrapper.unmount()
  })
})
