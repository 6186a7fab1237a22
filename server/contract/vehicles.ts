import { idParams } from '#shared/schemas/common'
import {
  createVehicleBody, updateVehicleBody, vehicleAnswer, vehicleListAnswer, vehicleQuery,
} from '#shared/schemas/vehicles'
import * as vehicles from '../policies/vehicles'
import { contract } from './route'

export const listVehicles = contract({
  method: 'GET', path: '/vehicles', summary: 'Vehicles, newest first', policy: vehicles.readVehicles,
  query: vehicleQuery, answer: vehicleListAnswer,
})
export const createVehicle = contract({
  method: 'POST', path: '/vehicles', summary: 'Add a vehicle', policy: vehicles.createVehicle,
  body: createVehicleBody, answer: vehicleAnswer, made: true, refuses: [409, 422],
})
export const readVehicle = contract({
  method: 'GET', path: '/vehicles/:id', summary: 'A vehicle', policy: vehicles.readVehicles,
  params: idParams, answer: vehicleAnswer,
})
export const updateVehicle = contract({
  method: 'PATCH', path: '/vehicles/:id', summary: 'Correct or complete a vehicle', policy: vehicles.updateVehicle,
  params: idParams, body: updateVehicleBody, answer: vehicleAnswer, refuses: [409, 422],
})
