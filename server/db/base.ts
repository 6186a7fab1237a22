import { Model, Op, type InitOptions, type ModelOptions, type Sequelize } from 'sequelize'

declare module 'sequelize/types/model' {
  // The options of every find, count, update and destroy.
  interface Filterable {
    /** Why this one query may look across shops. */
    dangerouslyAcrossShops?: string
  }
}

/** What the guard looks at in the options of a query. */
interface Guarded {
  where?: unknown
  dangerouslyAcrossShops?: string
}

// The model asks by attribute; a loaded record, when saved or reloaded, by column.
const shopKeys = ['shopId', 'shop_id']

function namesShop(where: unknown): boolean {
  if (typeof where !== 'object' || where === null) return false
  if (shopKeys.some(name => Object.hasOwn(where, name) && Reflect.get(where, name) != null)) return true
  const all: unknown = Reflect.get(where, Op.and)
  return Array.isArray(all) ? all.some(namesShop) : namesShop(all)
}

/**
 * Refuses a query of a shop's records that does not say which shop, so that forgetting it can never show one shop
 * another's records. Included tables need no check: their foreign keys hold the shop too.
 * @throws Error unless `where` has `shopId`, or `dangerouslyAcrossShops` gives a reason
 */
function guard(tableName: string, options: Guarded | undefined) {
  if (namesShop(options?.where) || options?.dangerouslyAcrossShops) return
  throw new Error(`A query of ${tableName} must name the shop: where.shopId is missing.`)
}

/** A record that belongs to a shop. */
export abstract class ShopModel<Attributes extends object, Creation extends object = Attributes>
  extends Model<Attributes, Creation> {
  declare shopId: string

  /** Where this record is, for saving, reloading and destroying it: in its shop. */
  override where(): object {
    return { ...super.where(), shop_id: this.shopId }
  }
}

// Sums, minima and maxima run no hook.
const { aggregate } = Model
ShopModel.aggregate = function (field, how, options) {
  guard(this.tableName, options)
  return Reflect.apply(aggregate, this, [field, how, options])
}

/** Options for `Model.init` of a table without a shop. */
export function tableOptions(sequelize: Sequelize, tableName: string) {
  return { sequelize, tableName, timestamps: false, underscored: true } satisfies InitOptions
}

/** Options for `Model.init` of a shop's table: no query without the shop. */
export function shopOptions(sequelize: Sequelize, tableName: string) {
  const hook = (options?: Guarded) => guard(tableName, options)
  const hooks = {
    beforeFind: hook, beforeCount: hook, beforeBulkUpdate: hook, beforeBulkDestroy: hook,
  } satisfies ModelOptions['hooks']
  return { ...tableOptions(sequelize, tableName), hooks }
}
