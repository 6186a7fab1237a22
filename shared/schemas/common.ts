/** Building blocks of every schema: identifiers, times, texts, quantities, lists. */
import * as z from 'zod/mini'
import { torqueUnits } from '../torque/units'

/** The largest torque figure accepted anywhere, in whatever unit: far above any shop joint, far below overflow. */
export const MAX_TORQUE_VALUE = 1_000_000
export const MAX_PAGE = 200

/** The database cannot keep the character zero in a text. */
const storable = z.refine<string>(value => !value.includes('\0'), { error: 'There is a character in it that cannot be kept.' })
/** A text of 1 to `max` characters, trimmed at both ends. */
export const text = (max: number) => z.string().check(z.trim(), z.minLength(1), z.maxLength(max), storable)

/** A text that may be longer: notes, complaints, reasons. */
export const longText = text(2000)
/** Why somebody decided something: a word is not a reason. */
export const reason = z.string().check(z.trim(), z.minLength(3), z.maxLength(2000), storable)

/** Any UUID, upper or lower case. */
export const uuid = z.string().check(
  z.regex(/^[0-9a-f]{8}-[0-9a-f]{4}-[0-9a-f]{4}-[0-9a-f]{4}-[0-9a-f]{12}$/i),
  z.toLowerCase(),
)

/** A calendar day, `YYYY-MM-DD`, that exists. */
export const day = z.iso.date()
/** A moment, ISO 8601 in UTC with `Z`. */
export const moment = z.iso.datetime()
/** A six-digit personal PIN. */
export const pin = z.string().check(z.regex(/^\d{6}$/))
export const positiveNumber = z.number().check(z.gt(0), z.lte(MAX_TORQUE_VALUE))
export const positiveInteger = z.int().check(z.gt(0), z.lte(1_000_000))

export const torqueUnit = z.enum(torqueUnits)
/** A torque as typed or printed: value and unit, kept verbatim. */
export const quantity = z.strictObject({ value: positiveNumber, unit: torqueUnit })
/** An answered torque: as entered, with its N·m at full precision beside it. */
export const answeredQuantity = z.strictObject({ value: z.number(), unit: torqueUnit, nm: z.number() })

export const idParams = z.strictObject({ id: uuid })

/** Query of every list: keyset pagination and a sort key from the list's own allow-list. */
export const pageQuery = <Keys extends readonly [string, ...string[]]>(keys: Keys) => ({
  sort: z.optional(z.enum([...keys, ...keys.map(key => `-${key}`)])),
  limit: z._default(z.coerce.number().check(z.int(), z.gte(1), z.lte(MAX_PAGE)), 50),
  cursor: z.optional(z.string().check(z.maxLength(500))),
})

/** Answer of every list. */
export const listOf = <Item extends z.ZodMiniType>(item: Item) => z.strictObject({
  items: z.array(item),
  nextCursor: z.nullable(z.string()),
})

/** What the asking person may do with a record, by action name. */
export const can = z.record(z.string(), z.boolean())
/** A person as named beside a record. */
export const personBrief = z.strictObject({ id: uuid, name: z.string() })
