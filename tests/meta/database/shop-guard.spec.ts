import { Op, type ModelStatic } from 'sequelize'
import { beforeAll, describe, expect, it } from 'vitest'
import type { Actor, Shop } from '../../../server/context'
import { ShopModel } from '../../../server/db/base'
import { database } from '../../../server/db/index'
import { Session } from '../../../server/db/models/session'
import { User } from '../../../server/db/models/user'
import { uuidv7 } from '#shared/ids/uuid'
import { buildShop, buildUser } from '../../factories/shop'
import { useDatabase } from '../../server/support/database'

const refusal = /must name the shop/

describe('a query without the shop', () => {
  useDatabase()
  let shop: Shop
  let actor: Actor
  beforeAll(async () => {
    shop = await buildShop()
    actor = await buildUser(shop, 'technician')
  })

  it('is refused by every model but that of the shops', async () => {
    const models = Object.values(database().models)
    const guarded = models.filter(model => model.prototype instanceof ShopModel)
    expect(models.filter(model => !guarded.includes(model)).map(model => model.name)).toEqual(['Shop'])
    for (const model of guarded) {
      await expect(model.findAll(), model.name).rejects.toThrow(refusal)
      await expect(model.count(), model.name).rejects.toThrow(refusal)
      await expect(model.update({}, { where: {} }), model.name).rejects.toThrow(refusal)
      await expect(model.destroy({ where: {} }), model.name).rejects.toThrow(refusal)
    }
  })

  const queries: [string, (users: ModelStatic<User>) => Promise<unknown>][] = [
    ['findByPk', users => users.findByPk(actor.id)],
    ['findOne', users => users.findOne({ where: { id: actor.id } })],
    ['findAndCountAll', users => users.findAndCountAll({ where: { active: true } })],
    ['an undefined shop', users => users.findOne({ where: { id: actor.id, shopId: undefined } })],
    ['one shop or all', users => users.findAll({ where: { [Op.or]: [{ shopId: shop.id }, { active: true }] } })],
    ['max', users => users.max('pinFailures')],
    ['update', users => users.update({ active: false }, { where: { id: actor.id } })],
    ['destroy', users => users.destroy({ where: { id: actor.id } })],
    ['truncate', users => users.truncate()],
  ]
  it.each(queries)('is refused: %s', async (_name, query) => {
    await expect(query(User)).rejects.toThrow(refusal)
  })

  it('is answered with the shop, alone or among other conditions', async () => {
    const where = { shopId: shop.id, id: actor.id }
    expect(await User.count({ where })).toBe(1)
    expect(await User.count({ where: { [Op.and]: [{ shopId: shop.id }, { id: actor.id }] } })).toBe(1)
    expect((await User.findOne({ where }))?.email).toBe(actor.email)
  })

  it('is answered when a reason is given', async () => {
    const found = await User.findOne({
      where: { email: actor.email }, dangerouslyAcrossShops: 'sign-in knows only the e-mail',
    })
    expect(found?.id).toBe(actor.id)
  })

  it('never happens to a record once loaded: it is saved and reloaded in its shop', async () => {
    const user = await User.findOne({ where: { shopId: shop.id, id: actor.id }, rejectOnEmpty: true })
    await user.update({ name: 'Nils Berg' })
    await user.reload()
    expect(user.name).toBe('Nils Berg')

    const elsewhere = User.build({ ...user.get(), shopId: uuidv7() }, { isNewRecord: false })
    elsewhere.name = 'Somebody else'
    await elsewhere.save()
    await user.reload()
    expect(user.name).toBe('Nils Berg')
  })

  it('is not needed for what is included', async () => {
    await Session.create({
      id: uuidv7(), shopId: shop.id, userId: actor.id, device: 'Tablet', createdAt: new Date(), seenAt: new Date(),
    })
    const session = await Session.findOne({ where: { shopId: shop.id, userId: actor.id }, include: 'user' })
    expect(session?.user?.id).toBe(actor.id)
  })
})
