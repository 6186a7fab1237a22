/** The one shape of every refusal. */
import * as z from 'zod/mini'

export const issue = z.object({ path: z.string(), message: z.string(), code: z.optional(z.string()) })

export const errorAnswer = z.object({
  statusCode: z.int(),
  statusMessage: z.string(),
  message: z.string(),
  data: z.looseObject({ code: z.string(), issues: z.optional(z.array(issue)) }),
})

export type Issue = z.infer<typeof issue>
export type ErrorAnswer = z.infer<typeof errorAnswer>
