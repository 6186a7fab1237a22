import { closeDatabase, openDatabase } from '../db'
import { closeCounters, openCounters } from '../db/counters'
import { env } from '../utils/env'
import { logger } from '../utils/logger'

/** Opens the database before the first request and closes it after the last. */
export default defineNitroPlugin((nitro) => {
  const { databaseUrl } = env()
  openDatabase(databaseUrl)
  openCounters(databaseUrl)
  logger.info('database opened')
  nitro.hooks.hook('close', async () => {
    await closeCounters()
    await closeDatabase()
  })
})
