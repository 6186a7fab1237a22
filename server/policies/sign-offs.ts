import { everyone, no, policy, yes } from './policy'

const hands = ['technician', 'foreman'] as const

export const readSignOffs = policy('sign_offs.read', everyone)
export const recordSignOff = policy('sign_offs.create', hands)
/** Only the signer corrects; anyone else's word is a void or a second check. */
export const correctSignOff = policy<{ technicianId: string }>('sign_offs.correct', hands, (actor, signOff) =>
  signOff.technicianId === actor.id ? yes : no('role', 'Only who signed it can correct it.'))
export const voidSignOff = policy('sign_offs.void', ['foreman'])
export const readGroups = policy('fastener_groups.read', everyone)
export const disturbGroup = policy('fastener_groups.disturb', hands)

/** Nobody decides about their own joint. */
const notTheSigner = (actor: { id: string }, { signerIds }: { signerIds: readonly string[] }) =>
  signerIds.includes(actor.id) ? no('same_person', 'You signed this joint: somebody else has to decide.') : yes

export const concedeGroup = policy<{ signerIds: readonly string[] }>('fastener_groups.concede', ['foreman'], notTheSigner)
export const markNotDisturbed = policy<{ signerIds: readonly string[] }>('fastener_groups.mark_not_disturbed', ['foreman'], notTheSigner)

export const readSecondChecks = policy('second_checks.read', everyone)
/** Two people: the signer cannot be his own second. */
export const recordSecondCheck = policy<{ technicianId: string }>('second_checks.create', hands, (actor, signOff) =>
  signOff.technicianId === actor.id ? no('same_person', 'You signed this joint: the second check is somebody else\'s.') : yes)
export const readLog = policy('log.read', ['quality_lead', 'administrator'])
