import { everyone, no, policy, yes } from './policy'

export const readWrenches = policy('wrenches.read', everyone)
export const createWrench = policy('wrenches.create', ['quality_lead'])
export const recordCalibration = policy('calibrations.create', ['quality_lead'])

/** The quality lead keeps the crib; whoever works with a wrench may take it out of use at once, and nothing else. */
export const updateWrench = policy<{ onlyQuarantines: boolean }>('wrenches.update', ['quality_lead', 'foreman', 'technician'], (actor, change) =>
  actor.role === 'quality_lead' || change.onlyQuarantines ? yes : no('role', 'You may put a wrench in quarantine; the rest is the quality lead\'s.'))
