import {
  checkAnswer, checkBody, convertAnswer, convertBody, orderAnswer, orderBody, settingAnswer, settingBody,
} from '#shared/schemas/torque'
import { calculate } from '../policies/torque'
import { contract } from './route'

export const convertTorque = contract({
  method: 'POST', path: '/torque/convert', summary: 'A torque in another unit', policy: calculate, transaction: 'none',
  body: convertBody, answer: convertAnswer,
})
export const checkTorque = contract({
  method: 'POST', path: '/torque/check', summary: 'Whether a torque lies in a band, and how surely',
  policy: calculate, transaction: 'none', body: checkBody, answer: checkAnswer,
})
export const wrenchSetting = contract({
  method: 'POST', path: '/torque/setting', summary: 'What to set on the wrench, with adapter and multiplier',
  policy: calculate, transaction: 'none', body: settingBody, answer: settingAnswer,
})
export const tighteningOrder = contract({
  method: 'POST', path: '/torque/order', summary: 'The order in which to tighten a pattern of bolts',
  policy: calculate, transaction: 'none', body: orderBody, answer: orderAnswer,
})
