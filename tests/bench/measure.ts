/** Runs `once` again and again, `lanes` at a time, for a while after a warm-up. @returns runs a second and the middle and slow times in ms */
export async function measure(once: () => Promise<void>, { lanes = 8, seconds = 5, warmUpSeconds = 1 } = {}): Promise<{ perSecond: number, p50: number, p99: number }> {
  await during(warmUpSeconds, lanes, once)
  const times = await during(seconds, lanes, once)
  const sorted = times.toSorted((a, b) => a - b)
  const at = (share: number) => sorted[Math.min(sorted.length - 1, Math.floor(sorted.length * share))] ?? 0
  return { perSecond: times.length / seconds, p50: at(0.5), p99: at(0.99) }
}

async function during(seconds: number, lanes: number, once: () => Promise<void>): Promise<number[]> {
  const times: number[] = []
  const end = performance.now() + seconds * 1000
  await Promise.all(Array.from({ length: lanes }, async () => {
    while (performance.now() < end) {
      const start = performance.now()
      await once()
      times.push(performance.now() - start)
    }
  }))
  return times
}

const figure = (value: number, digits = 2) => value.toFixed(digits)

/** One line of the report: what, how often, how long, and against what. */
export function row(what: string, { perSecond, p50, p99 }: Awaited<ReturnType<typeof measure>>, against?: { perSecond: number }): string {
  const ratio = against ? `   ${figure(perSecond / against.perSecond)} of the bare figure` : ''
  return `${what.padEnd(52)} ${figure(perSecond, 0).padStart(7)}/s   p50 ${figure(p50).padStart(7)} ms   p99 ${figure(p99).padStart(7)} ms${ratio}`
}
