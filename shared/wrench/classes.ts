import type { WrenchKind } from '../types/words'

/** Types and classes of hand torque tools. Source: ISO 6789-1:2017 [memory]. */
export const toolClasses = [
  'I-A', 'I-B', 'I-C', 'I-D', 'I-E', 'II-A', 'II-B', 'II-C', 'II-D', 'II-E', 'II-F', 'II-G',
] as const

export type ToolClass = typeof toolClasses[number]

/** The wrench's class; without one a setting wrench counts as II-A, an indicating one as I-B. Source: own rule. */
export function classOf(wrench: { kind: WrenchKind, toolClass?: ToolClass | null }): ToolClass {
  return wrench.toolClass ?? (wrench.kind === 'setting' ? 'II-A' : 'I-B')
}

const fourPercentAboveTen: readonly ToolClass[] = ['I-B', 'I-C', 'I-E', 'II-A', 'II-B', 'II-C']

/**
 * Maximum permissible relative deviation, percent. The split at 10 N·m is on the largest torque of the tool (`maxNm`),
 * not on the point tested. Source: ISO 6789-1:2017 cl. 5.1.5 [memory]; the split for II-A from a public tool manual.
 */
export function permissiblePercent(toolClass: ToolClass, maxNm: number): number {
  return maxNm > 10 && fourPercentAboveTen.includes(toolClass) ? 4 : 6
}

/** Readings to take at each test point. Source: ISO 6789-1:2017 [memory]. */
export function readingsPerPoint(toolClass: ToolClass): number {
  return toolClass === 'II-C' || toolClass === 'II-F' ? 10 : 5
}
