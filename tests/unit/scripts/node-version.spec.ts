import { describe, expect, it } from 'vitest'
import { satisfies } from '../../../scripts/lib/node-version.mjs'

describe('the Node version', () => {
  it.each([
    ['20.19.0', true],
    ['20.20.2', true],
    ['20.18.3', false],
    ['18.20.8', false],
    ['21.0.0', false],
    ['22.12.0', false],
  ])('%s against >=20.19 <21: %s', (version, expected) => {
    expect(satisfies(version, '>=20.19 <21')).toBe(expected)
  })
})
