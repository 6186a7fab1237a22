import { bin, inRoot } from './paths.mjs'

/** Where the tests leave reports, logs and pictures. */
export const artifacts = inRoot('tests/.artifacts')

/** The arguments for Node of each check. */
export const checks = {
  lint: [bin('eslint'), '.', '--cache', '--cache-location', inRoot('node_modules/.cache/eslint/')],
  types: [bin('nuxt'), 'typecheck'],
}

/** Where vitest's report of a project lies. */
export const report = project => inRoot(artifacts, `${project}.json`)

/** The arguments for Node that run one of vitest's projects: readable in the terminal, and as JSON in its report. */
export function vitest(project) {
  return [bin('vitest'), 'run', '--project', project, '--reporter=default', '--reporter=json', `--outputFile.json=${report(project)}`]
}
