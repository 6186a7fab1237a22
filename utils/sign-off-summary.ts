import type { GroupAnswer } from '#shared/schemas/repair-orders'
import type { WrenchAnswer } from '#shared/schemas/wrenches'
import { worstVerdict } from '#shared/torque/verdict'
import { formatCount, verdictWords } from './format'
import { stageName } from './fastener-group-words'
import { boltsWords, type SignOffDraft } from './sign-off-draft'
import { countingAttempts, type Progress } from './sign-off-progress'
import { enteredWords } from './sign-off-words'

/** What the sign button says: all, a part with the rest left to others, or what is still to come. */
export function signLabel({ entered, finished, complete, total }: Progress): string {
  if (entered.length === 0) return total === 1 ? 'Sign when it is done' : `Sign when all ${total} are done`
  if (complete) return entered.length === total && total > 1 ? `Sign all ${total} bolts` : `Sign ${boltsWords(entered)}`
  return entered.every(position => finished.includes(position)) ? `Sign ${boltsWords(entered)}, leave the rest` : 'Sign what is done, leave the rest'
}

/** Why it cannot be signed yet, in a few words; empty when it can. */
export function signBlock(draft: SignOffDraft, progress: Progress, { wrench, prepared }: { wrench: boolean, prepared: boolean }): string {
  if (progress.entered.length === 0) return 'nothing is entered yet'
  if (!wrench) return 'choose the wrench'
  if (!prepared) return 'preparation first'
  if (progress.unsettled) return 'a bolt is out of band'
  return progress.attempts.some(made => made.kept && !made.past) && draft.deviationReason.trim().length < 3 ? 'say why it stays' : ''
}

/** What is signed, line by line, for the moment before the PIN. */
export function signLines(draft: SignOffDraft, progress: Progress, group: GroupAnswer, wrench: WrenchAnswer | null): string[] {
  const sent = progress.attempts.filter(made => !made.covered)
  const counting = countingAttempts(sent)
  const byStage = group.stages.flatMap((stage) => {
    const values = [...new Set(counting.filter(made => made.stage === stage.number).map(enteredWords))]
    const name = group.stages.length > 1 ? `${stageName(stage, group.limits)}: ` : ''
    if (values.length === 0) return []
    return [name + (values.length <= 3 ? values.join(', ') : `${values.slice(0, 2).join(', ')} … ${values.at(-1)}`)]
  })
  const verdict = worstVerdict(counting.map(({ judged }) => ({ verdict: judged?.verdict ?? null, nm: null, lowerNm: null, upperNm: null })))
  const again = sent.length - counting.length
  return [
    `${group.name}, ${boltsWords(progress.entered)} of ${progress.total}`,
    `${wrench?.assetTag ?? ''}: ${byStage.join('; ')}`,
    verdict ? `Verdict: ${verdictWords[verdict].toLowerCase()}` : 'Not judged by torque',
    ...(again > 0 ? [`${formatCount(again, 'earlier attempt')} kept beside the last`] : []),
    ...(draft.deviationReason ? [`Out of band, because: ${draft.deviationReason}`] : []),
    ...(draft.corrects ? [`In place of your earlier sign-off, because: ${draft.corrects.reason}`] : []),
  ]
}
