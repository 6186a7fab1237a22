import { describe, expect, it } from 'vitest'
import { checkBand, workOrder, workSetting, type BandEntry, type SettingEntry } from '../../../utils/bench'
import { typed } from '../../../utils/second-check-form'

const blank = { text: '', value: null, unit: 'N.m' as const }
const band: BandEntry = { target: blank, kind: 'shop', percent: '', absolute: blank, lower: blank, upper: blank, entered: blank, uncertainty: '' }
const nm = (value: number) => typed({ value, unit: 'N.m' })
const setting: SettingEntry = { target: blank, graduation: blank, extension: '', angle: '', length: '', multiplier: '' }

describe('band check', () => {
  it('says nothing before a target is given', () => {
    expect(checkBand(band, 10).result).toBeNull()
    expect(checkBand(band, 10).errorOf('target')).toBeNull()
  })

  it('takes the shop\'s tolerance, in percent, where none is chosen', () => {
    expect(checkBand({ ...band, target: nm(50) }, 10).result?.limits).toEqual({ targetNm: 50, lowerNm: 45, upperNm: 55 })
  })

  it('judges by percent, by torque and by limits', () => {
    const verdict = (more: Partial<BandEntry>) => checkBand({ ...band, target: nm(50), entered: nm(53), ...more }, 10).result?.reading?.verdict
    expect(verdict({ kind: 'percent', percent: '5' })).toBe('high')
    expect(verdict({ kind: 'absolute', absolute: nm(4) })).toBe('in_band')
    expect(verdict({ kind: 'limits', target: blank, lower: nm(54), upper: nm(60) })).toBe('low')
  })

  it('is at the edge, and says how probable, once the uncertainty is known', () => {
    const { result } = checkBand({ ...band, target: nm(50), entered: nm(54), uncertainty: '3' }, 10)
    expect(result?.reading).toMatchObject({ verdict: 'edge', uNm: expect.closeTo(1.62, 10) })
    expect(result?.reading?.probability).toBeCloseTo(0.8915, 3)
  })

  it('says beside the field what is wrong', () => {
    expect(checkBand({ ...band, kind: 'limits', lower: nm(60), upper: nm(50) }, 10).errorOf('upper')).toContain('above')
    expect(checkBand({ ...band, target: nm(50), kind: 'percent', percent: '100' }, 10).errorOf('percent')).toContain('below 100')
    expect(checkBand({ ...band, target: nm(50), kind: 'absolute', absolute: nm(50) }, 10).errorOf('absolute')).toContain('smaller')
    expect(checkBand({ ...band, target: nm(50), uncertainty: 'x' }, 10).errorOf('uncertainty')).not.toBeNull()
  })
})

describe('wrench setting', () => {
  it('shortens for an adapter that lengthens the wrench, and rounds to the graduation', () => {
    const { result } = workSetting({ ...setting, target: nm(100), extension: '100', length: '400', graduation: nm(5) })
    expect(result?.setting.value).toBeCloseTo(80, 10)
    expect(result?.rounded).toEqual({ value: 80, unit: 'N.m' })
  })

  it('asks for the effective length with an adapter', () => {
    expect(workSetting({ ...setting, target: nm(100), extension: '100' }).errorOf('length')).toContain('effective length')
  })

  it('refuses an adapter that reaches past the grip', () => {
    const folded = workSetting({ ...setting, target: nm(100), extension: '500', angle: '180', length: '400' })
    expect(folded.result).toBeNull()
    expect(folded.errorOf('extension')).toContain('past the grip')
  })

  it('divides by the multiplier', () => {
    expect(workSetting({ ...setting, target: nm(500), multiplier: '5' }).result?.setting.value).toBeCloseTo(100, 10)
  })
})

describe('tightening order', () => {
  it('crosses a circle', () => {
    expect(workOrder('circle', '4').result).toEqual([1, 3, 2, 4])
  })

  it.each([['circle', '0'], ['circle', '2.5'], ['circle', '999'], ['circle', 'six'], ['two_rows', '7']] as const)('says what is wrong with %s of %s', (pattern, count) => {
    expect(workOrder(pattern, count).result).toBeNull()
    expect(workOrder(pattern, count).errorOf('count')).not.toBeNull()
  })

  it('waits for a count', () => {
    expect(workOrder('circle', '').errorOf('count')).toBeNull()
  })
})
