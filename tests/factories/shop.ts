import { randomBytes } from 'node:crypto'
import { uuidv7 } from '#shared/ids/uuid'
import type { ShopRules } from '#shared/schemas/auth'
import type { Role } from '#shared/types/roles'
import type { Actor, Shop } from '../../server/context'
import { database } from '../../server/db'
import { hashPassphrase } from '../../server/services/people/passphrase'
import { pinVerifier } from '../../server/services/people/pin'

export const PASSPHRASE = 'a passphrase for tests'
export const PIN = '739164'

let hashed: Promise<string> | undefined

const rules: ShopRules = {
  defaultTolerancePercent: 10, dueSoonDays: 30, unfitWrench: 'refuse', approveOwnDraft: true, releaseOwnJoint: false,
}

/** A word that no other test uses, for names that must be unique. */
export const unique = (prefix: string) => `${prefix}-${randomBytes(5).toString('hex')}`

/** A shop of its own: what isolates one test from another. */
export async function buildShop(overrides: Partial<ShopRules & { name: string, timeZone: string }> = {}): Promise<Shop> {
  const { name = unique('Shop'), timeZone = 'UTC', ...own } = overrides
  const shop: Shop = { id: uuidv7(), name, timeZone, rules: { ...rules, ...own } }
  await database().query(
    `INSERT INTO shops (id, name, time_zone, default_tolerance_percent, due_soon_days, unfit_wrench, approve_own_draft, release_own_joint, created_at)
     VALUES ($1, $2, $3, $4, $5, $6, $7, $8, now())`,
    { bind: [shop.id, name, timeZone, shop.rules.defaultTolerancePercent, shop.rules.dueSoonDays, shop.rules.unfitWrench, shop.rules.approveOwnDraft, shop.rules.releaseOwnJoint] },
  )
  return shop
}

/** A person of a shop, with PASSPHRASE and PIN. */
export async function buildUser(shop: Shop, role: Role, overrides: { name?: string, email?: string, active?: boolean } = {}): Promise<Actor> {
  hashed ??= hashPassphrase(PASSPHRASE)
  const id = uuidv7()
  const { name = unique(role), email = `${unique(role)}@shop.example`.toLowerCase(), active = true } = overrides
  await database().query(
    `INSERT INTO users (id, shop_id, name, email, role, active, passphrase_hash, pin_verifier, created_at) VALUES ($1, $2, $3, $4, $5, $6, $7, $8, now())`,
    { bind: [id, shop.id, name, email, role, active, await hashed, pinVerifier(id, PIN)] },
  )
  return { id, name, email, role, shopId: shop.id, sessionId: null }
}
