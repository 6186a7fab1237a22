import type { SpecRevisionAnswer } from '#shared/schemas/torque-specs'
import { formatQuantity } from '#shared/torque/quantity'
import { bandIssues, specLimits } from '#shared/torque/spec-rules'
import type { StageSpec } from '#shared/torque/stages'
import type { Limits, Tolerance } from '#shared/torque/tolerance'
import type { Quantity } from '#shared/torque/units'
import { quantityOf, type SpecForm } from './torque-spec-form'
import { mismatchesOf, rangeWords, type Mismatch } from './torque-spec-words'

/** What can be said of the torque while it is being typed. */
export interface LiveTorque {
  limits: Limits | null
  problem: string | null
  mismatches: Mismatch[]
}

/** The tolerance the form says so far; null for the shop's own, undefined while it is incomplete. */
function toleranceOf(form: SpecForm): Tolerance | null | undefined {
  if (form.toleranceKind === 'shop') return null
  if (form.toleranceKind === 'percent') {
    const value = Number(form.percent.replace(',', '.'))
    return value > 0 && value < 100 ? { kind: 'percent', value } : undefined
  }
  if (form.toleranceKind === 'absolute') {
    const margin = quantityOf(form.margin)
    return margin ? { kind: 'absolute', ...margin } : undefined
  }
  const [lower, upper] = [quantityOf(form.lower), quantityOf(form.upper)]
  return lower && upper ? { kind: 'limits', lower, upper } : undefined
}

/** Limits and dual-unit check of the form as it stands; silent about what is not filled in yet. */
export function liveTorque(form: SpecForm, shopPercent: number): LiveTorque {
  const target = quantityOf(form.target)
  const tolerance = toleranceOf(form)
  const [lower, upper] = [quantityOf(form.printedLower), quantityOf(form.printedUpper)]
  const mismatches = mismatchesOf({
    target,
    printed: quantityOf(form.printed),
    tolerance: tolerance ?? null,
    printedLimits: form.toleranceKind === 'limits' && lower && upper ? { lower, upper } : null,
  })
  const stages = form.stages.flatMap((stage): StageSpec[] => {
    const torque = stage.kind === 'torque' && quantityOf(stage.target)
    return torque ? [{ kind: 'torque', target: torque }] : []
  })
  const said = { target: target ?? undefined, tolerance, stages }
  if (tolerance === undefined || (!target && stages.length === 0 && tolerance?.kind !== 'limits')) {
    return { limits: null, problem: null, mismatches }
  }
  const problem = bandIssues(said)[0]?.message ?? null
  return { limits: problem ? null : specLimits(said, shopPercent), problem, mismatches }
}

export interface GoverningBand {
  value: 'target' | 'printed'
  /** What is printed, such as "20 ft·lb" or "3.5 to 4.8 kgf·m". */
  label: string
  printed: Quantity | null
  limits: Limits | null
  /** Why it cannot govern. */
  problem: string | null
}

/** The two bands between which the approver of a spec printed in two units decides: everything follows from the one that governs. */
export function governingBands(revision: SpecRevisionAnswer, shopPercent: number): GoverningBand[] {
  const { tolerance, printedLimits } = revision
  const plain = (noted: SpecRevisionAnswer['target']) => noted && { value: noted.value, unit: noted.unit }
  const band = (value: 'target' | 'printed', printed: Quantity | null, limited: Tolerance | null): GoverningBand => {
    const said = { target: printed ?? undefined, tolerance: limited }
    const problem = bandIssues(said)[0]?.message ?? null
    const range = limited?.kind === 'limits' ? rangeWords(limited.lower, limited.upper) : ''
    return {
      value, printed, problem,
      label: printed ? formatQuantity(printed) : range,
      limits: problem ? null : specLimits(said, shopPercent),
    }
  }
  return [
    band('target', plain(revision.target), tolerance),
    band('printed', plain(revision.printed), printedLimits ? { kind: 'limits', ...printedLimits } : tolerance),
  ]
}
