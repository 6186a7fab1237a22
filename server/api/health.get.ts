import { health } from '../contract/people'
import { database } from '../db'
import { Refusal } from '../refusal'
import { defineRoute } from '../utils/defineRoute'

export default defineRoute(health, async () => {
  await database().query('SELECT 1').catch(() => {
    throw new Refusal(503, 'unavailable', 'The database does not answer.')
  })
  return { status: 'ok' as const }
})
