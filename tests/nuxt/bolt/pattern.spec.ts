import { mountSuspended } from '@nuxt/test-utils/runtime'
import { describe, expect, it } from 'vitest'
import { BoltMark, BoltPattern } from '#components'

const positions = Array.from({ length: 4 }, (_, index) => ({ position: index + 1, long: index === 2 }))
const props = { positions, pattern: 'circle' as const, order: [1, 3, 2, 4], done: { 1: 'tightened' as const }, next: 3 }

describe('BoltPattern', () => {
  it('reads as a list in tightening order', async () => {
    const pattern = await mountSuspended(BoltPattern, { props })
    expect(pattern.get('ol').attributes('aria-label')).toBe('Bolts in tightening order')
    expect(pattern.findAll('li').map(item => item.text())).toEqual([
      'Bolt 1, tightened, not signed, 1st in order',
      'Bolt 3, next, not tightened, 2nd in order, long',
      'Bolt 2, not tightened, 3rd in order',
      'Bolt 4, not tightened, 4th in order',
    ])
    expect(pattern.find('button').exists()).toBe(false)
  })

  it('lets a bolt be picked and names it', async () => {
    const pattern = await mountSuspended(BoltPattern, { props: { ...props, interactive: true, selected: 4, noun: 'Nut' } })
    const button = pattern.get('[aria-current=step]')
    expect(button.attributes('aria-label')).toBe('Nut 3, next, not tightened, 2nd in order, long')
    expect(pattern.get('[aria-pressed=true]').attributes('aria-label')).toContain('Nut 4')
    await button.trigger('click')
    expect(pattern.emitted('pick')).toEqual([[3]])
  })

  it('draws the path through what is still to go, and none when all is done', async () => {
    const pattern = await mountSuspended(BoltPattern, { props })
    expect(pattern.get('polyline').attributes('points')?.split(' ')).toHaveLength(2)
    await pattern.setProps({ done: { 1: 'signed', 2: 'signed', 3: 'checked', 4: 'out' }, next: null })
    expect(pattern.get('polyline').attributes('points')).toBe('')
  })

  it('shows the label of a bolt in place of its number', async () => {
    const pattern = await mountSuspended(BoltPattern, {
      props: { ...props, positions: positions.map(position => ({ ...position, label: `A${position.position}` })) },
    })
    expect(pattern.findAll('text').map(text => text.text())).toEqual(['A1', 'A2', 'A3', 'long', 'A4'])
  })

  it('survives a group without bolts', async () => {
    const pattern = await mountSuspended(BoltPattern, { props: { ...props, positions: [], order: [] } })
    expect(pattern.findAll('li')).toHaveLength(0)
  })
})

describe('BoltMark', () => {
  it.each([
    ['none', 'not tightened', 0], ['tightened', 'tightened, not signed', 2], ['signed', 'signed', 1],
    ['checked', 'signed and second-checked', 2], ['out', 'out of band', 1],
  ] as const)('%s is drawn and said', async (state, words, strokes) => {
    const mark = await mountSuspended(BoltMark, { props: { state } })
    expect(mark.get('svg').attributes('aria-label')).toBe(words)
    expect(mark.findAll('path')).toHaveLength(strokes)
  })
})
