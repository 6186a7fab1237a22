import { checkVin } from '#shared/vehicle/vin'
import { createVehicle } from '../server/services/vehicles/vehicles'
import { act, at, type Garage } from './garage'

// Unit number, make, model, year, engine, first part of the VIN without its check digit: all invented.
const fleet = [
  ['S-14', 'Halyard', '450 shuttle', 2021, '3.2 diesel', '1ZHSA45C', 'M0A10014'],
  ['S-15', 'Halyard', '450 shuttle', 2021, '3.2 diesel', '1ZHSA45C', 'M0A10015'],
  ['S-18', 'Halyard', '450 shuttle', 2022, '3.2 diesel', '1ZHSA45C', 'N0A10218'],
  ['V-03', 'Corvane', 'Pelter van', 2019, '2.0 petrol', '2ZCPV20K', 'K0B30003'],
  ['V-07', 'Corvane', 'Pelter van', 2020, '2.0 petrol', '2ZCPV20K', 'L0B30107'],
  ['V-09', 'Corvane', 'Pelter van', 2023, '2.0 hybrid', '2ZCPV2HK', 'P0B30409'],
  ['T-21', 'Ostmark', 'T8 tipper', 2018, '7.7 diesel', '3ZST877D', 'J0C50021'],
  ['T-22', 'Ostmark', 'T8 tipper', 2018, '7.7 diesel', '3ZST877D', 'J0C50022'],
  ['T-24', 'Ostmark', 'T6 flatbed', 2020, '5.1 diesel', '3ZST651D', 'L0C50124'],
  ['C-01', 'Linnet', 'Three estate', 2022, '1.4 petrol', '1ZLN314E', 'N0D70001'],
  ['C-02', 'Linnet', 'Three estate', 2022, '1.4 petrol', '1ZLN314E', 'N0D70002'],
  ['C-05', 'Linnet', 'Four saloon', 2024, '1.8 hybrid', '1ZLN418H', 'R0D70305'],
  ['B-31', 'Halyard', '900 bus', 2017, '9.0 diesel', '1ZHSB90C', 'H0A20031'],
  ['B-32', 'Halyard', '900 bus', 2017, '9.0 diesel', '1ZHSB90C', 'H0A20032'],
] as const

/** The vehicle ids by unit number. */
export async function seedVehicles(garage: Garage): Promise<Map<string, string>> {
  const ids = new Map<string, string>()
  for (const [unitNumber, make, model, year, engine, head, tail] of fleet) {
    const vin = `${head}${checkVin(`${head}0${tail}`).checkDigit}${tail}`
    const body = { unitNumber, make, model, year, engine, vin, odometer: Math.round(garage.random.between(18_000, 240_000)) }
    const { id } = await act(garage, garage.people.advisor, at(garage, 364, 9), ctx => createVehicle(ctx, body))
    ids.set(unitNumber, id)
  }
  return ids
}
