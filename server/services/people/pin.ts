import { createHmac } from 'node:crypto'
import type { Context } from '../../context'
import { counters } from '../../db/counters'
import { invalid, Refusal, refused } from '../../refusal'
import { env } from '../../utils/env'

/** Wrong PINs a person may give in a row (NIST SP 800-63B activation secrets: at most ten). */
export const PIN_TRIES = 10

/**
 * What is kept of a PIN: HMAC-SHA-256 under a pepper that the database never sees. A slow hash would allow only a few
 * signatures a second; the limit of ten tries is what guards it.
 */
export function pinVerifier(userId: string, pin: string): string {
  return createHmac('sha256', env().pinPepper).update(`${userId}\0${pin}`).digest('hex')
}

const runs = '01234567890123456789'
const back = '98765432109876543210'
/** The PINs that people choose first: runs, repeats, mirrored and dated ones. */
const common = new Set([
  '123123', '112233', '121212', '696969', '131313', '159753', '147258', '147852', '258456', '789456', '456789', '142536',
  '101010', '202020', '102030', '010203', '192837', '123321', '654321', '159357', '951753', '246810', '135790', '520520',
])

/** Why a PIN is too easy to guess, or null. */
export function weakPin(pin: string): string | null {
  const digits = [...pin]
  const easy = new Set(digits).size < 3
    || runs.includes(pin) || back.includes(pin) || common.has(pin)
    || pin.slice(0, 3) === pin.slice(3) || pin.slice(0, 2).repeat(3) === pin
    || /^(19|20)\d{4}$/.test(pin)
  return easy ? 'This PIN is one of the first that anyone would try. Choose another.' : null
}

/** @throws Refusal 422 `weak_pin` */
export function refuseWeakPin(pin: string): void {
  const why = weakPin(pin)
  if (why) throw refused('weak_pin', why, 'pin')
}

/**
 * Asks for the signer's PIN. Counting and comparing is one statement, so that no burst of guesses gets more than ten
 * tries, and it is committed on its own, whatever becomes of the request.
 * @throws Refusal 400 without a PIN, 403 `wrong_pin` with `triesLeft`, 403 `pin_locked`
 */
export async function requirePin(ctx: Pick<Context, 'actor'>, pin: string | undefined): Promise<void> {
  if (pin === undefined) throw invalid([{ path: 'pin', message: 'Sign with your PIN.' }])
  const { rows: [row] } = await counters().query<{ failures: number, matches: boolean | null }>(
    `UPDATE users SET pin_failures = CASE WHEN pin_verifier = $2 THEN 0 ELSE pin_failures + 1 END
      WHERE id = $1 AND pin_failures < ${PIN_TRIES} AND pin_verifier IS NOT NULL
      RETURNING pin_failures AS failures, pin_verifier = $2 AS matches`,
    [ctx.actor.id, pinVerifier(ctx.actor.id, pin)],
  )
  if (!row) throw await noPinOrLocked(ctx.actor.id)
  if (row.matches) return
  const triesLeft = PIN_TRIES - row.failures
  const left = triesLeft === 1 ? 'one try is left' : `${triesLeft} tries are left`
  throw new Refusal(403, 'wrong_pin', `That is not your PIN; ${left}.`, {
    triesLeft, issues: [{ path: 'pin', message: `Wrong PIN; ${left}.` }],
  })
}

async function noPinOrLocked(userId: string): Promise<Refusal> {
  const { rows: [user] } = await counters().query<{ missing: boolean }>('SELECT pin_verifier IS NULL AS missing FROM users WHERE id = $1', [userId])
  if (user?.missing) return new Refusal(403, 'wrong_pin', 'You have no PIN yet. Choose one on your own page, then sign.', { triesLeft: 0 })
  return new Refusal(403, 'pin_locked', 'Your PIN is locked after ten wrong tries. Set a new one with your passphrase.', { triesLeft: 0 })
}
