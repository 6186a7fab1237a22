import type { Transaction } from 'sequelize'
import { uuidv7 } from '#shared/ids/uuid'
import type { Role } from '#shared/types/roles'
import type { Actor, Shop } from '../../context'
import { database } from '../../db'

const SEEN_EVERY_MS = 60_000

interface SessionRow {
  id: string
  seen_at: Date
  user_id: string
  name: string
  email: string
  role: Role
  shop_id: string
  shop_name: string
  time_zone: string
  default_tolerance_percent: number
  due_soon_days: number
  unfit_wrench: 'refuse' | 'exception'
  approve_own_draft: boolean
  release_own_joint: boolean
}

/** Begins a session of a person on a device. @returns the id that the sealed cookie will hold */
export async function beginSession(user: { id: string, shopId: string }, device: string, now: Date): Promise<string> {
  const id = uuidv7(now.getTime())
  await database().query(
    `INSERT INTO sessions (id, shop_id, user_id, device, created_at, seen_at) VALUES ($1, $2, $3, $4, $5, $5)`,
    { bind: [id, user.shopId, user.id, device.slice(0, 200), now] },
  )
  return id
}

/** Who a session belongs to now: role, active state and shop rules are read anew at each request. */
export async function readSession(id: string, now: Date): Promise<{ actor: Actor, shop: Shop } | null> {
  const [rows] = await database().query(
    `SELECT s.id, s.seen_at, u.id AS user_id, u.name, u.email, u.role, h.id AS shop_id, h.name AS shop_name, h.time_zone,
            h.default_tolerance_percent, h.due_soon_days, h.unfit_wrench, h.approve_own_draft, h.release_own_joint
       FROM sessions s JOIN users u ON u.id = s.user_id JOIN shops h ON h.id = s.shop_id
      WHERE s.id = $1 AND s.ended_at IS NULL AND u.active AND s.created_at > $2`,
    { bind: [id, new Date(now.getTime() - SESSION_HOURS * 3_600_000)] },
  ) as [SessionRow[], unknown]
  const row = rows[0]
  if (!row) return null
  if (now.getTime() - row.seen_at.getTime() > SEEN_EVERY_MS) {
    await database().query('UPDATE sessions SET seen_at = $2 WHERE id = $1', { bind: [id, now] })
  }
  return {
    actor: { id: row.user_id, name: row.name, email: row.email, role: row.role, shopId: row.shop_id, sessionId: row.id },
    shop: {
      id: row.shop_id,
      name: row.shop_name,
      timeZone: row.time_zone,
      rules: {
        defaultTolerancePercent: row.default_tolerance_percent,
        dueSoonDays: row.due_soon_days,
        unfitWrench: row.unfit_wrench,
        approveOwnDraft: row.approve_own_draft,
        releaseOwnJoint: row.release_own_joint,
      },
    },
  }
}

/** A working day and a little: then sign in again (NIST SP 800-63B-4 AAL2, 12 hours). */
export const SESSION_HOURS = 12

/** Ends one session. */
export async function endSession(id: string, now: Date): Promise<void> {
  await database().query('UPDATE sessions SET ended_at = $2 WHERE id = $1 AND ended_at IS NULL', { bind: [id, now] })
}

/** Ends all of a person's sessions, or all but one. */
export async function endSessionsOf(user: { id: string, shopId: string }, now: Date, tx: Transaction, except: string | null = null): Promise<void> {
  await database().query(
    'UPDATE sessions SET ended_at = $3 WHERE shop_id = $1 AND user_id = $2 AND ended_at IS NULL AND id IS DISTINCT FROM $4',
    { bind: [user.shopId, user.id, now, except], transaction: tx },
  )
}
