import {
  changePassphraseBody, changePinBody, createdUserAnswer, createUserBody, doneAnswer, meAnswer, shopAnswer, shopRulesBody,
  signInAnswer, signInBody, updatedUserAnswer, updateUserBody, userListAnswer, userQuery,
} from '#shared/schemas/auth'
import { idParams } from '#shared/schemas/common'
import { healthAnswer } from '#shared/schemas/log'
import * as people from '../policies/people'
import { contract } from './route'

export const health = contract({
  method: 'GET', path: '/health', summary: 'Whether the database answers', policy: 'public', answer: healthAnswer, refuses: [503],
})
export const signIn = contract({
  method: 'POST', path: '/auth/sign-in', summary: 'Sign in with e-mail and passphrase', policy: 'public',
  body: signInBody, answer: signInAnswer, refuses: [429],
})
export const signOut = contract({
  method: 'POST', path: '/auth/sign-out', summary: 'End this session', policy: 'public', answer: doneAnswer,
})
export const me = contract({
  method: 'GET', path: '/auth/me', summary: 'Who is signed in, and the shop', policy: people.readOwn, answer: meAnswer,
})
export const changePassphrase = contract({
  method: 'POST', path: '/auth/passphrase', summary: 'Choose a new passphrase; ends all other sessions',
  policy: people.changeOwnSecrets, body: changePassphraseBody, answer: doneAnswer, refuses: [422],
})
export const changePin = contract({
  method: 'POST', path: '/auth/pin', summary: 'Choose a PIN, confirmed with the passphrase; unlocks it',
  policy: people.changeOwnSecrets, body: changePinBody, answer: doneAnswer, refuses: [422],
})
export const listUsers = contract({
  method: 'GET', path: '/users', summary: 'People of the shop', policy: people.listUsers, query: userQuery, answer: userListAnswer,
})
export const createUser = contract({
  method: 'POST', path: '/users', summary: 'Add a person; answers a temporary passphrase once', policy: people.createUser,
  body: createUserBody, answer: createdUserAnswer, made: true, refuses: [409],
})
export const updateUser = contract({
  method: 'PATCH', path: '/users/:id', summary: 'Role, name, disabling, ending sessions, unlocking', policy: people.updateUser,
  params: idParams, body: updateUserBody, answer: updatedUserAnswer,
})
export const updateShopRules = contract({
  method: 'PATCH', path: '/shop', summary: 'The shop\'s own rules', policy: people.changeShopRules, body: shopRulesBody, answer: shopAnswer,
})
