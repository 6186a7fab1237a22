import { describe, expect, it } from 'vitest'
import { Stop, duration, explain } from '../../../scripts/lib/say.mjs'

describe('explain', () => {
  it('says a reason to stop in one line', () => {
    expect(explain(new Stop('server', 'Port 3000 is taken.'))).toBe('server     Port 3000 is taken.')
  })

  it('says nothing again that was already said', () => {
    expect(explain(new Stop('database', ''))).toBe('')
  })

  it('names the full disk and the file', () => {
    const error = Object.assign(new Error('ENOSPC: no space left on device, write'), { code: 'ENOSPC', path: '/data/x' })
    expect(explain(error)).toBe('disk       The disk is full: no space left for /data/x.')
  })

  it('keeps any other error to its first line', () => {
    expect(explain(new Error('odd\n    at somewhere'))).toBe('stopped    odd')
  })
})

describe('duration', () => {
  it.each([
    [840, '0.8 s'],
    [9_949, '9.9 s'],
    [48_400, '48 s'],
    [89_400, '89 s'],
    [125_000, '2 min 05 s'],
    [179_700, '3 min 00 s'],
  ])('%d ms is %s', (milliseconds, expected) => {
    expect(duration(milliseconds)).toBe(expected)
  })
})
