import type { Stage } from '#shared/torque/stages'
import { conditionOf } from '#shared/torque/preparation'

export interface CautionedJoint {
  component: string
  application: string
  stages: readonly Pick<Stage, 'kind'>[]
  threadCondition: string | null
  preparation: readonly { code: string, text: string }[]
  leftHand: boolean
  oneTimeUse: boolean
  /** The spec's own caution. */
  caution: string | null
}

const coolant = /\bcoolant|cooling|\bwater pump|thermostat|radiator|heater (?:core|hose)|expansion tank|water (?:outlet|inlet|manifold)/i
const electrical = /starter|alternator|generator|battery|\bground strap|fuel (?:pump|rail|injector)|belt tensioner|\btensioner/i
const stored = /airbag|\bsrs\b|high[\s-]voltage|inverter|traction (?:battery|motor)/i
const wheel = /wheel (?:nut|bolt|stud|lug)|\blug nut|wheels? to (?:hub|drum)/i

/**
 * The cautions of a joint where they bite: by component, thread and the stage in hand, the spec's own first.
 * Source: public garage guides and manufacturers' manuals (hot coolant, blind holes, dry threads, wheel nuts);
 * battery [memory]. What governs is always said last.
 */
export function cautionsFor(joint: CautionedJoint, stage: Stage['kind'] | null): string[] {
  const words = `${joint.component} ${joint.application}`
  const condition = conditionOf(joint.threadCondition)
  const blind = joint.preparation.some(({ code, text }) => /blind/i.test(`${code} ${text}`))
  const angled = joint.stages.some(({ kind }) => kind === 'angle')
  const found: (string | false | null)[] = [
    joint.caution,
    stage === 'angle' && 'An angle is turned by gauge or marks, not by a torque setting. A bolt past it is never tightened again.',
    joint.leftHand && 'Left-hand thread: tighten anticlockwise.',
    coolant.test(words) && 'Hot coolant is under pressure: let it cool, cover the cap, open it in steps, keep your face away. Fans may start by themselves.',
    stored.test(words) && 'Airbags and high-voltage parts stay live after switching off: trained people only, wait as the maker says, measure before touching.',
    electrical.test(words) && 'Battery: negative off first, on last. Wait for the run-down times in the service information.',
    angled && stage !== 'angle' && 'Tightened by angle: used bolts only where the maker allows it.',
    joint.oneTimeUse && 'New bolts each time: these are not used twice.',
    blind && 'Liquid in a blind hole can crack the casting and fakes the torque: blow it out dry.',
    condition === 'dry' && 'Threads are specified dry: oil on them over-tightens the bolt.',
    condition === 'thread_locker' && 'Thread locker needs its time to cure, about 24 hours, and spoils a later torque check.',
    wheel.test(words) && 'Check wheel nuts again after about 80 km (50 miles).',
    'The maker’s service information and local rules govern.',
  ]
  return found.filter(text => typeof text === 'string')
}
