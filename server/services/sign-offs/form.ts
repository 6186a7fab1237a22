import type { ReadingBody, SignOffBody } from '#shared/schemas/sign-offs'
import type { Issue } from '#shared/schemas/errors'
import type { Stage } from '#shared/torque/stages'
import { adapterFactor } from '#shared/torque/adapter'
import { invalid, refused } from '../../refusal'

/** A reading whose value and unit suit its stage. */
export type SuitedReading = ReadingBody & { counts: boolean }

/** The same position, stage and attempt twice says two things at once. @throws Refusal 400 */
export function refuseDoubles(readings: readonly ReadingBody[]): void {
  const seen = new Set<string>()
  const issues = readings.flatMap(({ position, stage, attempt }, index) => {
    const place = `${position}/${stage}/${attempt}`
    if (!seen.has(place)) {
      seen.add(place)
      return []
    }
    return [{ path: `readings.${index}.attempt`, message: `Position ${position}, stage ${stage}, attempt ${attempt} is here twice.`, code: 'custom' }]
  })
  if (issues.length > 0) throw invalid(issues)
}

/** An adapter folded back past the grip gives no torque at all. @throws Refusal 400 */
export function refuseImpossibleAdapter({ adapter, multiplierRatio }: Pick<SignOffBody, 'adapter' | 'multiplierRatio'>): void {
  try {
    adapterFactor(adapter, multiplierRatio)
  } catch (error) {
    if (!(error instanceof RangeError)) throw error
    throw invalid([{ path: 'adapter', message: error.message, code: 'custom' }])
  }
}

/**
 * Holds each reading against the group's positions and stages, and marks the attempt that counts: the last.
 * @throws Refusal 422 `position_unknown`, `stage_unknown`; 400 when a value is missing or its unit is not the stage's
 */
export function suitReadings(readings: readonly ReadingBody[], boltCount: number, stages: readonly Stage[]): SuitedReading[] {
  readings.forEach(({ position }, index) => {
    if (position > boltCount) throw refused('position_unknown', `This group has positions 1 to ${boltCount}.`, `readings.${index}.position`)
  })
  readings.forEach(({ stage }, index) => {
    if (stage > stages.length) throw refused('stage_unknown', `This group has stages 1 to ${stages.length}.`, `readings.${index}.stage`)
  })
  const issues = readings.flatMap((reading, index) => issueOf(reading, index, stages))
  if (issues.length > 0) throw invalid(issues)
  const last = new Map<string, number>()
  for (const { position, stage, attempt } of readings) {
    const place = `${position}/${stage}`
    last.set(place, Math.max(attempt, last.get(place) ?? 0))
  }
  return readings.map(reading => ({ ...reading, counts: last.get(`${reading.position}/${reading.stage}`) === reading.attempt }))
}

function issueOf(reading: ReadingBody, index: number, stages: readonly Stage[]): Issue[] {
  const kind = stages[reading.stage - 1]?.kind
  const at = (field: string, message: string) => [{ path: `readings.${index}.${field}`, message, code: 'custom' }]
  if (reading.value === undefined || reading.unit === undefined) {
    if (kind === 'snug' && reading.value === undefined && reading.unit === undefined) return []
    return at(reading.value === undefined ? 'value' : 'unit', 'This is needed.')
  }
  if (kind === 'angle' && reading.unit !== 'deg') return at('unit', 'An angle stage is in degrees: deg.')
  if (kind !== 'angle' && reading.unit === 'deg') return at('unit', 'This stage is a torque, not an angle.')
  return []
}
