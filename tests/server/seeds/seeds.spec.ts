import { beforeAll, describe, expect, it } from 'vitest'
import { seedDemo } from '../../../seeds'
import type { Garage } from '../../../seeds/garage'
import type { Actor } from '../../../server/context'
import { inTransaction } from '../../../server/transaction'
import { signIn } from '../../../server/services/people/signIn'
import { verifyLog } from '../../../server/services/log/queries'
import { listOrders, readOrder } from '../../../server/services/repair-orders/queries'
import { listSignOffs } from '../../../server/services/sign-offs/queries'
import { listWrenches } from '../../../server/services/wrenches/queries'
import { useDatabase } from '../support/database'

useDatabase()

describe('the demo scenario', () => {
  let garage: Garage
  beforeAll(async () => {
    garage = await seedDemo(new Date())
  }, 120_000)
  const as = <Result>(actor: Actor, work: Parameters<typeof inTransaction<Result>>[1]) => inTransaction({ actor, shop: garage.shop, now: new Date() }, work)

  it('has forty orders, seven of them open, in every state that holds a vehicle back', async () => {
    const { items } = await as(garage.people.foreman, ctx => listOrders(ctx, { limit: 200 }))
    expect(items).toHaveLength(40)
    const open = items.filter(({ row }) => row.release === null)
    expect(open).toHaveLength(7)
    const states = new Set(open.flatMap(({ groups }) => groups.map(({ derived }) => derived.state)))
    expect([...states].toSorted()).toEqual(['disturbed', 'exception', 'in_progress', 'not_disturbed', 'open', 'pending_approval', 'second_check_waiting', 'signed'])
  })

  it('has a year of sign-offs: mostly in band, some at the edge, one out', async () => {
    const { items } = await as(garage.people.foreman, ctx => listSignOffs(ctx, { limit: 200 }))
    expect(items.length).toBeGreaterThan(80)
    expect(items.filter(item => item.verdict === 'in_band').length).toBeGreaterThan(items.length * 0.7)
    for (const verdict of ['edge', 'high']) expect(items.filter(item => item.verdict === verdict).length, verdict).toBeGreaterThan(0)
    expect(items.filter(item => !item.standing).length).toBeGreaterThanOrEqual(3)
  })

  it('has the joint of the story open, and a wrench that fits it', async () => {
    const story = await as(garage.people.technician, ctx => listOrders(ctx, { limit: 1, q: '26-1204' }))
    const order = await as(garage.people.technician, ctx => readOrder(ctx, story.items[0]?.row.id ?? ''))
    const pump = order.groups.find(({ facts }) => facts.name === 'Water pump to block')
    expect(pump?.derived.state).toBe('open')
    const { items } = await as(garage.people.technician, ctx => listWrenches(ctx, { limit: 50, fitFor: pump?.facts.id }))
    expect(items.filter(item => item.fit).length).toBeGreaterThanOrEqual(1)
  })

  it('has wrenches in every standing that the crib knows', async () => {
    const { items } = await as(garage.people.quality, ctx => listWrenches(ctx, { limit: 50 }))
    expect(items).toHaveLength(12)
    expect([...new Set(items.map(item => item.status))].toSorted()).toEqual(['at_laboratory', 'due_soon', 'overdue', 'quarantined', 'valid'])
  })

  it('lets the demo people in, and its log is intact', async () => {
    const { user } = await signIn({ email: 'technician@jamnut.example', password: 'jamnut-demo-garage' }, { address: 'seeds-test', device: 'test' }, new Date())
    expect(user.role).toBe('technician')
    expect(await verifyLog(garage.shop.id)).toMatchObject({ ok: true })
  })
})
