import type { PreparationStep } from '#shared/schemas/torque-specs'
import type { SignOffBody } from '#shared/schemas/sign-offs'
import type { Stage } from '#shared/torque/stages'
import type { ExceptionCode, RevisionStatus } from '#shared/types/words'
import { type Refusal, refused } from '../../refusal'
import { contradictingSteps, type Evaluation, isOut } from './evaluate'

const MINUTE = 60_000
const AHEAD_MS = 2 * MINUTE
const LATE_MS = 60 * MINUTE

/** All that the rules of a sign-off look at. */
export interface SignOffCase {
  body: Pick<SignOffBody, 'signedAt' | 'tightenedAt' | 'capturedOffline' | 'prep' | 'prepReason' | 'deviationReason'>
  now: Date
  openedAt: Date
  revisionStatus: RevisionStatus
  threadCondition: string | null
  preparation: readonly PreparationStep[]
  stages: readonly Stage[]
  wrench: { kind: 'setting' | 'indicating', fit: boolean, reasons: { code: string, text: string, hard: boolean }[] }
  unfitWrench: 'refuse' | 'exception'
  evaluation: Evaluation
}

/** A rule's answer: an exception to keep, a refusal to give, or nothing. */
type Ruling = { exception: ExceptionCode } | { refusal: Refusal } | null

const exception = (code: ExceptionCode): Ruling => ({ exception: code })
const refusal = (...args: Parameters<typeof refused>): Ruling => ({ refusal: refused(...args) })

/** A device that was offline could not know: what is refused live is kept with its exception. */
const known = (offline: boolean, code: ExceptionCode, ...args: Parameters<typeof refused>): Ruling =>
  offline ? exception(code) : refusal(...args)

function clock({ body, now, openedAt }: SignOffCase): Ruling {
  const signedAt = new Date(body.signedAt)
  if (signedAt.getTime() > now.getTime() + AHEAD_MS) {
    return known(body.capturedOffline, 'clock_off', 'signed_at', 'This time is in the future. Check the device\'s clock.', 'signedAt')
  }
  if (signedAt < openedAt) {
    return known(body.capturedOffline, 'clock_off', 'signed_at', 'This is before the repair order was opened. Check the device\'s clock.', 'signedAt')
  }
  return null
}

function late({ body }: SignOffCase): Ruling {
  if (body.tightenedAt === undefined) return null
  const early = new Date(body.signedAt).getTime() - new Date(body.tightenedAt).getTime()
  if (early < 0) return refusal('tightened_at', 'It cannot have been tightened after it was signed.', 'tightenedAt')
  return early > LATE_MS ? exception('late_entry') : null
}

function spec({ body, revisionStatus }: SignOffCase): Ruling {
  if (revisionStatus !== 'withdrawn') return null
  return known(body.capturedOffline, 'spec_withdrawn', 'spec_withdrawn', 'This spec was withdrawn. Put the joint on the order again by its valid revision.', 'fastenerGroupId')
}

function requiredSteps({ body, preparation }: SignOffCase): Ruling {
  const missing = preparation.filter(step => step.required && body.prep[step.code] !== true)
  if (missing.length === 0) return null
  const issues = missing.map(step => ({ path: `prep.${step.code}`, message: `Confirm first: ${step.text}.`, code: 'preparation' }))
  return refusal('preparation', `Not confirmed: ${missing.map(step => step.text).join('; ')}.`, undefined, { issues })
}

function contradiction({ body, threadCondition }: SignOffCase): Ruling {
  const steps = contradictingSteps(threadCondition, body.prep)
  if (steps.length === 0) return null
  if (body.prepReason !== undefined) return exception('preparation_contradicts')
  return refusal('preparation', `The spec says "${threadCondition}": ${steps.join(', ').replaceAll('_', ' ')} contradicts it. Give the reason.`, 'prepReason')
}

function fitWrench({ body, wrench, unfitWrench }: SignOffCase): Ruling {
  if (wrench.fit) return null
  if (unfitWrench === 'exception') return exception('wrench_unfit')
  const hard = wrench.reasons.filter(reason => reason.hard)
  return known(body.capturedOffline, 'wrench_unfit', 'wrench_unfit', `This wrench does not fit: ${hard.map(reason => reason.text).join(' ')}`, 'wrenchId', { reasons: hard })
}

function band({ body, wrench, evaluation }: SignOffCase): Ruling {
  const out = evaluation.readings.find(reading => reading.counts && reading.nm !== null && isOut(reading.verdict))
  if (!out) return null
  const code = wrench.kind === 'setting' ? 'setting_out_of_band' : 'out_of_band'
  if (body.deviationReason !== undefined) return exception(code)
  const index = evaluation.readings.indexOf(out)
  return refusal(code, wrench.kind === 'setting'
    ? `This setting gives ${out.verdict === 'low' ? 'less' : 'more'} than the band allows. Set the wrench anew, or say why it stays.`
    : `Position ${out.position} is ${out.verdict === 'low' ? 'below' : 'above'} the band. Tighten it as it should be, or say why it stays.`, `readings.${index}.value`)
}

function angleOut({ body, evaluation }: SignOffCase): Ruling {
  const out = evaluation.readings.find(reading => reading.counts && reading.unit === 'deg' && isOut(reading.verdict))
  if (!out) return null
  if (body.deviationReason !== undefined) return exception('out_of_band')
  return refusal('out_of_band', `Position ${out.position} was turned outside the angle's tolerance. Say why it stays.`, `readings.${evaluation.readings.indexOf(out)}.value`)
}

/** Past an angle stage a bolt is never retightened: a new bolt, and the reason, unless the maker says otherwise. */
function angleAgain({ body, stages, evaluation }: SignOffCase): Ruling {
  const index = evaluation.readings.findIndex(reading => reading.attempt > 1 && stages[reading.stage - 1]?.kind === 'angle')
  if (index < 0) return null
  if (body.deviationReason !== undefined) return exception('angle_retightened')
  return refusal('angle_retightened', 'A bolt is not turned by angle twice: fit a new bolt and say so, or say what the maker allows.', `readings.${index}.attempt`)
}

const rules = [clock, late, spec, requiredSteps, contradiction, fitWrench, angleAgain, band, angleOut]

/**
 * The rules of signing, in order. @returns the exceptions that the record carries
 * @throws Refusal 422 of the first rule that refuses
 */
export function ruleOn(signOff: SignOffCase): ExceptionCode[] {
  const exceptions = new Set<ExceptionCode>()
  for (const rule of rules) {
    const ruling = rule(signOff)
    if (ruling && 'refusal' in ruling) throw ruling.refusal
    if (ruling) exceptions.add(ruling.exception)
  }
  return [...exceptions]
}
