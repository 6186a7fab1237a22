/** The words for what is wrong with a field, by the kind of issue zod reports. zod/mini brings none of its own. */
import type * as core from 'zod/v4/core'

const sizes = (origin: string, amount: number | bigint, word: 'at least' | 'at most') => {
  if (origin === 'string') return `Use ${word} ${amount} characters.`
  if (origin === 'array') return `Give ${word} ${amount} entries.`
  return word === 'at least' ? `Must be ${amount} or more.` : `Must be ${amount} or less.`
}

const formats: Record<string, string> = {
  date: 'Give a date that exists, as YYYY-MM-DD.',
  datetime: 'Give a time in UTC, as 2026-12-01T08:30:00Z.',
  email: 'Give an e-mail address.',
  regex: 'This is not in the expected form.',
}

/**
 * Says in plain words what is wrong with a value. Pass it as `{ error: sayIssue }` when parsing.
 * @returns the sentence shown beside the field
 */
export function sayIssue(issue: core.$ZodRawIssue): string {
  switch (issue.code) {
    case 'invalid_type':
      if (issue.input === undefined) return 'This is needed.'
      return `Expected ${issue.expected === 'int' ? 'a whole number' : `a value of type ${issue.expected}`}.`
    case 'too_small':
      if (issue.origin === 'string' && Number(issue.minimum) <= 1) return 'This is needed.'
      if (issue.inclusive === false) return `Must be more than ${issue.minimum}.`
      return sizes(issue.origin, issue.minimum, 'at least')
    case 'too_big':
      if (issue.inclusive === false) return `Must be less than ${issue.maximum}.`
      return sizes(issue.origin, issue.maximum, 'at most')
    case 'invalid_format':
      return formats[issue.format] ?? 'This is not in the expected form.'
    case 'invalid_value':
      return `Choose one of: ${issue.values.map(String).join(', ')}.`
    case 'unrecognized_keys':
      return `Unknown field: ${issue.keys.join(', ')}.`
    case 'not_multiple_of':
      return `Must be a multiple of ${issue.divisor}.`
    case 'custom':
      return issue.message ?? 'This is not accepted.'
    default:
      return 'This is not in the expected form.'
  }
}
