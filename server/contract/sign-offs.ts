import { idParams } from '#shared/schemas/common'
import { logAnswer, logHeadAnswer, logQuery } from '#shared/schemas/log'
import {
  correctionBody, secondCheckAnswer, secondCheckBody, secondCheckListAnswer, secondCheckQuery, signOffAnswer, signOffBody,
  signOffDetailAnswer, signOffListAnswer, signOffQuery, voidBody,
} from '#shared/schemas/sign-offs'
import * as policies from '../policies/sign-offs'
import { contract } from './route'

export const listSignOffs = contract({
  method: 'GET', path: '/sign-offs', summary: 'Sign-offs by any column', policy: policies.readSignOffs,
  query: signOffQuery, answer: signOffListAnswer,
})
export const recordSignOff = contract({
  method: 'PUT', path: '/sign-offs/:id', summary: 'Sign tightened positions, exactly once by the id made on the device',
  policy: policies.recordSignOff, params: idParams, body: signOffBody, answer: signOffAnswer, refuses: [409, 422],
})
export const readSignOff = contract({
  method: 'GET', path: '/sign-offs/:id', summary: 'A sign-off with everything that was true then', policy: policies.readSignOffs,
  params: idParams, answer: signOffDetailAnswer,
})
export const correctSignOff = contract({
  method: 'POST', path: '/sign-offs/:id/corrections', summary: 'A new sign-off in place of one\'s own earlier one',
  policy: policies.correctSignOff, params: idParams, body: correctionBody, answer: signOffAnswer, made: true, refuses: [409, 422],
})
export const voidSignOff = contract({
  method: 'POST', path: '/sign-offs/:id/void', summary: 'Void a sign-off; the group opens again', policy: policies.voidSignOff,
  params: idParams, body: voidBody, answer: signOffDetailAnswer, refuses: [409],
})
export const listSecondChecks = contract({
  method: 'GET', path: '/second-checks', summary: 'Joints that wait for a second check', policy: policies.readSecondChecks,
  query: secondCheckQuery, answer: secondCheckListAnswer,
})
export const recordSecondCheck = contract({
  method: 'PUT', path: '/second-checks/:id', summary: 'Check another person\'s joint, exactly once', policy: policies.recordSecondCheck,
  params: idParams, body: secondCheckBody, answer: secondCheckAnswer, refuses: [409, 422],
})
export const readLog = contract({
  method: 'GET', path: '/log', summary: 'The shop\'s log from a place on', policy: policies.readLog, query: logQuery, answer: logAnswer,
})
export const readLogHead = contract({
  method: 'GET', path: '/log/head', summary: 'The newest entry of the log', policy: policies.readLog, answer: logHeadAnswer,
})
