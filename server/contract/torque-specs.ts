import { idParams } from '#shared/schemas/common'
import {
  approveSpecBody, createSpecBody, importQuery, importReport, specAnswer, specDetailAnswer, specListAnswer, specQuery,
  specRevisionBody, withdrawSpecBody,
} from '#shared/schemas/torque-specs'
import * as specs from '../policies/torque-specs'
import { contract } from './route'

export const listSpecs = contract({
  method: 'GET', path: '/torque-specs', summary: 'Torque specs, each with its valid revision', policy: specs.readSpecs,
  query: specQuery, answer: specListAnswer,
})
export const createSpec = contract({
  method: 'POST', path: '/torque-specs', summary: 'Draft a torque spec', policy: specs.createSpec,
  body: createSpecBody, answer: specAnswer, made: true,
})
export const readSpec = contract({
  method: 'GET', path: '/torque-specs/:id', summary: 'A torque spec with all its revisions', policy: specs.readSpecs,
  params: idParams, answer: specDetailAnswer,
})
export const reviseSpec = contract({
  method: 'POST', path: '/torque-specs/:id/revisions', summary: 'Draft a new revision; answers the spec with that draft',
  policy: specs.reviseSpec, params: idParams, body: specRevisionBody, answer: specAnswer, made: true, refuses: [422],
})
export const approveSpec = contract({
  method: 'POST', path: '/torque-specs/:id/approve', summary: 'Make the newest draft usable', policy: specs.approveSpec,
  params: idParams, body: approveSpecBody, answer: specAnswer, refuses: [409, 422],
})
export const withdrawSpec = contract({
  method: 'POST', path: '/torque-specs/:id/withdraw', summary: 'Withdraw the newest approved revision',
  policy: specs.withdrawSpec, params: idParams, body: withdrawSpecBody, answer: specAnswer, refuses: [409],
})
export const importSpecs = contract({
  method: 'POST', path: '/torque-specs/import', summary: 'Draft specs from a CSV file, row by row',
  policy: specs.importSpecs, query: importQuery, accepts: 'text/csv', maxBytes: 5_000_000, answer: importReport, made: true, refuses: [422],
})
