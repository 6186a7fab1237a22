/** Says one line of progress: what it is about, and what happens to it. */
export function say(about, text) {
  console.log(`${about.padEnd(10)} ${text}`)
}

/** A reason to stop that a person can do something about: said in one line, without a stack; '' when already said. */
export class Stop extends Error {
  constructor(about, message) {
    super(message)
    this.about = about
  }
}

/** The one line for any error; with JAMNUT_DEBUG in the environment an unexpected one keeps its stack. */
export function explain(error) {
  if (error instanceof Stop) return error.message && `${error.about.padEnd(10)} ${error.message}`
  const { code, path, message, stack } = error
  if (code === 'ENOSPC') return `disk       The disk is full: no space left${path ? ` for ${path}` : ''}.`
  if (code === 'EACCES' || code === 'EPERM') return `files      Not allowed: ${path ?? message}. Does it belong to another user?`
  return process.env.JAMNUT_DEBUG ? stack : `stopped    ${String(message).split('\n')[0]}`
}

/** How long it took, as a person says it. */
export function duration(milliseconds) {
  const seconds = milliseconds / 1000
  if (seconds < 10) return `${seconds.toFixed(1)} s`
  if (seconds < 90) return `${Math.round(seconds)} s`
  const whole = Math.round(seconds)
  return `${Math.floor(whole / 60)} min ${String(whole % 60).padStart(2, '0')} s`
}
