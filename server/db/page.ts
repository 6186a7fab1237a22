import { QueryTypes } from 'sequelize'
import { invalid } from '../refusal'
import { database } from './index'

/** A column a list can be sorted by: its SQL expression, never null and served by an index, and its type. */
export interface SortKey {
  sql: string
  type: 'text' | 'timestamptz' | 'date' | 'double precision' | 'integer'
}

export interface PageRequest {
  sort?: string | undefined
  limit: number
  cursor?: string | undefined
}

export interface Page<Row> {
  items: Row[]
  nextCursor: string | null
}

/** Conditions of a list, each with its values bound. */
export class Conditions {
  readonly bind: unknown[] = []
  private readonly parts: string[] = []

  /** Adds a condition; each `?` in it takes one value. */
  add(sql: string, ...values: unknown[]): this {
    let next = 0
    this.parts.push(sql.replaceAll('?', () => {
      this.bind.push(values[next])
      next += 1
      return `$${this.bind.length}`
    }))
    return this
  }

  /** Adds a condition only where there is something to ask for. */
  when<Value>(value: Value | undefined | null, sql: string, ...values: unknown[]): this {
    return value === undefined || value === null || value === '' ? this : this.add(sql, ...(values.length > 0 ? values : [value]))
  }

  get sql(): string {
    return this.parts.map(part => `(${part})`).join(' AND ')
  }
}

/** A LIKE pattern for "contains", with the wildcards people type taken literally. */
export const contains = (text: string) => `%${text.trim().replace(/[\\%_]/g, '\\$&')}%`

const encode = (sort: string, key: string, id: string) => Buffer.from(JSON.stringify([sort, key, id])).toString('base64url')

function decode(cursor: string, sort: string): { key: string, id: string } {
  const wrong = invalid([{ path: 'cursor', message: 'This is not a cursor of this list.' }])
  try {
    const parsed: unknown = JSON.parse(Buffer.from(cursor, 'base64url').toString('utf8'))
    if (!Array.isArray(parsed)) throw wrong
    const [of, key, id] = parsed
    if (of !== sort || typeof key !== 'string' || typeof id !== 'string' || !/^[0-9a-f-]{36}$/.test(id)) throw wrong
    return { key, id }
  } catch {
    throw wrong
  }
}

/**
 * One page of a list by keyset: the next page begins after the last row's key and id, at the same cost at any depth.
 * @param list.select the SQL from SELECT's columns on, without WHERE; rows need `id`
 * @param list.id the SQL of the row's id, unique, the last word on the order
 */
export async function page<Row extends object>(request: PageRequest, list: {
  select: string
  from: string
  id: string
  where: Conditions
  keys: Record<string, SortKey>
  defaultSort: string
}): Promise<Page<Row>> {
  const sort = request.sort ?? list.defaultSort
  const descending = sort.startsWith('-')
  const key = list.keys[descending ? sort.slice(1) : sort]
  if (!key) throw invalid([{ path: 'sort', message: 'This list cannot be sorted by that.' }])
  if (request.cursor !== undefined) {
    const after = decode(request.cursor, sort)
    list.where.add(`(${key.sql}, ${list.id}) ${descending ? '<' : '>'} (?::text::${key.type}, ?::uuid)`, after.key, after.id)
  }
  const direction = descending ? 'DESC' : 'ASC'
  const rows = await database().query<{ page_key: string, page_id: string } & Row>(
    `SELECT ${list.select}, (${key.sql})::text AS page_key, ${list.id} AS page_id FROM ${list.from} WHERE ${list.where.sql}
      ORDER BY ${key.sql} ${direction}, ${list.id} ${direction} LIMIT ${request.limit + 1}`,
    { bind: list.where.bind, type: QueryTypes.SELECT },
  ).catch((error: unknown) => {
    // A cursor whose key is not of the column's type was made up by the caller.
    if (request.cursor !== undefined && hasState(error, ['22P02', '22007', '22008', '22003'])) {
      throw invalid([{ path: 'cursor', message: 'This is not a cursor of this list.' }])
    }
    throw error
  })
  const items = rows.slice(0, request.limit)
  const last = items.at(-1)
  return { items, nextCursor: rows.length > request.limit && last ? encode(sort, last.page_key, last.page_id) : null }
}

function hasState(error: unknown, states: readonly string[]): boolean {
  const parent: unknown = typeof error === 'object' && error !== null && 'parent' in error ? error.parent : undefined
  return typeof parent === 'object' && parent !== null && 'code' in parent && states.includes(String(parent.code))
}
