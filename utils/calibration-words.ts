import { formatNumber, formatQuantity } from '#shared/torque/quantity'
import type { TorqueUnit } from '#shared/torque/units'
import type { JudgedPhase, Outcome } from './calibration-judge'
import { formatCount, formatDay } from './format'
import { deviationText, deviationWords } from './wrench-words'

function phaseSentence(name: string, phase: JudgedPhase | null, unit: TorqueUnit, limitPercent: number): string[] {
  if (!phase) return []
  const { verdict, missing, worst } = phase
  const at = formatQuantity({ value: worst.target, unit })
  const figure = deviationText(worst.deviationPercent, 2)
  const room = missing > 0 ? ` ${formatCount(missing, 'reading')} not written.` : ''
  return [verdict === 'pass'
    ? `${name} passes: farthest is ${figure} at ${at}, ± ${formatNumber(limitPercent)} % is permitted.${room}`
    : `${name} fails: ${figure} at ${at} where ± ${formatNumber(limitPercent)} % is permitted; it ${deviationWords(worst.deviationPercent, 2)}.${room}`]
}

/** What a calibration will say of the wrench, sentence by sentence, before it is saved. */
export function outcomeWords(outcome: Outcome, unit: TorqueUnit, limitPercent: number): string[] {
  const { asFound, asLeft, usable, dueOn } = outcome
  const phases = [...phaseSentence('As found', asFound, unit, limitPercent), ...phaseSentence('As left', asLeft, unit, limitPercent)]
  if (phases.length === 0) return ['It is said here as soon as there is a reading.']
  return [
    ...phases,
    ...(asFound?.verdict === 'fail' ? ['Joints tightened with it since its last good calibration need a look.'] : []),
    ...(usable === null ? ['The readings as left are still to come.'] : []),
    ...(usable === false ? ['The wrench stays in quarantine until an as left passes.'] : []),
    ...(usable && dueOn ? [`The wrench may be used, and is due again on ${formatDay(dueOn)}.`] : []),
  ]
}
