import pg from 'pg'

let pool: pg.Pool | undefined

/**
 * Connections apart from the main pool for counters of wrong PINs and sign-ins, which must be committed though the
 * request is refused and rolled back. Apart, so that a burst of requests can never wait for itself.
 */
export function openCounters(url: string): void {
  pool ??= new pg.Pool({ connectionString: url, max: 2, idleTimeoutMillis: 10_000 })
}

export function counters(): pg.Pool {
  if (!pool) throw new Error('The counters are not open.')
  return pool
}

export async function closeCounters(): Promise<void> {
  await pool?.end()
  pool = undefined
}
