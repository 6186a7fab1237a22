import { randomBytes } from 'node:crypto'
import pg from 'pg'
import { uuidv7 } from '#shared/ids/uuid'
import { measure, row } from './measure'
import type { Call } from './session'

interface Made {
  id: string
}

/** A group with many positions, so that each run signs one that nobody has signed. */
async function buildGroup(call: Call, specRevisionId: string, vehicleId: string): Promise<string> {
  const order = await call<Made>('POST', '/repair-orders', { number: `bench-${randomBytes(6).toString('hex')}`, vehicleId })
  return (await call<Made>('POST', `/repair-orders/${order.id}/fastener-groups`, { specRevisionId, boltCount: 4 })).id
}

/** One sign-off request, against the bare INSERTs that it makes, each committed. */
export async function benchSignOff(calls: { foreman: Call, quality: Call, technician: Call }, databaseUrl: string, runs = 400): Promise<string[]> {
  const vehicle = await calls.foreman<Made>('POST', '/vehicles', { make: 'Bench', model: 'Van' })
  const spec = await calls.foreman<{ id: string, revision: { id: string } }>('POST', '/torque-specs', {
    component: 'Bench joint', application: 'Bench', target: { value: 41, unit: 'N.m' }, source: { title: 'Invented manual' },
  })
  await calls.foreman('POST', `/torque-specs/${spec.id}/approve`, {})
  const wrench = await calls.quality<Made>('POST', '/wrenches', {
    assetTag: `B-${randomBytes(4).toString('hex')}`, serial: 'bench', kind: 'setting', range: { min: 10, max: 60, unit: 'N.m' }, intervalMonths: 12,
  })
  const point = (target: number) => ({ target: { value: target, unit: 'N.m' }, readings: Array.from({ length: 5 }, () => ({ indicated: target, reference: target * 1.001 })) })
  await calls.quality('POST', `/wrenches/${wrench.id}/calibrations`, {
    performedOn: new Date().toISOString().slice(0, 10), laboratory: 'Bench', certificateNumber: randomBytes(4).toString('hex'),
    reference: { uncertaintyPercent: 0.5 }, asFound: [point(12), point(36), point(60)], adjusted: false,
  })
  const groups: string[] = []
  for (let index = 0; index < runs; index += 1) groups.push(await buildGroup(calls.foreman, spec.revision.id, vehicle.id))

  const pool = new pg.Pool({ connectionString: databaseUrl, max: 10 })
  try {
    let next = 0
    const start = performance.now()
    const times: number[] = []
    await Promise.all(Array.from({ length: 4 }, async () => {
      for (let groupId = groups[next]; groupId !== undefined; groupId = groups[next]) {
        next += 1
        const began = performance.now()
        await calls.technician('PUT', `/sign-offs/${uuidv7()}`, {
          fastenerGroupId: groupId, wrenchId: wrench.id, prep: {}, signedAt: new Date().toISOString(), capturedOffline: false, pin: '408152',
          readings: [1, 2, 3, 4].map(position => ({ position, stage: 1, value: 41, unit: 'N.m' })),
        })
        times.push(performance.now() - began)
      }
    }))
    const sorted = times.toSorted((a, b) => a - b)
    const at = (share: number) => sorted[Math.floor(sorted.length * share)] ?? 0
    const api = { perSecond: runs / ((performance.now() - start) / 1000), p50: at(0.5), p99: at(0.99) }
    const bare = await measure(await bareInserts(pool), { lanes: 4, seconds: 4 })
    return [row('sign-off of 4 bolts, its bare INSERTs', bare), row('sign-off of 4 bolts, PUT /api/sign-offs/:id', api, bare)]
  } finally {
    await pool.end()
  }
}

/** The rows that one sign-off adds, under new keys: sign-off, its readings and log entry, committed together. */
async function bareInserts(pool: pg.Pool): Promise<() => Promise<void>> {
  const one = async (sql: string, values: unknown[] = []) => (await pool.query<{ row: Record<string, unknown> }>(sql, values)).rows.map(item => item.row)
  const [signOff] = await one('SELECT to_jsonb(s) AS row FROM sign_offs s ORDER BY received_at DESC LIMIT 1')
  const readings = await one('SELECT to_jsonb(r) AS row FROM sign_off_readings r WHERE sign_off_id = $1', [signOff?.id])
  const [entry] = await one('SELECT to_jsonb(l) AS row FROM log_entries l ORDER BY at DESC LIMIT 1')
  let last = 1_000_000_000
  return async () => {
    last += 1
    const sequence = last
    const id = uuidv7()
    const client = await pool.connect()
    try {
      await client.query('BEGIN')
      await client.query('INSERT INTO sign_offs SELECT * FROM jsonb_populate_record(null::sign_offs, $1)', [{ ...signOff, id, supersedes_id: null, log_sequence: sequence }])
      await client.query('INSERT INTO sign_off_readings SELECT * FROM jsonb_populate_recordset(null::sign_off_readings, $1)', [JSON.stringify(readings.map(reading => ({ ...reading, sign_off_id: id })))])
      await client.query('INSERT INTO log_entries SELECT * FROM jsonb_populate_record(null::log_entries, $1)', [{ ...entry, sequence, hash: randomBytes(32).toString('hex') }])
      await client.query('COMMIT')
    } finally {
      client.release()
    }
  }
}
