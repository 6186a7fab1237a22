import type * as z from 'zod/mini'
import type { Issue } from '#shared/schemas/errors'
import { sayIssue } from '#shared/schemas/messages'
import { parseQuantity } from '#shared/torque/quantity'
import type { Quantity, TorqueUnit } from '#shared/torque/units'
import { ApiError } from './api-error'

/** What a form says, and what in it could not be read at all. */
export interface FormReading {
  value: unknown
  issues: Issue[]
}

const isAt = (issue: Issue, path: string) => issue.path === path || issue.path.startsWith(`${path}.`)

/** What is wrong at a path or within it; null when all is well there. */
export function issueAt(issues: readonly Issue[], path: string): string | null {
  return issues.find(issue => isAt(issue, path))?.message ?? null
}

/** Issues that stand at none of the paths, which a form therefore has to say beside its button. */
export function issuesElsewhere(issues: readonly Issue[], paths: readonly string[]): Issue[] {
  return issues.filter(issue => !paths.some(path => isAt(issue, path)))
}

/**
 * Holds what a form says against the schema the route uses. What could not be read is said first; the schema's own
 * word on the same place is then left out.
 * @throws ApiError 400 `invalid` with every issue
 */
export function readForm<S extends z.ZodMiniType>(schema: S, { value, issues }: FormReading): z.output<S> {
  const result = schema.safeParse(value, { error: sayIssue })
  if (result.success && issues.length === 0) return result.data
  const found = (result.error?.issues ?? []).map(({ path, message }) => ({ path: path.join('.'), message }))
  const all = [...issues, ...found.filter(({ path }) => !issues.some(issue => isAt(issue, path) || isAt({ path, message: '' }, issue.path)))]
  throw new ApiError(400, all[0]?.message ?? 'The form is not complete.', { code: 'invalid', issues: all })
}

/** Collects what a form's fields say: texts, numbers and torques, each with its own words when it cannot be read. */
export class FieldReader {
  readonly issues: Issue[] = []

  /** The text without space around it, or undefined when empty. */
  text(text: string): string | undefined {
    return text.trim() || undefined
  }

  /** A number as people write it, with a point or a comma; undefined when empty. */
  number(path: string, text: string): number | undefined {
    const typed = text.trim().replace(',', '.')
    if (typed === '') return undefined
    const value = Number(typed)
    if (Number.isFinite(value)) return value
    this.issues.push({ path, message: 'Write a number, such as 10.' })
    return undefined
  }

  /** A torque; undefined when nothing is typed. */
  quantity(path: string, entry: { text: string, value: number | null, unit: TorqueUnit }): Quantity | undefined {
    if (entry.text.trim() === '') return undefined
    if (entry.value !== null) return { value: entry.value, unit: entry.unit }
    const parsed = parseQuantity(entry.text, entry.unit)
    this.issues.push({ path, message: parsed.ok ? 'Write the torque again.' : parsed.message })
    return undefined
  }
}
