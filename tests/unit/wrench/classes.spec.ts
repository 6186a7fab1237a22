import { describe, expect, it } from 'vitest'
import { classOf, permissiblePercent, readingsPerPoint, toolClasses } from '#shared/wrench/classes'

describe('tool classes', () => {
  it('takes II-A for a setting wrench and I-B for an indicating one unless said', () => {
    expect(classOf({ kind: 'setting' })).toBe('II-A')
    expect(classOf({ kind: 'indicating', toolClass: null })).toBe('I-B')
    expect(classOf({ kind: 'setting', toolClass: 'II-C' })).toBe('II-C')
  })

  it('allows 6 % everywhere to 10 N·m and 4 % for some above', () => {
    expect(toolClasses.map(toolClass => permissiblePercent(toolClass, 10))).toEqual(Array.from({ length: 12 }, () => 6))
    expect(toolClasses.filter(toolClass => permissiblePercent(toolClass, 10.01) === 4))
      .toEqual(['I-B', 'I-C', 'I-E', 'II-A', 'II-B', 'II-C'])
  })

  it('asks for ten readings where the tool is not graduated', () => {
    expect(toolClasses.filter(toolClass => readingsPerPoint(toolClass) === 10)).toEqual(['II-C', 'II-F'])
  })
})
