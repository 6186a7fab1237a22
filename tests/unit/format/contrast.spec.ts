import { readFileSync } from 'node:fs'
import { describe, expect, it } from 'vitest'

const css = readFileSync(new URL('../../../assets/css/tailwind.css', import.meta.url), 'utf8')

/** Every token as [day, night], read from the style sheet itself. */
const tokens = new Map([...css.matchAll(/--([\w-]+): light-dark\((#\w+), (#\w+)\)/g)]
  .map(([, name = '', day = '', night = '']) => [name, [day, night] as const]))

function channels(hex: string): number[] {
  const digits = hex.length === 4 ? [...hex.slice(1)].map(digit => digit + digit).join('') : hex.slice(1)
  return [0, 2, 4].map(start => Number.parseInt(digits.slice(start, start + 2), 16) / 255)
}

/** Relative luminance and contrast. Source: WCAG 2.2. */
function luminance(hex: string): number {
  const [r = 0, g = 0, b = 0] = channels(hex).map(c => c <= 0.04045 ? c / 12.92 : ((c + 0.055) / 1.055) ** 2.4)
  return 0.2126 * r + 0.7152 * g + 0.0722 * b
}

function contrast(a: string, b: string): number {
  const [light = 0, dark = 0] = [luminance(a), luminance(b)].sort((x, y) => y - x)
  return (light + 0.05) / (dark + 0.05)
}

function colour(name: string, theme: 'day' | 'night'): string {
  const pair = tokens.get(name)
  if (!pair) throw new Error(`no token ${name}`)
  return theme === 'day' ? pair[0] : pair[1]
}

describe.each(['day', 'night'] as const)('by %s', (theme) => {
  const pairs = ['ink', 'muted', 'paint', 'ok', 'edge', 'out']
    .flatMap(text => ['ground', 'surface'].map(ground => [text, ground] as const))

  it.each([...pairs, ['paint-ink', 'paint'] as const, ['ink', 'steel'] as const, ['ink', 'plate'] as const])(
    '%s is readable in glare on %s (7:1)',
    (text, ground) => expect(contrast(colour(text, theme), colour(ground, theme))).toBeGreaterThanOrEqual(7),
  )

  it('outlines of the part stand out from the surface (3:1)', () => {
    expect(contrast(colour('steel-2', theme), colour('surface', theme))).toBeGreaterThanOrEqual(3)
  })
})
