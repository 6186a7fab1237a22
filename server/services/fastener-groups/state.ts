import { worstVerdict, type Verdict } from '#shared/torque/verdict'
import { releasableStates, type ExceptionCode, type GroupState, type JointClass, type RevisionStatus } from '#shared/types/words'

/** A sign-off as the state of its group sees it. */
export interface SignOffFacts {
  id: string
  /** Its place in the log: what came later counts later, whatever the clocks said. */
  sequence: number
  technicianId: string
  technicianName: string
  signedAt: string
  verdict: Verdict | null
  exceptions: ExceptionCode[]
  voided: boolean
  superseded: boolean
  /** A second person's check has passed. */
  checked: boolean
  covers: { position: number, stage: number }[]
}

/** Everything that decides the state of a group. */
export interface GroupFacts {
  id: string
  repairOrderId: string
  name: string
  component: string
  jointClass: JointClass
  revisionStatus: RevisionStatus
  shopValue: boolean
  secondCheckRequired: boolean
  boltCount: number
  stageCount: number
  targetNm: number
  lowerNm: number
  upperNm: number
  targetValue: number | null
  targetUnit: string | null
  notDisturbed: boolean
  disturbedSequence: number | null
  concededSequence: number | null
  signOffs: SignOffFacts[]
}

/** The sign-offs that stand: neither voided nor superseded, nor undone by the joint having been opened again. */
export function standingSignOffs({ signOffs, disturbedSequence }: Pick<GroupFacts, 'signOffs' | 'disturbedSequence'>): SignOffFacts[] {
  return signOffs.filter(({ voided, superseded, sequence }) => !voided && !superseded && sequence > (disturbedSequence ?? 0))
}

const placeOf = (position: number, stage: number) => `${position}/${stage}`

/** Which standing sign-off covers each position and stage. */
export function coverage(standing: readonly SignOffFacts[]): Map<string, SignOffFacts> {
  return new Map(standing.flatMap(signOff => signOff.covers.map(({ position, stage }) => [placeOf(position, stage), signOff] as const)))
}

/** Who covers a position and stage, if anyone. */
export const coveredBy = (covered: Map<string, SignOffFacts>, position: number, stage: number) => covered.get(placeOf(position, stage))

/** What is derived from the facts of a group; nothing of it is stored. */
export interface DerivedGroup {
  state: GroupState
  standing: SignOffFacts[]
  /** Positions whose every stage is covered. */
  positionsDone: number
  verdict: Verdict | null
  exceptions: ExceptionCode[]
}

/**
 * The state of a group: the first that holds of not disturbed, disturbed, open, in progress, exception, pending
 * approval, second check waiting, conceded, signed.
 */
export function deriveGroup(facts: GroupFacts): DerivedGroup {
  const standing = standingSignOffs(facts)
  const covered = coverage(standing)
  const stages = Array.from({ length: facts.stageCount }, (_, index) => index + 1)
  const positions = Array.from({ length: facts.boltCount }, (_, index) => index + 1)
  const positionsDone = positions.filter(position => stages.every(stage => coveredBy(covered, position, stage))).length
  const withExceptions = standing.filter(signOff => signOff.exceptions.length > 0)
  const conceded = facts.concededSequence !== null
    && withExceptions.every(signOff => signOff.sequence < (facts.concededSequence ?? 0))
  const state = (): GroupState => {
    if (standing.length === 0) {
      if (facts.notDisturbed) return 'not_disturbed'
      return facts.disturbedSequence === null ? 'open' : 'disturbed'
    }
    if (positionsDone < facts.boltCount) return 'in_progress'
    if (withExceptions.length > 0 && !conceded) return 'exception'
    if (facts.revisionStatus === 'draft') return 'pending_approval'
    if (facts.secondCheckRequired && standing.some(signOff => !signOff.checked)) return 'second_check_waiting'
    return withExceptions.length > 0 ? 'conceded' : 'signed'
  }
  return {
    state: state(),
    standing,
    positionsDone,
    verdict: worstVerdict(standing.map(({ verdict }) => ({ verdict, nm: null, lowerNm: null, upperNm: null }))),
    exceptions: [...new Set(withExceptions.flatMap(signOff => signOff.exceptions))],
  }
}

/** Whether a group in this state lets the vehicle go. */
export const isReleasable = (state: GroupState) => releasableStates.some(known => known === state)
