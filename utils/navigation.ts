import type { Role } from '#shared/types/roles'

interface Destination {
  to: string
  label: string
  /** Absent: everybody. */
  roles?: readonly Role[]
}

const destinations: readonly Destination[] = [
  { to: '/bay', label: 'Bays', roles: ['technician', 'foreman'] },
  { to: '/repair-orders', label: 'Repair orders' },
  { to: '/sign-offs', label: 'Sign-offs' },
  { to: '/torque-specs', label: 'Specs' },
  { to: '/wrenches', label: 'Wrench crib' },
  { to: '/second-checks', label: 'Second checks', roles: ['technician', 'foreman'] },
  { to: '/converter', label: 'Converter' },
  { to: '/people', label: 'People', roles: ['administrator'] },
]

/** The words on top for a role. Comfort only: each page's data is refused by the server. */
export function navigationFor(role: Role): { to: string, label: string }[] {
  return destinations
    .filter(({ roles }) => !roles || roles.includes(role))
    .map(({ to, label }) => ({ to, label }))
}

const firstScreens: Record<Role, string> = {
  technician: '/bay',
  foreman: '/repair-orders',
  quality_lead: '/wrenches',
  advisor: '/sign-offs',
  administrator: '/people',
}

/** The screen a role begins the day with. */
export const firstScreenFor = (role: Role): string => firstScreens[role]

/** The sign-in page that leads back to an address of ours. */
export const signInAddress = (from: string): string => from === '/' ? '/sign-in' : `/sign-in?to=${encodeURIComponent(from)}`

/** Where one goes after sign-in: the address remembered, if it is one of ours, else the first page. */
export function returnAddress(to: unknown): string {
  return typeof to === 'string' && /^\/(?![/\\])/.test(to) && !to.startsWith('/sign-in') ? to : '/'
}

/** What an address of ours is called, such as "Sign-offs" for one of them; null where it has no name. */
export function nameOfAddress(address: string): string | null {
  return destinations.find(({ to }) => address.startsWith(to) && /^([/?#]|$)/.test(address.slice(to.length)))?.label ?? null
}
