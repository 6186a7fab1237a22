import type { Actor, Context, Shop } from '../server/context'
import { inTransaction } from '../server/transaction'
import type { People } from './people'
import type { Random } from './random'

const DAY = 86_400_000

/** The garage while its year is told: who, when, and chance that is always the same. */
export interface Garage {
  shop: Shop
  people: People
  random: Random
  today: Date
}

/** A working moment so many days before today; a Sunday becomes the Saturday before. */
export function at({ today }: Pick<Garage, 'today'>, daysAgo: number, hour: number, minute = 0): Date {
  const moment = new Date(today.getTime() - daysAgo * DAY)
  moment.setUTCHours(hour, minute, 0, 0)
  return moment.getUTCDay() === 0 ? new Date(moment.getTime() - DAY) : moment
}

/** Lets a person do something at a time, through the services. */
export const act = <Result>(garage: Garage, actor: Actor, now: Date, work: (ctx: Context) => Promise<Result>): Promise<Result> =>
  inTransaction({ actor, shop: garage.shop, now }, work)
