import type { Role } from '#shared/types/roles'
import { roles } from '#shared/types/roles'
import type { Actor } from '../context'
import { forbidden } from '../refusal'

/** Yes, or no with a code for programs and a sentence for people. */
export type Decision = { allowed: true } | { allowed: false, code: string, message: string }

export const yes: Decision = { allowed: true }
export const no = (code: string, message: string): Decision => ({ allowed: false, code, message })

/** Who may do one thing: the roles that ever may, and what the record must allow besides. Pure: reads only what it is given. */
export interface Policy<Subject = void> {
  name: string
  roles: readonly Role[]
  when: (actor: Actor, subject: Subject) => Decision
}

/** Anyone of the shop. */
export const everyone: readonly Role[] = roles

export function policy<Subject = void>(
  name: string,
  allowed: readonly Role[],
  when: (actor: Actor, subject: Subject) => Decision = () => yes,
): Policy<Subject> {
  return { name, roles: allowed, when }
}

/** Whether a role may ever do this, whatever the record. */
export function roleMay(role: Role, { roles: allowed }: Pick<Policy, 'roles'>): Decision {
  return allowed.includes(role) ? yes : no('role', 'Your role may not do this.')
}

/** Whether this person may do this to this record. */
export function decide<Subject>(actor: Actor, asked: Policy<Subject>, subject: Subject): Decision {
  const byRole = roleMay(actor.role, asked)
  return byRole.allowed ? asked.when(actor, subject) : byRole
}

/** Throws the refusal of a policy; services call it after the rows that decide are locked. */
export function authorize<Subject>(actor: Actor, asked: Policy<Subject>, subject: Subject): void {
  const decision = decide(actor, asked, subject)
  if (!decision.allowed) throw forbidden(decision.code, decision.message)
}

/** The `can` of a record: each action by name, for the screens. */
export function canDo<Subject>(actor: Actor, subject: Subject, actions: Record<string, Policy<Subject>>): Record<string, boolean> {
  return Object.fromEntries(Object.entries(actions).map(([name, asked]) => [name, decide(actor, asked, subject).allowed]))
}
