import { expect, it } from 'vitest'
import { roles } from '#shared/types/roles'
import { firstScreenFor, nameOfAddress, navigationFor, returnAddress, signInAddress } from '../../../utils/navigation'

it.each([
  ['technician', '/bay'], ['foreman', '/repair-orders'], ['quality_lead', '/wrenches'], ['advisor', '/sign-offs'], ['administrator', '/people'],
] as const)('sends a %s to %s first', (role, screen) => {
  expect(firstScreenFor(role)).toBe(screen)
})

it('names the first screen of every role among its words', () => {
  for (const role of roles) expect(navigationFor(role).map(({ to }) => to)).toContain(firstScreenFor(role))
})

it('shows people to administrators only', () => {
  expect(roles.filter(role => navigationFor(role).some(({ to }) => to === '/people'))).toEqual(['administrator'])
})

it.each([
  ['/sign-offs?verdict=low', '/sign-offs?verdict=low'],
  ['//elsewhere.example', '/'],
  ['/\\elsewhere.example', '/'],
  ['https://elsewhere.example', '/'],
  ['/sign-in?to=/sign-in', '/'],
  [undefined, '/'],
  [['/a', '/b'], '/'],
])('returns from sign-in: %o to %s', (to, address) => {
  expect(returnAddress(to)).toBe(address)
})

it('remembers where one was, whole', () => {
  const address = signInAddress('/sign-offs?verdict=low&q=a b')
  expect(new URL(address, 'http://here').searchParams.get('to')).toBe('/sign-offs?verdict=low&q=a b')
  expect(signInAddress('/')).toBe('/sign-in')
})

it.each([['/sign-offs/1?x=2', 'Sign-offs'], ['/sign-offs', 'Sign-offs'], ['/sign-offset', null], ['/me', null]])('calls %s %s', (address, name) => {
  expect(nameOfAddress(address)).toBe(name)
})
