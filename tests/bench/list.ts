import pg from 'pg'
import { measure, row } from './measure'
import type { Call } from './session'

/** The newest fifty sign-offs by the API, against the same rows by plain SQL through pg. */
export async function benchList(call: Call, databaseUrl: string): Promise<string[]> {
  const pool = new pg.Pool({ connectionString: databaseUrl, max: 10 })
  try {
    const { rows } = await pool.query<{ shop_id: string }>('SELECT shop_id FROM sign_offs LIMIT 1')
    const shopId = rows[0]?.shop_id
    const sql = `SELECT s.*, (SELECT json_agg(r) FROM sign_off_readings r WHERE r.sign_off_id = s.id AND r.counts) AS readings
      FROM sign_offs s WHERE s.shop_id = $1 ORDER BY s.signed_at DESC, s.id DESC LIMIT 50`
    const bare = await measure(async () => {
      await pool.query(sql, [shopId])
    })
    const api = await measure(async () => {
      await call('GET', '/sign-offs?sort=-signedAt&limit=50')
    })
    return [row('50 sign-offs, plain SQL through pg', bare), row('50 sign-offs, GET /api/sign-offs', api, bare)]
  } finally {
    await pool.end()
  }
}
