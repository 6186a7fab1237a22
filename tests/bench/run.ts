import { benchClientJs } from './client-js'
import { benchList } from './list'
import { session } from './session'
import { benchSignOff } from './sign-off'

/** Prints each figure beside what it is measured against, all in this one run. */
async function main(): Promise<void> {
  const { JAMNUT_E2E_URL: baseUrl, DATABASE_URL: databaseUrl } = process.env
  if (!baseUrl || !databaseUrl) throw new Error('Run it by `npm run bench`: it builds and serves the application.')
  const foreman = await session(baseUrl, 'foreman')
  const technician = await session(baseUrl, 'technician')
  const quality = await session(baseUrl, 'quality')
  const print = (lines: string[]) => lines.forEach(line => process.stdout.write(`${line}\n`))
  print(await benchList(foreman, databaseUrl))
  print(await benchSignOff({ foreman, technician, quality }, databaseUrl))
  print(await benchClientJs(baseUrl, technician))
}

await main()
