import { mountSuspended } from '@nuxt/test-utils/runtime'
import axe from 'axe-core'
import { h, type VNode } from 'vue'
import { describe, expect, it } from 'vitest'
import {
  BaseFormSection, CalibrationEntry, CalibrationForm, WrenchFigures, WrenchFilter, WrenchForm, WrenchProperties,
  WrenchStanding, WrenchStateDialog, WrenchTable,
} from '#components'
import { calibration, wrench } from './records'

const today = '2026-12-01'
const drawn: Record<string, () => VNode> = {
  BaseFormSection: () => h(BaseFormSection, { title: 'Scale', hint: 'In its unit.' }, () => 'fields'),
  CalibrationEntry: () => h(CalibrationEntry, { calibration, timeZone: 'UTC', open: true }),
  CalibrationForm: () => h(CalibrationForm, { wrench: { ...wrench, directions: ['clockwise', 'anticlockwise'] }, today, issues: [{ path: 'asFound.0.readings.0', message: 'Missing.' }] }),
  CalibrationFormOfIndicating: () => h(CalibrationForm, { wrench: { ...wrench, kind: 'indicating' }, today, message: 'Refused.' }),
  WrenchFigures: () => h(WrenchFigures, { figures: wrench.figures }),
  WrenchFilter: () => h(WrenchFilter, { kind: '', status: 'overdue', words: '' }),
  WrenchForm: () => h(WrenchForm, { initial: emptyWrenchForm(), act: 'Add', issues: [{ path: 'assetTag', message: 'Taken.' }] }),
  WrenchProperties: () => h(WrenchProperties, { wrench }),
  WrenchStanding: () => h(WrenchStanding, { wrench, today }),
  WrenchStateDialog: () => h(WrenchStateDialog, { open: true, assetTag: 'TW-07', state: 'in_use' }),
  WrenchTable: () => h(WrenchTable, { rows: [wrench], today, sort: 'status' }),
}

// Colours are checked by tests/unit/format/contrast.spec.ts; `region` and the order of headings concern whole pages.
const rules = { 'color-contrast': { enabled: false }, 'region': { enabled: false }, 'heading-order': { enabled: false } }

describe('axe finds nothing in', () => {
  it.each(Object.keys(drawn))('%s', async (name) => {
    const mounted = await mountSuspended({ render: () => h('main', drawn[name]?.()) }, { attachTo: document.body })
    const { violations } = await axe.run(mounted.element, { rules })
    expect(violations.map(({ id, nodes }) => `${id}: ${nodes.map(node => node.html).join(' ')}`)).toEqual([])
    mounted.unmount()
  })
})
