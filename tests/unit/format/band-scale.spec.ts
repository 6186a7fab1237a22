import { describe, expect, it } from 'vitest'
import { bandScale } from '../../../utils/band-scale'

describe('bandScale', () => {
  const scale = bandScale(36.9, 45.1, 64, 256, 320, 16)

  it('puts the limits on the posts and the midpoint between them', () => {
    expect(scale.place(36.9)).toBe(64)
    expect(scale.place(45.1)).toBe(256)
    expect(scale.place(41)).toBe(160)
  })

  it('draws what is out of band beyond the post', () => {
    expect(scale.place(36)).toBeLessThan(64)
    expect(scale.place(46)).toBeGreaterThan(256)
    expect(scale.beyond(46)).toBe(false)
  })

  it('keeps what is far out at the edge and says so', () => {
    expect(scale.place(400)).toBe(304)
    expect(scale.beyond(400)).toBe(true)
    expect(scale.place(1)).toBe(16)
    expect(scale.beyond(1)).toBe(true)
  })

  it('survives a band without width', () => {
    expect(bandScale(40, 40, 64, 256, 320, 16).place(41)).toBe(64)
  })
})
