import { mountSuspended } from '@nuxt/test-utils/runtime'
import axe from 'axe-core'
import { h, type VNode } from 'vue'
import { describe, expect, it } from 'vitest'
import {
  TorqueSpecApprove, TorqueSpecBand, TorqueSpecFilter, TorqueSpecForm, TorqueSpecHeadline, TorqueSpecImportChoose,
  TorqueSpecImportColumns, TorqueSpecImportReport, TorqueSpecJoint, TorqueSpecPattern, TorqueSpecPreparation,
  TorqueSpecRevisions, TorqueSpecStages, TorqueSpecStanding, TorqueSpecTable, TorqueSpecTorque, TorqueSpecWithdrawDialog,
} from '#components'
import { flaggedRevision as revision, flaggedSpec as spec } from './records'

const form = {
  ...emptySpecForm('lbf.ft'), boltCount: '4', pattern: 'free' as const, target: quantityEntry({ value: 20, unit: 'lbf.ft' }),
  printed: quantityEntry({ value: 25, unit: 'N.m' }), runningTorque: quantityEntry({ value: 2, unit: 'N.m' }),
  stages: [{ ...newStage([], 'N.m') }, { ...newStage([], 'N.m'), key: 2, kind: 'angle' as const }],
  preparation: [{ key: 1, code: '', text: 'Clean', required: true }],
}
const rows: ImportRow[] = [{ line: 2, status: 'refused', component: 'Elbow', flags: revision.flags, issues: [{ path: 'kind', message: 'Wrong.' }] }]

const drawn: Record<string, () => VNode> = {
  Approve: () => h(TorqueSpecApprove, { revision, shopPercent: 10, message: 'Refused.' }),
  Band: () => h(TorqueSpecBand, revision.limits),
  Filter: () => h(TorqueSpecFilter, { kind: '', status: 'draft', jointClass: '', flagged: '', words: '' }),
  Form: () => h(TorqueSpecForm, { initial: form, shopPercent: 10, issues: [{ path: 'component', message: 'This is needed.' }] }),
  FormOfLimits: () => h(TorqueSpecForm, { initial: { ...form, toleranceKind: 'limits', pattern: '' }, shopPercent: 10 }),
  Headline: () => h(TorqueSpecHeadline, { spec, revision }),
  ImportChoose: () => h(TorqueSpecImportChoose, { message: 'Too large.' }),
  ImportColumns: () => h(TorqueSpecImportColumns),
  ImportReport: () => h(TorqueSpecImportReport, { rows, fileName: 'a.csv', written: false, choice: '' }),
  Joint: () => h(TorqueSpecJoint, { revision }),
  Pattern: () => h(TorqueSpecPattern, { revision }),
  Preparation: () => h(TorqueSpecPreparation, { steps: revision.preparation }),
  Revisions: () => h(TorqueSpecRevisions, { revisions: [revision], shown: 1, timeZone: 'UTC' }),
  Stages: () => h(TorqueSpecStages, { stages: revision.stages }),
  Standing: () => h(TorqueSpecStanding, { spec, revision }),
  Table: () => h(TorqueSpecTable, { rows: [spec], sort: 'component' }),
  Torque: () => h(TorqueSpecTorque, { revision, shopPercent: 10 }),
  WithdrawDialog: () => h(TorqueSpecWithdrawDialog, { open: true, component: 'Elbow' }),
}

// Colours are checked by tests/unit/format/contrast.spec.ts; `region` and the order of headings concern whole pages.
const rules = { 'color-contrast': { enabled: false }, 'region': { enabled: false }, 'heading-order': { enabled: false } }

describe('axe finds nothing in', () => {
  it.each(Object.keys(drawn))('TorqueSpec%s', async (name) => {
    const mounted = await mountSuspended({ render: () => h('main', drawn[name]?.()) }, { attachTo: document.body })
    const { violations } = await axe.run(mounted.element, { rules })
    expect(violations.map(({ id, nodes }) => `${id}: ${nodes.map(node => node.html).join(' ')}`)).toEqual([])
    mounted.unmount()
  })
})
