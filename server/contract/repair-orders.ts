import { idParams } from '#shared/schemas/common'
import {
  createGroupBody, createRepairOrderBody, groupAnswer, repairOrderAnswer, repairOrderListAnswer, repairOrderQuery,
  updateRepairOrderBody,
} from '#shared/schemas/repair-orders'
import { decisionBody, disturbBody, releaseBody } from '#shared/schemas/sign-offs'
import * as orders from '../policies/repair-orders'
import * as signOffs from '../policies/sign-offs'
import { contract } from './route'

export const listOrders = contract({
  method: 'GET', path: '/repair-orders', summary: 'Repair orders, newest first', policy: orders.readOrders,
  query: repairOrderQuery, answer: repairOrderListAnswer,
})
export const createOrder = contract({
  method: 'POST', path: '/repair-orders', summary: 'Open a repair order', policy: orders.createOrder,
  body: createRepairOrderBody, answer: repairOrderAnswer, made: true, refuses: [409, 422],
})
export const readOrder = contract({
  method: 'GET', path: '/repair-orders/:id', summary: 'A repair order with its groups and what holds it back',
  policy: orders.readOrders, params: idParams, answer: repairOrderAnswer,
})
export const updateOrder = contract({
  method: 'PATCH', path: '/repair-orders/:id', summary: 'Complaint, odometer, bay', policy: orders.updateOrder,
  params: idParams, body: updateRepairOrderBody, answer: repairOrderAnswer, refuses: [409],
})
export const addGroup = contract({
  method: 'POST', path: '/repair-orders/:id/fastener-groups', summary: 'Put a joint on the order, by spec revision or shop value',
  policy: orders.addGroup, params: idParams, body: createGroupBody, answer: groupAnswer, made: true, refuses: [409, 422],
})
export const releaseOrder = contract({
  method: 'POST', path: '/repair-orders/:id/release', summary: 'Release the vehicle, when nothing holds it back',
  policy: orders.releaseOrder, params: idParams, body: releaseBody, answer: repairOrderAnswer, refuses: [409, 422],
})
export const readGroup = contract({
  method: 'GET', path: '/fastener-groups/:id', summary: 'A fastener group as it is to be tightened', policy: signOffs.readGroups,
  params: idParams, answer: groupAnswer,
})
export const disturbGroup = contract({
  method: 'POST', path: '/fastener-groups/:id/disturbed', summary: 'A signed joint was opened again', policy: signOffs.disturbGroup,
  params: idParams, body: disturbBody, answer: groupAnswer, refuses: [409, 422],
})
export const concedeGroup = contract({
  method: 'POST', path: '/fastener-groups/:id/concession', summary: 'Accept a joint with its exceptions, with a reason',
  policy: signOffs.concedeGroup, params: idParams, body: decisionBody, answer: groupAnswer, refuses: [409, 422],
})
export const markNotDisturbed = contract({
  method: 'POST', path: '/fastener-groups/:id/not-disturbed', summary: 'A listed joint that was not opened',
  policy: signOffs.markNotDisturbed, params: idParams, body: decisionBody, answer: groupAnswer, refuses: [409, 422],
})
