import { idParams } from '#shared/schemas/common'
import {
  calibrationAnswer, createCalibrationBody, createWrenchBody, updateWrenchBody, wrenchDetailAnswer, wrenchListAnswer, wrenchQuery,
} from '#shared/schemas/wrenches'
import * as policies from '../policies/wrenches'
import { contract } from './route'

export const listWrenches = contract({
  method: 'GET', path: '/wrenches', summary: 'Wrenches; with fitFor each says whether it fits that joint', policy: policies.readWrenches,
  query: wrenchQuery, answer: wrenchListAnswer, refuses: [404],
})
export const createWrench = contract({
  method: 'POST', path: '/wrenches', summary: 'Add a wrench to the crib', policy: policies.createWrench,
  body: createWrenchBody, answer: wrenchDetailAnswer, made: true, refuses: [409],
})
export const readWrench = contract({
  method: 'GET', path: '/wrenches/:id', summary: 'A wrench with its calibrations', policy: policies.readWrenches,
  params: idParams, answer: wrenchDetailAnswer,
})
export const updateWrench = contract({
  method: 'PATCH', path: '/wrenches/:id', summary: 'Change a wrench, or take it out of use', policy: policies.updateWrench,
  params: idParams, body: updateWrenchBody, answer: wrenchDetailAnswer, refuses: [409],
})
export const recordCalibration = contract({
  method: 'POST', path: '/wrenches/:id/calibrations', summary: 'Record a calibration', policy: policies.recordCalibration,
  params: idParams, body: createCalibrationBody, answer: calibrationAnswer, made: true, refuses: [409, 422],
})
