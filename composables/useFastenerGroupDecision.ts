/** What is to be decided, about a bolt of the draft, an earlier sign-off, or the joint. */
export type AskedDecision
  = | { what: 'keep' | 'replace', position: number }
    | { what: 'correct', signOffId: string }
    | { what: 'disturb' | 'concede' | 'notDisturbed' }

const words: Record<AskedDecision['what'], (bolt: string) => { title: string, text: string, act: string, withPin?: boolean, reason?: string }> = {
  keep: bolt => ({
    title: `Leave ${bolt} as it is`, text: 'It is signed out of band, with your reason. The foreman decides about it before the vehicle goes.', act: 'Leave it as it is',
  }),
  replace: bolt => ({
    title: `A new ${bolt}`, text: 'Past an angle stage a bolt is not tightened again. Say what was done; the record carries it.', act: 'Start again with it', reason: `New ${bolt} fitted.`,
  }),
  correct: () => ({
    title: 'Correct your sign-off', text: 'Both stay in the record: the new one stands, and names the old one with your reason.', act: 'Correct it',
  }),
  disturb: () => ({
    title: 'The joint was opened again', text: 'What was signed stays true of then. The joint has to be tightened and signed anew.', act: 'It was opened again',
  }),
  concede: () => ({
    title: 'Accept the joint as it is', text: 'With its exceptions, on your word. The record shows both.', act: 'Accept it', withPin: true,
  }),
  notDisturbed: () => ({
    title: 'Not disturbed', text: 'The joint is on the order, but was not opened in this repair.', act: 'It was not disturbed', withPin: true,
  }),
}

/** What a person decides with a reason: about a bolt in the draft, or about the joint. */
export function useFastenerGroupDecision(groupId: string, entry: SignOffEntry, asked: AskedDecision, heard: { done: () => void, changed: () => void }) {
  const actions = useFastenerGroupActions(groupId)

  const { run, busy, refusal } = useAct(async (reason: string, pin: string) => {
    if (asked.what === 'keep' && entry.stage) {
      entry.change(keepAsIs(entry.draft, asked.position, entry.stage.number, reason))
      entry.done(`Bolt ${asked.position} stays as it is.`)
    } else if (asked.what === 'replace') {
      entry.change(restart(entry.draft, asked.position, reason))
      entry.done(`Bolt ${asked.position} begins again.`)
    } else if (asked.what === 'correct') entry.change(await actions.correct(asked.signOffId, reason))
    else {
      if (asked.what === 'disturb') await actions.disturb(reason)
      else if (asked.what === 'concede') await actions.concede(reason, pin)
      else await actions.markNotDisturbed(reason, pin)
      heard.changed()
    }
    heard.done()
  })

  const said = words[asked.what]('position' in asked ? `bolt ${asked.position}` : '')
  return { said, decide: run, busy, error: computed(() => refusal.value?.message ?? null) }
}
