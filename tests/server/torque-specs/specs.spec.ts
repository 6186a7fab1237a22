import { describe, expect, it } from 'vitest'
import type { Role } from '#shared/types/roles'
import { LogEntry } from '../../../server/db/models/log-entry'
import { TorqueSpecRevision } from '../../../server/db/models/torque-spec-revision'
import { createSpec } from '../../../server/services/torque-specs/specs'
import { inTransaction } from '../../../server/transaction'
import { buildShop, buildUser } from '../../factories/shop'
import { buildApprovedSpec, buildSpecDraft, specBody } from '../../factories/spec'
import { useApi } from '../support/api'
import { useDatabase } from '../support/database'

useDatabase()
const api = useApi()

const lbft = (value: number) => ({ value, unit: 'lbf.ft' as const })
const nm = (value: number) => ({ value, unit: 'N.m' as const })

async function shopWith(rules: Parameters<typeof buildShop>[0] = {}) {
  const shop = await buildShop(rules)
  const as = async (role: Role) => {
    const actor = await buildUser(shop, role)
    return { actor, caller: await api.as(actor) }
  }
  return { shop, as }
}
const revisionBody = (overrides: object = {}) => {
  const { kind, component, application, ...revision } = specBody()
  return { ...revision, ...overrides }
}

describe('a new spec', () => {
  it('is a draft, whoever makes it, with both values and the shop\'s tolerance', async () => {
    const { as } = await shopWith({ defaultTolerancePercent: 8 })
    for (const role of ['technician', 'foreman', 'quality_lead'] as const) {
      const { actor, caller } = await as(role)
      const { body } = await caller.post('/torque-specs', specBody({ target: lbft(37), printed: nm(50), tolerance: null }))
      expect(body.revision).toMatchObject({ number: 1, status: 'draft', flags: [], tolerance: null, createdBy: { id: actor.id, name: actor.name } })
      expect(body.revision.target).toEqual({ value: 37, unit: 'lbf.ft', nm: body.revision.limits.targetNm })
      expect(body.revision.limits.targetNm).toBeCloseTo(50.165, 3)
      expect(body.revision.limits.lowerNm).toBeCloseTo(50.165 * 0.92, 3)
      expect(body.revision.stages).toMatchObject([{ number: 1, kind: 'torque' }])
      expect(body.can).toEqual({ revise: role !== 'technician', approve: role !== 'technician', withdraw: false })
    }
  })

  it('without a target takes the midpoint of its limits', async () => {
    const { as } = await shopWith()
    const { caller } = await as('foreman')
    const { target, ...body } = specBody({ tolerance: { kind: 'limits', lower: lbft(12), upper: lbft(15) } })
    const answer = await caller.post('/torque-specs', body)
    expect(target).toBeDefined()
    expect(answer.body.revision.target).toBeNull()
    expect(answer.body.revision.limits.targetNm).toBeCloseTo(13.5 * 1.3558179483, 8)
  })

  it('with angle stages takes the last torque stage', async () => {
    const { as } = await shopWith()
    const { caller } = await as('foreman')
    const { target, ...body } = specBody({ stages: [{ kind: 'snug' }, { kind: 'torque', target: nm(20) }, { kind: 'angle', angleDeg: 90 }] })
    const answer = await caller.post('/torque-specs', body)
    expect(target).toBeDefined()
    expect(answer.body.revision.limits).toMatchObject({ targetNm: 20 })
    expect(answer.body.revision.stages.map((stage: { kind: string }) => stage.kind)).toEqual(['snug', 'torque', 'angle'])
  })

  it('gets the usual preparation where none is said, and keeps an empty one', async () => {
    const { as } = await shopWith()
    const { caller } = await as('technician')
    const spec = { ...specBody({ jointClass: 'sealing', threadCondition: 'wet', oneTimeUse: true }) }
    const usual = await caller.post('/torque-specs', spec)
    const steps: { code: string, required: boolean }[] = usual.body.revision.preparation
    expect(steps.map(step => step.code)).toEqual(['faces_cleaned', 'new_gasket', 'new_bolts', 'threads_oiled'])
    expect(steps.some(step => step.required)).toBe(false)
    expect((await caller.post('/torque-specs', { ...spec, preparation: [] })).body.revision.preparation).toEqual([])
    expect((await caller.post('/torque-specs', { ...spec, kind: 'general_table' })).body.revision.preparation).toEqual([])
  })

  it('is flagged where its two units disagree, each pair on its own', async () => {
    const { as } = await shopWith()
    const { caller } = await as('technician')
    const flags = async (overrides: object) => (await caller.post('/torque-specs', specBody(overrides))).body.revision.flags
    expect(await flags({ target: lbft(22), printed: nm(30) })).toEqual([])
    const [flag] = await flags({ target: lbft(20), printed: nm(25) })
    expect(flag).toMatchObject({ code: 'dual_unit_mismatch', swapped: false })
    expect(flag.diffNm).toBeCloseTo(2.116, 3)
    expect(await flags({ target: lbft(50), printed: nm(37) })).toMatchObject([{ swapped: true }])
    const range = { tolerance: { kind: 'limits', lower: lbft(65), upper: lbft(80) }, printedLimits: { lower: nm(88), upper: nm(120) }, target: lbft(70) }
    const [upper, ...others] = await flags(range)
    expect(upper.message).toMatch(/^Upper limit/)
    expect(others).toEqual([])
  })
})

describe('approving', () => {
  it('makes the newest draft usable and answers the spec', async () => {
    const { shop, as } = await shopWith()
    const { spec } = await buildSpecDraft(shop)
    const { actor, caller } = await as('quality_lead')
    const { body } = await caller.post(`/torque-specs/${spec.id}/approve`)
    expect(body).toMatchObject({ id: spec.id, revision: { status: 'approved', governs: null, approvedBy: { id: actor.id } }, can: { approve: false, withdraw: true } })
    const again = await caller.post(`/torque-specs/${spec.id}/approve`)
    expect([again.status, again.body.data.code]).toEqual([409, 'already_decided'])
  })

  it('one\'s own draft follows the shop\'s rule', async () => {
    for (const approveOwnDraft of [true, false]) {
      const { as } = await shopWith({ approveOwnDraft })
      const { caller } = await as('foreman')
      const { body } = await caller.post('/torque-specs', specBody())
      expect(body.can.approve).toBe(approveOwnDraft)
      const answer = await caller.post(`/torque-specs/${body.id}/approve`)
      expect([answer.status, answer.body.data?.code]).toEqual(approveOwnDraft ? [200, undefined] : [403, 'same_person'])
      if (approveOwnDraft) continue
      expect((await (await as('foreman')).caller.post(`/torque-specs/${body.id}/approve`)).status).toBe(200)
    }
  })

  it('a flagged draft needs a word on what governs', async () => {
    const { shop, as } = await shopWith()
    const { caller } = await as('foreman')
    const { spec } = await buildSpecDraft(shop, { target: lbft(20), printed: nm(25) })
    const silent = await caller.post(`/torque-specs/${spec.id}/approve`)
    expect([silent.status, silent.body.data.code, silent.body.data.issues[0].path]).toEqual([422, 'dual_unit_mismatch', 'governs'])
    const { body } = await caller.post(`/torque-specs/${spec.id}/approve`, { governs: 'target' })
    expect(body.revision).toMatchObject({ governs: 'target', status: 'approved', flags: [{ code: 'dual_unit_mismatch' }] })
    expect(body.revision.limits.targetNm).toBeCloseTo(27.116, 3)
  })

  it('by the printed value computes from that one alone', async () => {
    const { shop, as } = await shopWith()
    const { caller } = await as('foreman')
    const approve = async (overrides: Parameters<typeof buildSpecDraft>[1]) => {
      const { spec } = await buildSpecDraft(shop, overrides)
      return (await caller.post(`/torque-specs/${spec.id}/approve`, { governs: 'printed' })).body
    }
    const single = await approve({ target: lbft(20), printed: nm(25) })
    expect(single.revision.limits).toEqual({ targetNm: 25, lowerNm: 22.5, upperNm: 27.5 })
    expect(single.revision.target).toMatchObject({ value: 20, unit: 'lbf.ft' })

    const range = await approve({
      target: undefined, tolerance: { kind: 'limits', lower: lbft(65), upper: lbft(80) }, printedLimits: { lower: nm(90), upper: nm(110) },
    })
    expect(range.revision.limits).toEqual({ targetNm: 100, lowerNm: 90, upperNm: 110 })

    const staged = await approve({
      target: lbft(20), printed: nm(25), stages: [{ kind: 'torque', target: lbft(10) }, { kind: 'torque', target: lbft(20) }],
    })
    expect(staged.revision.stages[1]).toMatchObject({ targetNm: 25, lowerNm: 22.5, upperNm: 27.5 })
  })

  it('by a printed value that is not there, or lies outside the limits: 422', async () => {
    const { shop, as } = await shopWith()
    const { caller } = await as('foreman')
    const outside = { target: nm(41), tolerance: { kind: 'limits' as const, lower: nm(40), upper: nm(42) }, printed: lbft(40) }
    for (const overrides of [{}, outside]) {
      const { spec } = await buildSpecDraft(shop, overrides)
      const { status, body } = await caller.post(`/torque-specs/${spec.id}/approve`, { governs: 'printed' })
      expect([status, body.data.code, body.data.issues[0].path]).toEqual([422, 'governs', 'governs'])
    }
  })

  it('two people at once: one wins, the other is told', async () => {
    const { shop, as } = await shopWith()
    const { spec } = await buildSpecDraft(shop)
    const callers = [(await as('foreman')).caller, (await as('quality_lead')).caller]
    const answers = await Promise.all(callers.map(caller => caller.post(`/torque-specs/${spec.id}/approve`)))
    expect(answers.map(answer => answer.status).toSorted()).toEqual([200, 409])
  })
})

describe('a revision', () => {
  it('changes nothing of the one before it', async () => {
    const { shop, as } = await shopWith()
    const { spec } = await buildApprovedSpec(shop)
    const { caller } = await as('foreman')
    const first = (await caller.get(`/torque-specs/${spec.id}`)).body.revision
    const revised = await caller.post(`/torque-specs/${spec.id}/revisions`, revisionBody({ target: nm(44) }))
    expect(revised.body.revision).toMatchObject({ number: 2, status: 'draft', limits: { targetNm: 44 } })
    expect((await caller.get(`/torque-specs/${spec.id}`)).body.revision).toEqual(first)
    await caller.post(`/torque-specs/${spec.id}/approve`)
    const { body } = await caller.get(`/torque-specs/${spec.id}`)
    expect(body.revision).toMatchObject({ number: 2, status: 'approved' })
    expect(body.revisions.map((revision: { number: number }) => revision.number)).toEqual([2, 1])
    expect(body.revisions[1]).toEqual(first)
  })

  it('overtakes an older draft', async () => {
    const { shop, as } = await shopWith()
    const { spec } = await buildSpecDraft(shop)
    const { caller } = await as('foreman')
    await caller.post(`/torque-specs/${spec.id}/revisions`, revisionBody())
    expect((await caller.post(`/torque-specs/${spec.id}/approve`)).body.revision.number).toBe(2)
    expect((await caller.post(`/torque-specs/${spec.id}/approve`)).status).toBe(409)
  })

  it('withdrawn says why, and can be withdrawn once', async () => {
    const { shop, as } = await shopWith()
    const { spec } = await buildApprovedSpec(shop)
    const { actor, caller } = await as('quality_lead')
    const { body } = await caller.post(`/torque-specs/${spec.id}/withdraw`, { reason: 'The manual was corrected.' })
    expect(body.revision).toMatchObject({ status: 'withdrawn', withdrawnReason: 'The manual was corrected.' })
    const again = await caller.post(`/torque-specs/${spec.id}/withdraw`, { reason: 'Once more.' })
    expect([again.status, again.body.data.code]).toEqual([409, 'already_decided'])
    const [entry] = await LogEntry.findAll({ where: { shopId: shop.id, kind: 'torque_specs.withdraw' } })
    expect(entry).toMatchObject({ subject: spec.id, actor: actor.id })
    expect(JSON.parse(entry?.content ?? '')).toMatchObject({ reason: 'The manual was corrected.', revision: { number: 1 } })
  })
})

describe('a shop value', () => {
  const value = specBody({ shopValue: true, reasoning: 'General table, M8, class 8.8, dry.', source: { title: 'Shop value' } })
  const draft = async (overrides: object = {}) => {
    const { shop, as } = await shopWith()
    const technician = await buildUser(shop, 'technician')
    const made = inTransaction({ actor: technician, shop, now: new Date() }, ctx => createSpec(ctx, { ...value, ...overrides }))
    return { made, as }
  }

  it('is a draft with its reasoning, until a published source replaces it', async () => {
    const { made, as } = await draft()
    const { spec } = await made
    const { caller } = await as('foreman')
    const read = async () => (await caller.get(`/torque-specs/${spec.id}`)).body.revisions[0]
    expect(await read()).toMatchObject({ status: 'draft', shopValue: true, reasoning: 'General table, M8, class 8.8, dry.' })
    await caller.post(`/torque-specs/${spec.id}/revisions`, revisionBody({ source: { title: 'Shop value' } }))
    expect(await read()).toMatchObject({ number: 2, shopValue: true })
    const safety = await caller.post(`/torque-specs/${spec.id}/revisions`, revisionBody({ source: { title: 'Shop value' }, jointClass: 'safety' }))
    expect([safety.status, safety.body.data.code]).toEqual([422, 'safety_joint'])
    await caller.post(`/torque-specs/${spec.id}/revisions`, revisionBody({ jointClass: 'safety' }))
    expect(await read()).toMatchObject({ number: 3, shopValue: false, reasoning: null })
  })

  it('is never for a safety joint, nor without a band', async () => {
    await expect((await draft({ jointClass: 'safety' })).made).rejects.toMatchObject({ status: 422, code: 'safety_joint' })
    const wrong = { target: nm(5), tolerance: { kind: 'absolute', value: 5, unit: 'N.m' } }
    await expect((await draft(wrong)).made).rejects.toMatchObject({ status: 400, detail: { issues: [{ path: 'tolerance.value' }] } })
  })
})

describe('the list', () => {
  async function listed() {
    const { shop, as } = await shopWith()
    const { caller } = await as('foreman')
    await buildApprovedSpec(shop, { component: 'Alternator', target: nm(30), jointClass: 'general' })
    await buildApprovedSpec(shop, { component: 'Brake caliper', target: nm(90), jointClass: 'safety' })
    await buildSpecDraft(shop, { component: 'Coolant pipe', target: lbft(20), printed: nm(25), jointClass: 'sealing' })
    const { spec } = await buildApprovedSpec(shop, { component: 'Damper', target: nm(200), source: { title: 'Other manual' } })
    await caller.post(`/torque-specs/${spec.id}/revisions`, revisionBody({ target: nm(1) }))
    await buildSpecDraft(shop, { kind: 'general_table', component: 'Element 3/8', application: 'General 100% table', target: nm(40) })
    await buildApprovedSpec(await buildShop(), { component: 'Another shop\'s' })
    const names = async (query: string): Promise<string> =>
      (await caller.get(`/torque-specs?${query}`)).body.items.map((item: { component: string }) => item.component[0]).join('')
    return { caller, names }
  }

  it('sorts by what the valid revision says, either way', async () => {
    const { names } = await listed()
    expect(await names('')).toBe('ABCDE')
    expect(await names('sort=-component')).toBe('EDCBA')
    expect(await names('sort=targetNm')).toBe('CAEBD')
    expect(await names('sort=-targetNm')).toBe('DBEAC')
    expect(await names('sort=createdAt')).toBe('ABCDE')
    expect((await names('sort=jointClass')).slice(-2)).toBe('BC')
    expect((await names('sort=status')).slice(0, 3).split('').toSorted().join('')).toBe('ABD')
    expect((await names('sort=-source'))[0]).toBe('D')
    expect((await names('sort=application'))[0]).toBe('E')
  })

  it('filters', async () => {
    const { names } = await listed()
    expect(await names('kind=general_table')).toBe('E')
    expect(await names('kind=joint')).toBe('ABCD')
    expect(await names('status=approved')).toBe('ABD')
    expect(await names('status=draft')).toBe('CE')
    expect(await names('jointClass=safety')).toBe('B')
    expect(await names('flagged=true')).toBe('C')
    expect(await names('flagged=false')).toBe('ABDE')
    expect(await names('q=caliper')).toBe('B')
    expect(await names('q=other')).toBe('D')
    expect(await names('q=100%25')).toBe('E')
    expect(await names('kind=joint&status=approved&q=invented&sort=-targetNm')).toBe('BA')
  })

  it('pages by every key without a gap', async () => {
    const { caller } = await listed()
    for (const key of ['component', 'application', 'targetNm', 'jointClass', 'status', 'source', 'createdAt']) {
      for (const sort of [key, `-${key}`]) {
        const ids: string[] = []
        let cursor = ''
        do {
          const { body } = await caller.get(`/torque-specs?limit=2&sort=${sort}${cursor}`)
          ids.push(...body.items.map((item: { id: string }) => item.id))
          cursor = body.nextCursor ? `&cursor=${body.nextCursor}` : ''
        } while (cursor)
        expect([ids.length, new Set(ids).size], sort).toEqual([5, 5])
      }
    }
  })
})

it('no revision is ever deleted', async () => {
  const { shop, as } = await shopWith()
  const { spec } = await buildApprovedSpec(shop)
  const { caller } = await as('foreman')
  await caller.post(`/torque-specs/${spec.id}/withdraw`, { reason: 'The manual was corrected.' })
  await expect(TorqueSpecRevision.destroy({ where: { shopId: shop.id } })).rejects.toThrow(/permission denied/)
})
