import { conditionOf } from '#shared/torque/preparation'
import type { SecondCheckMethod } from '#shared/types/words'
import { secondCheckMethods } from '#shared/types/words'

/** What of a joint decides how it may be checked. */
export interface CheckedJoint {
  threadCondition: string | null
  stages: readonly { kind: string }[]
  /** Preparation steps that the signer confirmed. */
  confirmed: readonly string[]
}

/** Why a joint cannot be checked this way, or null. Sources: TB 43-0218 (thread locker); angle joints: common practice, no source. */
export function whyNot(method: SecondCheckMethod, joint: CheckedJoint): string | null {
  if (method === 'witness') return null
  if (joint.stages.some(stage => stage.kind === 'angle')) return 'A joint tightened by angle can only be witnessed: turning it again would ruin it.'
  if (conditionOf(joint.threadCondition) === 'thread_locker' || joint.confirmed.includes('thread_locker')) {
    return 'Thread locker bonds the threads: turning the bolt again breaks it and tells nothing.'
  }
  return null
}

/** Every method with whether this joint allows it. */
export const methodsFor = (joint: CheckedJoint) => secondCheckMethods.map((method) => {
  const why = whyNot(method, joint)
  return { method, allowed: why === null, why }
})
