import type { Role } from '#shared/types/roles'
import type { Actor, Shop } from '../server/context'
import { appendToLog } from '../server/services/log/append'
import { addUser } from '../server/services/people/people'
import { inTransaction } from '../server/transaction'
import { founder } from './shop'

export const DEMO_PASSPHRASE = 'jamnut-demo-garage'
export const DEMO_PIN = '408152'

const people = {
  admin: ['Odile Farrant', 'administrator'],
  foreman: ['Marek Solveig', 'foreman'],
  technician: ['Runa Salter', 'technician'],
  technician2: ['Teo Brandvik', 'technician'],
  quality: ['Ines Quill', 'quality_lead'],
  advisor: ['Piet Ardley', 'advisor'],
  foreman2: ['Hanne Dorrow', 'foreman'],
  technician3: ['Davi Fenn', 'technician'],
} satisfies Record<string, [string, Role]>

export type People = Record<keyof typeof people, Actor>

/** The people of the garage; each signs in with `<key>@jamnut.example`. */
export async function seedPeople(shop: Shop, now: Date): Promise<People> {
  const made: [string, Actor][] = []
  for (const [key, [name, role]] of Object.entries(people)) {
    const email = `${key}@jamnut.example`
    const user = await inTransaction({ actor: made[0]?.[1] ?? founder(shop, shop.id), shop, now }, async (ctx) => {
      if (made.length === 0) await appendToLog(ctx, { kind: 'shops.create', subject: shop.id, actor: null, content: { name: shop.name } })
      return addUser(ctx, { name, email, role, passphrase: DEMO_PASSPHRASE, pin: DEMO_PIN })
    })
    made.push([key, { id: user.user.id, name, email, role, shopId: shop.id, sessionId: null }])
  }
  const byKey = Object.fromEntries(made)
  const of = (key: keyof typeof people): Actor => {
    const actor = byKey[key]
    if (!actor) throw new Error(`${key} was not made.`)
    return actor
  }
  return {
    admin: of('admin'), foreman: of('foreman'), technician: of('technician'), technician2: of('technician2'), quality: of('quality'),
    advisor: of('advisor'), foreman2: of('foreman2'), technician3: of('technician3'),
  }
}
