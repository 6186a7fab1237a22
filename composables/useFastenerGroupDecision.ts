interface Asked {
  what: 'keep' | 'replace' | 'correct' | 'disturb' | 'concede' | 'notDisturbed'
  position: number
  signOffId: string
}

const words: Record<Asked['what'], (asked: Asked) => { title: string, text: string, act: string, withPin?: boolean, reason?: string }> = {
  keep: ({ position }) => ({
    title: `Leave bolt ${position} as it is`, text: 'It is signed out of band, with your reason. The foreman decides about it before the vehicle goes.', act: 'Leave it as it is',
  }),
  replace: ({ position }) => ({
    title: `New bolt in position ${position}`, text: 'Past an angle stage a bolt is not tightened again. Say what was done; the record carries it.', act: 'Start again with it', reason: `New bolt fitted in position ${position}.`,
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
export function useFastenerGroupDecision(groupId: string, entry: SignOffEntry, changed: () => Promise<unknown>) {
  const actions = useFastenerGroupActions(groupId, changed)
  const asked = shallowRef<Asked | null>(null)

  const act = useAct(async (reason: string, pin: string) => {
    if (!asked.value) return
    const { what, position, signOffId } = asked.value
    if (what === 'keep' && entry.stage) {
      entry.change(keepAsIs(entry.draft, position, entry.stage.number, reason))
      entry.done(`Bolt ${position} stays as it is.`)
    } else if (what === 'replace') {
      entry.change(restart(entry.draft, position, reason))
      entry.done(`Bolt ${position} begins again.`)
    } else if (what === 'correct') entry.change(await actions.correct(signOffId, reason))
    else if (what === 'disturb') await actions.disturb(reason)
    else if (what === 'concede') await actions.concede(reason, pin)
    else if (what === 'notDisturbed') await actions.markNotDisturbed(reason, pin)
    asked.value = null
  })

  function ask(what: Asked['what'], about: Partial<Asked> = {}) {
    act.reset()
    asked.value = { position: 0, signOffId: '', ...about, what }
  }

  function close() {
    asked.value = null
  }

  return {
    asked,
    words: computed(() => asked.value ? words[asked.value.what](asked.value) : { title: '', text: '', act: '' }),
    refusal: computed(() => act.refusal.value?.message ?? null),
    busy: act.busy,
    ask,
    close,
    say: act.run,
  }
}
