import { existsSync } from 'node:fs'
import { inRoot } from './paths.mjs'
import { run } from './run.mjs'
import { Stop } from './say.mjs'

const path = '/usr/bin/chromium'

/** Debian's Chromium, installed when missing: its path. */
export async function ensureChromium() {
  if (existsSync(path)) return path
  const { code } = await run(inRoot('scripts/lib/apt-install.sh'), ['chromium', 'chromium'])
  if (code !== 0) throw new Stop('chromium', '')
  return path
}
