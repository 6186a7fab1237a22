import type { Garage } from './garage'
import { seedPeople } from './people'
import { generator } from './random'
import { seedToday, seedYear } from './repair-orders'
import { createShop } from './shop'
import { seedSpecs } from './specs'
import { seedVehicles } from './vehicles'
import { seedCribToday, seedWrenches } from './wrenches'

export { hasShop } from './shop'
export { seedMinimal } from './minimal'

/** The demo scenario: one invented fleet garage and its year up to today, made through the services. */
export async function seedDemo(today: Date): Promise<Garage> {
  const shop = await createShop('Harrow Lane Fleet Garage', 'Europe/Lisbon', new Date(today.getTime() - 365 * 86_400_000))
  const people = await seedPeople(shop, new Date(today.getTime() - 365 * 86_400_000))
  const garage: Garage = { shop, people, random: generator(20_261_201), today }
  const vehicles = await seedVehicles(garage)
  const wrenches = await seedWrenches(garage)
  const specs = await seedSpecs(garage)
  const yard = { garage, vehicles, specs, wrenches }
  await seedYear(yard)
  await seedToday(yard)
  await seedCribToday(garage, wrenches)
  return garage
}
