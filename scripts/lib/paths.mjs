import { resolve } from 'node:path'
import { fileURLToPath } from 'node:url'

/** The folder of the project. */
export const root = fileURLToPath(new URL('../..', import.meta.url))

/** A path inside the project. */
export const inRoot = (...parts) => resolve(root, ...parts)

/** Where everything lies that is not code: the database, secrets, logs. */
export const dataDir = inRoot(process.env.JAMNUT_DATA_DIR || '.data')

/** The program of a package, as a path for Node. */
export const bin = name => inRoot('node_modules/.bin', name)
