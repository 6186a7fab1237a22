import { createHash } from 'node:crypto'
import { readdirSync, readFileSync } from 'node:fs'
import { join } from 'node:path'

/** SHA-256 of some texts, in lower-case hex. The texts are kept apart: ['ab', 'c'] is not ['a', 'bc']. */
export function hashTexts(...texts) {
  const hash = createHash('sha256')
  for (const text of texts) hash.update(`${Buffer.byteLength(text)}:`).update(text)
  return hash.digest('hex')
}

/** The paths of the files under a folder, sorted; `skip(path, name)` leaves out files and whole folders. */
export function listFiles(folder, skip, below = '') {
  return readdirSync(join(folder, below), { withFileTypes: true }).flatMap((entry) => {
    const path = join(below, entry.name)
    if (skip(path, entry.name)) return []
    if (entry.isDirectory()) return listFiles(folder, skip, path)
    return entry.isFile() ? [path] : []
  }).sort()
}

/** SHA-256 of the names and contents of the files under a folder. */
export function hashFiles(folder, skip) {
  const hash = createHash('sha256')
  for (const path of listFiles(folder, skip)) {
    const content = readFileSync(join(folder, path))
    hash.update(`${path}:${content.length}:`).update(content)
  }
  return hash.digest('hex')
}

/** A stored hash, or undefined where there is none. */
export function storedHash(path) {
  try {
    return readFileSync(path, 'utf8').trim()
  } catch {
    return undefined
  }
}
