import pino from 'pino'

/** One logger to standard output, a JSON object a line. Never given a secret, a PIN or a passphrase. */
export const logger = pino({
  level: process.env.LOG_LEVEL ?? 'info',
  base: undefined,
  timestamp: pino.stdTimeFunctions.isoTime,
})
