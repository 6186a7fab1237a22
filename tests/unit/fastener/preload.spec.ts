import { describe, expect, it } from 'vitest'
import { estimateTorque, proofLoad } from '#shared/fastener/preload'
import { strengthOf } from '#shared/fastener/strength'
import { stressAreaMetric } from '#shared/fastener/thread'
import { toNm } from '#shared/torque/units'

describe('strength', () => {
  it('splits class 8.8 at 16 mm', () => {
    expect(strengthOf('8.8', 16)).toEqual({ propertyClass: '8.8', proofMPa: 580, yieldMPa: 640, tensileMPa: 800 })
    expect(strengthOf('8.8', 18)).toMatchObject({ proofMPa: 600, yieldMPa: 660, tensileMPa: 830 })
  })

  // Proof loads, N, coarse thread, as printed in reproduced ISO 898-1 tables.
  it.each([
    ['8.8', 6, 1, 11600], ['8.8', 14, 2, 66700], ['8.8', 24, 3, 212000], ['10.9', 8, 1.25, 30400],
    ['10.9', 16, 2, 130000], ['10.9', 24, 3, 293000], ['12.9', 8, 1.25, 35500], ['12.9', 16, 2, 152000],
    ['4.6', 8, 1.25, 8240], ['4.6', 10, 1.5, 13000], ['5.8', 8, 1.25, 13900], ['5.8', 12, 1.75, 32000],
  ] as const)('class %s M%d×%d carries %d N as printed', (propertyClass, diameter, pitch, load) => {
    const proofMPa = strengthOf(propertyClass, diameter)?.proofMPa ?? 0
    expect(Math.abs(proofLoad(stressAreaMetric(diameter, pitch), proofMPa) / load - 1)).toBeLessThan(0.01)
  })

  it.each([
    ['SAE J429 grade 5', 1, 85], ['grade 5', 1.125, 74], ['SAE grade 8', 1.5, 120], ['Gr. 2', 0.75, 55],
    ['grade 2', 0.875, 33],
  ])('%s at %d in: %d ksi', (grade, inches, ksi) => {
    expect(strengthOf(grade, inches * 25.4)?.proofMPa).toBeCloseTo(ksi * 6.894757293168361, 9)
  })

  it.each([
    ['SAE grade 1 or 2', 25.4], ['grade 8', 50], ['9.9', 8], ['8', 8], ['', 8], ['8.8', 0], ['8.8', Number.NaN],
  ])('knows no %j at %d mm', (propertyClass, diameter) => {
    expect(strengthOf(propertyClass, diameter)).toBeNull()
  })
})

describe('the estimate behind a shop value', () => {
  it('is K·F·d at 75 % of the proof load, with its scatter', () => {
    const estimate = estimateTorque({ thread: 'M8', propertyClass: '8.8', condition: 'zinc' })
    expect(estimate?.torqueNm).toBeCloseTo(0.2 * 0.75 * 36.6085432737652 * 580 * 0.008, 9)
    expect(estimate?.scatter).toBe(0.35)
    expect((estimate?.lowNm ?? 0) / (estimate?.torqueNm ?? 1)).toBeCloseTo(0.65, 12)
    expect((estimate?.preloadHighN ?? 0) / (estimate?.preloadN ?? 1)).toBeCloseTo(1.35, 12)
  })

  it('scatters less when lubricated and aims higher for a permanent joint', () => {
    const lubricated = estimateTorque({ thread: 'M8', propertyClass: '8.8', condition: 'lubricated' })
    expect(lubricated).toMatchObject({ scatter: 0.25, nutFactor: 0.18 })
    const permanent = estimateTorque({ thread: 'M8', propertyClass: '8.8', condition: 'lubricated', share: 0.9 })
    expect((permanent?.torqueNm ?? 0) / (lubricated?.torqueNm ?? 1)).toBeCloseTo(1.2, 12)
  })

  it('comes near a published general table (1/4-20, grade 5: 8 lbf·ft, 10 % either way)', () => {
    const estimate = estimateTorque({ thread: '1/4-20', propertyClass: 'SAE J429 grade 5', condition: 'zinc' })
    expect(Math.abs((estimate?.torqueNm ?? 0) / toNm({ value: 8, unit: 'lbf.ft' }) - 1)).toBeLessThan(0.1)
  })

  it('is null where thread, pitch or strength is not known', () => {
    expect(estimateTorque({ thread: '5/16 in', propertyClass: 'grade 5', condition: 'plain' })).toBeNull()
    expect(estimateTorque({ thread: 'a big one', propertyClass: '8.8', condition: 'plain' })).toBeNull()
    expect(estimateTorque({ thread: 'M8', propertyClass: 'unknown', condition: 'plain' })).toBeNull()
  })
})
