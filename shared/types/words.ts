/** The closed lists of words that records, screens and the database share. */
export const jointClasses = ['safety', 'sealing', 'general'] as const
export type JointClass = typeof jointClasses[number]

export const specKinds = ['joint', 'general_table'] as const
export type SpecKind = typeof specKinds[number]

export const revisionStatuses = ['draft', 'approved', 'withdrawn'] as const
export type RevisionStatus = typeof revisionStatuses[number]

export const wrenchKinds = ['setting', 'indicating'] as const
export type WrenchKind = typeof wrenchKinds[number]

/** What the shop has done with a wrench; its calibration status is derived from this, its calibrations and the date. */
export const wrenchStates = ['in_use', 'quarantined', 'at_laboratory', 'lost', 'retired'] as const
export type WrenchState = typeof wrenchStates[number]

export const calibrationStatuses = [
  'valid', 'due_soon', 'overdue', 'none', 'quarantined', 'at_laboratory', 'lost', 'retired',
] as const
export type CalibrationStatus = typeof calibrationStatuses[number]

/** State of a fastener group: the first of these that holds. */
export const groupStates = [
  'not_disturbed', 'disturbed', 'open', 'in_progress', 'exception', 'pending_approval',
  'second_check_waiting', 'conceded', 'signed',
] as const
export type GroupState = typeof groupStates[number]

/** States in which a group does not hold the vehicle back. */
export const releasableStates = ['not_disturbed', 'conceded', 'signed'] as const

export const exceptionCodes = [
  'out_of_band', 'setting_out_of_band', 'preparation_contradicts', 'wrench_unfit', 'clock_off', 'late_entry',
  'spec_withdrawn', 'angle_retightened', 'not_competent',
] as const
export type ExceptionCode = typeof exceptionCodes[number]

export const secondCheckMethods = ['witness', 'setting', 'residual'] as const
export type SecondCheckMethod = typeof secondCheckMethods[number]
