import { existsSync, statfsSync } from 'node:fs'
import { dirname } from 'node:path'
import { Stop } from './say.mjs'

/** Stops unless the disk of a folder (or of the first folder above it that exists) has so many megabytes free. */
export function requireSpace(folder, megabytes) {
  if (!existsSync(folder)) return requireSpace(dirname(folder), megabytes)
  const { bavail, bsize } = statfsSync(folder)
  const free = Math.floor(bavail * bsize / 1e6)
  if (free < megabytes) throw new Stop('disk', `The disk is full: ${folder} has ${free} MB free, ${megabytes} MB are needed.`)
}

/** Stops when a program's words say that it found the disk full. */
export function refuseFullDisk(about, output) {
  if (/ENOSPC|no space left/i.test(output)) throw new Stop(about, 'The disk is full: no space left on it.')
}
