import { describe, expect, it } from 'vitest'
import { conditionOf, contradicts, defaultPreparation, preparationTexts } from '#shared/torque/preparation'

describe('conditionOf', () => {
  it.each([
    ['clean and dry', 'dry'],
    ['Dry', 'dry'],
    ['dry, no thread locker', 'dry'],
    ['without oil', 'dry'],
    ['not lubricated', 'dry'],
    ['free of oil', 'dry'],
    ['oil-free', 'dry'],
    ['wet', 'oiled'],
    ['lightly oiled', 'oiled'],
    ['Engine oil under head and on threads', 'oiled'],
    ['lubricated', 'oiled'],
    ['dry film lubricant', 'oiled'],
    ['thread locker', 'thread_locker'],
    ['medium-strength threadlocker', 'thread_locker'],
    ['thread-locking compound', 'thread_locker'],
    ['anti-seize', 'anti_seize'],
    ['antiseize compound', 'anti_seize'],
    ['thread sealant', 'sealant'],
    ['PTFE sealer', 'sealant'],
    ['threads_oiled', 'oiled'],
    ['as received', null],
    ['no thread locker', null],
    ['', null],
    [null, null],
    [undefined, null],
  ] as const)('%j is %s', (text, condition) => {
    expect(conditionOf(text)).toBe(condition)
  })
})

describe('defaultPreparation', () => {
  it('asks for what the spec speaks of, and requires none of it', () => {
    const steps = defaultPreparation({ threadCondition: 'clean and dry', jointClass: 'sealing', oneTimeUse: true })
    expect(steps.map(step => step.code)).toEqual(['faces_cleaned', 'new_gasket', 'new_bolts', 'threads_clean_dry'])
    expect(steps.every(step => !step.required)).toBe(true)
    expect(steps[3]?.text).toBe('Threads clean and dry')
  })

  it.each([
    ['wet', 'threads_oiled'], ['thread locker', 'thread_locker'], ['anti-seize', 'anti_seize'], ['sealant', 'sealant'],
  ])('%s gives %s', (threadCondition, code) => {
    expect(defaultPreparation({ threadCondition, jointClass: 'general' }).map(step => step.code)).toEqual([code])
  })

  it('gives nothing where the spec says nothing', () => {
    expect(defaultPreparation({ jointClass: 'general' })).toEqual([])
  })
})

describe('contradicts', () => {
  it('names what does not belong on threads specified dry', () => {
    const confirmed = ['threads_clean_dry', 'threads_oiled', 'thread_locker', 'anti_seize', 'sealant', 'new_gasket']
    expect(contradicts('clean and dry', confirmed)).toEqual(['threads_oiled', 'thread_locker', 'anti_seize', 'sealant'])
  })

  it('lets thread locker and sealant have clean, dry threads', () => {
    expect(contradicts('thread locker', ['threads_clean_dry', 'thread_locker'])).toEqual([])
    expect(contradicts('sealant', ['threads_clean_dry', 'sealant'])).toEqual([])
    expect(contradicts('thread locker', ['threads_oiled'])).toEqual(['threads_oiled'])
  })

  it('finds dry threads where oil is specified', () => {
    expect(contradicts('wet', ['threads_clean_dry', 'threads_oiled'])).toEqual(['threads_clean_dry'])
  })

  it('judges a spec\'s own codes by their words', () => {
    expect(contradicts('dry', ['oil_on_threads', 'my_threadlocker', 'rag_out'])).toEqual(['oil_on_threads', 'my_threadlocker'])
  })

  it('says nothing without a condition, nor of holes and faces', () => {
    expect(contradicts(null, Object.keys(preparationTexts))).toEqual([])
    expect(contradicts('as received', ['thread_locker'])).toEqual([])
    expect(contradicts('oiled', ['blind_holes_dry', 'faces_dry'])).toEqual([])
  })
})
