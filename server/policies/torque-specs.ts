import { everyone, no, policy, yes } from './policy'

const decides = ['foreman', 'quality_lead'] as const

export const readSpecs = policy('torque_specs.read', everyone)
/** A technician drafts a spec from the manual in hand; what he drafts waits for approval. */
export const createSpec = policy('torque_specs.create', [...decides, 'technician'])
export const reviseSpec = policy('torque_specs.revise', decides)
export const withdrawSpec = policy('torque_specs.withdraw', decides)
export const importSpecs = policy('torque_specs.import', decides)

/** One's own draft only where the shop's rule allows it. */
export const approveSpec = policy<{ createdBy: string, approveOwnDraft: boolean }>('torque_specs.approve', decides,
  (actor, draft) => draft.createdBy === actor.id && !draft.approveOwnDraft
    ? no('same_person', 'You made this draft: somebody else has to approve it.')
    : yes)
