import { RateLimiterPostgres, RateLimiterRes } from 'rate-limiter-flexible'
import type { SignedInUser, SignInBody } from '#shared/schemas/auth'
import { counters } from '../../db/counters'
import { User } from '../../db/models/user'
import { Refusal } from '../../refusal'
import { verifyNobody, verifyPassphrase } from './passphrase'
import { beginSession } from './sessions'

const FAILURES = 10
const WINDOW_SECONDS = 15 * 60

let limiter: RateLimiterPostgres | undefined
const failures = () => limiter ??= new RateLimiterPostgres({
  storeClient: counters(), tableName: 'sign_in_failures', tableCreated: true, points: FAILURES, duration: WINDOW_SECONDS, keyPrefix: 'address',
})

/**
 * Signs a person in. A wrong pair costs the same time and gets the same words whether or not the e-mail exists.
 * @throws Refusal 401 `bad_credentials`; 429 `too_many` after ten failures from one address in 15 minutes
 */
export async function signIn(
  body: SignInBody,
  from: { address: string, device: string },
  now: Date,
): Promise<{ user: SignedInUser, sessionId: string }> {
  await countTry(from.address)
  const user = await User.findOne({
    where: { email: body.email, active: true }, dangerouslyAcrossShops: 'sign-in knows only the e-mail',
  })
  const right = user ? await verifyPassphrase(user.passphraseHash, body.password) : await verifyNobody(body.password)
  if (!user || !right) throw new Refusal(401, 'bad_credentials', 'E-mail or passphrase is not right.')
  await failures().delete(from.address)
  const sessionId = await beginSession({ id: user.id, shopId: user.shopId }, from.device, now)
  return { user: { id: user.id, name: user.name, role: user.role, shopId: user.shopId }, sessionId }
}

/** Each try counts before it is judged, so that a burst of them cannot slip through; a success clears the count. */
async function countTry(address: string): Promise<void> {
  try {
    await failures().consume(address)
  } catch (reached) {
    if (!(reached instanceof RateLimiterRes)) throw reached
    throw new Refusal(429, 'too_many', 'Too many tries from here. Wait a quarter of an hour.', {
      retryAfterSeconds: Math.max(1, Math.ceil(reached.msBeforeNext / 1000)),
    })
  }
}
