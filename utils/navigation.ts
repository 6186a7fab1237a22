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
