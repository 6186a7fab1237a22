import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { attemptsOf, boltRanges, boltsWords, enter, keepAsIs, newDraft, readDraft, restart, takeBack, undo, withReason } from '../../../utils/sign-off-draft'

const click = (positions: number[], stage = 1) => ({ positions, stage, value: 36.5, unit: 'N.m' as const })

describe('the draft of a sign-off', () => {
  it('has an id made on the device, once', () => {
    const draft = newDraft()
    expect(draft.id).toMatch(/^[0-9a-f]{8}-[0-9a-f]{4}-7/)
    expect(enter(draft, click([1])).id).toBe(draft.id)
  })

  it('numbers the attempts of one bolt and stage', () => {
    const draft = [click([1]), click([2]), click([1]), click([1], 2)].reduce(enter, newDraft())
    expect(attemptsOf(draft.acts).map(({ position, stage, attempt }) => [position, stage, attempt]))
      .toEqual([[1, 1, 1], [2, 1, 1], [1, 1, 2], [1, 2, 1]])
  })

  it('changes nothing that is there: every act gives a new draft', () => {
    const draft = Object.freeze(newDraft())
    expect(enter(draft, click([1])).acts).toHaveLength(1)
    expect(draft.acts).toHaveLength(0)
  })

  it('takes back the last act, all clicks of one press together', () => {
    const draft = enter(enter(newDraft(), click([1])), click([2, 3, 4]))
    expect(attemptsOf(undo(draft).acts).map(({ position }) => position)).toEqual([1])
  })

  it('undoes to where it was, whatever was done', () => {
    const acts = fc.array(fc.oneof(
      fc.integer({ min: 1, max: 6 }).map(position => (draft: ReturnType<typeof newDraft>) => enter(draft, click([position]))),
      fc.integer({ min: 1, max: 6 }).map(position => (draft: ReturnType<typeof newDraft>) => restart(draft, position)),
    ))
    fc.assert(fc.property(acts, (list) => {
      const start = newDraft()
      const end = list.reduce((draft, act) => act(draft), start)
      expect(list.reduce(undo, end)).toEqual(start)
    }))
  })

  it('takes one bolt back and leaves the others of the same press', () => {
    const draft = enter(keepAsIs(enter(newDraft(), click([1, 2, 3])), 2, 1, 'the customer knows'), click([4]))
    expect(attemptsOf(takeBack(draft, 2, 1).acts).map(({ position, kept }) => [position, kept])).toEqual([[1, false], [3, false], [4, false]])
    expect(takeBack(draft, 6, 1).acts).toEqual(draft.acts)
  })

  it('keeps what was out of band beside a bolt that began again', () => {
    const draft = enter(restart(enter(newDraft(), click([1])), 1), click([1]))
    expect(attemptsOf(draft.acts).map(({ attempt, past }) => [attempt, past])).toEqual([[1, true], [2, false]])
  })

  it('says a reason once', () => {
    const draft = withReason(withReason(newDraft(), 'New bolt. '), 'New bolt.')
    expect(withReason(draft, 'Worn thread.').deviationReason).toBe('New bolt. Worn thread.')
  })

  it('is read again as it was kept, and only when it is one', () => {
    const draft = enter(newDraft('w'), click([1]))
    expect(readDraft(JSON.stringify(draft))).toEqual(draft)
    for (const other of [null, '', '{', 'null', '7', '{"id":"x"}', '[]']) expect(readDraft(other)).toBeNull()
  })

  it('keeps no PIN', () => {
    expect(Object.keys(newDraft()).filter(name => /pin/i.test(name))).toEqual([])
  })
})

describe('bolts in words', () => {
  it.each([[[1, 2, 3], '1–3'], [[5, 1, 2], '1–2, 5'], [[4], '4'], [[], '']])('%j is %s', (positions, words) => {
    expect(boltRanges(positions)).toBe(words)
  })

  it('counts', () => {
    expect(boltsWords([4])).toBe('bolt 4')
    expect(boltsWords([1, 2])).toBe('bolts 1–2')
  })
})
