/** Who may act in a shop. */
export const roles = ['technician', 'foreman', 'quality_lead', 'advisor', 'administrator'] as const
export type Role = typeof roles[number]

/** The role in words, for screens and tables. */
export const roleNames: Record<Role, string> = {
  technician: 'Technician',
  foreman: 'Foreman',
  quality_lead: 'Quality lead',
  advisor: 'Service advisor',
  administrator: 'Administrator',
}
