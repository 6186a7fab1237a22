import type { GroupAnswer } from '#shared/schemas/repair-orders'
import type { WrenchAnswer } from '#shared/schemas/wrenches'
import { contradicts } from '#shared/torque/preparation'
import type { Stage } from '#shared/torque/stages'
import type { TorqueUnit } from '#shared/torque/units'

/** The screen's state as components get it. */
export type SignOffEntry = ReturnType<typeof useSignOffEntry>

const nothingYet = { positions: [], order: [], stages: [], signOffs: [] }

/** Tightening one fastener group: what the hand does now, what was entered, and whether it can be signed. */
export function useSignOffEntry(groupId: string, group: Ref<GroupAnswer | null | undefined>, wrenches: Ref<readonly WrenchAnswer[]>) {
  const session = useSessionStore()
  const { draft, loaded, kept, change, patch, clear } = useSignOffDraft(groupId)

  /** As the number keys have it; empty takes what is offered. */
  const typed = ref('')
  const typing = ref(false)
  const typedUnit = ref<TorqueUnit | null>(null)
  const selected = ref<number | null>(null)
  const again = ref<number | null>(null)
  const pickedStage = ref<number | null>(null)
  const said = ref('')

  const joint = computed(() => group.value ?? nothingYet)
  /** One remembered from another joint counts only where it may be used for this one. */
  const wrench = computed(() => wrenches.value.find(({ id, fit }) =>
    id === draft.value.wrenchId && (fit !== false || session.shop?.rules.unfitWrench === 'exception')) ?? null)
  const reach = computed(() => ({ adapter: draft.value.adapter, multiplierRatio: draft.value.multiplierRatio }))
  const judge = computed(() => judgeWith(factorOf(reach.value) === null ? null : wrench.value, reach.value, group.value?.specRevision.leftHand ?? false))
  const progress = computed(() => progressOf(joint.value, draft.value.acts, judge.value, {
    correctsId: draft.value.corrects?.id ?? null, picked: pickedStage.value,
  }))

  /** The stage in hand; the last one when all is done. */
  const stage = computed<Stage | null>(() =>
    joint.value.stages.find(({ number }) => number === progress.value.stage) ?? joint.value.stages.at(-1) ?? null)
  const way = computed<'snug' | 'turn' | 'click' | 'read'>(() => {
    if (stage.value?.kind === 'angle') return 'turn'
    if (stage.value?.kind === 'snug') return 'snug'
    return wrench.value?.kind === 'indicating' ? 'read' : 'click'
  })
  const paint = computed(() => stage.value ? paintOf(joint.value, progress.value, stage.value.number, draft.value.corrects?.id ?? null) : {})

  const computedSetting = computed(() => stage.value && wrench.value && factorOf(reach.value) !== null
    ? wrenchSettingFor(stage.value, wrench.value, reach.value)
    : null)
  const setting = computed(() => stage.value ? draft.value.settings[stage.value.number] ?? null : null)
  const unit = computed<EntryUnit>(() => way.value === 'turn' ? 'deg' : typedUnit.value ?? (wrench.value ? scaleUnit(wrench.value) : 'N.m'))
  const setAlready = computed(() => way.value !== 'click' || (setting.value !== null && !typing.value))

  /** What a press would enter, in the unit it is entered in; null while nothing is. */
  const value = computed<{ value: number, unit: EntryUnit } | null>(() => {
    const number = Number(typed.value)
    if (typed.value !== '' && number > 0) return { value: number, unit: unit.value }
    if (typed.value !== '' || way.value === 'snug' || way.value === 'read') return null
    if (way.value === 'turn') return stage.value?.angleDeg ? { value: stage.value.angleDeg, unit: 'deg' } : null
    return typing.value ? null : setting.value ?? computedSetting.value
  })
  const judged = computed(() => stage.value && value.value ? judge.value(stage.value, value.value.value, value.value.unit) : null)
  const isOut = computed(() => judged.value?.verdict === 'low' || judged.value?.verdict === 'high')

  const prepMissing = computed(() => (group.value?.preparation ?? []).filter(step => step.required && !draft.value.prep[step.code]))
  const contradicting = computed(() =>
    contradicts(group.value?.specRevision.threadCondition ?? null, Object.keys(draft.value.prep).filter(code => draft.value.prep[code])))
  const prepared = computed(() => prepMissing.value.length === 0 && (contradicting.value.length === 0 || draft.value.prepReason.trim().length > 2))

  const lastOf = (position: number) => progress.value.attempts.findLast(made =>
    made.position === position && made.stage === stage.value?.number && !made.past) ?? null
  /** The bolt the hand goes to: the one picked where it still wants it, else the next in order. */
  const target = computed(() => {
    if (again.value !== null) return again.value
    const { todo } = progress.value
    return selected.value !== null && todo.includes(selected.value) ? selected.value : todo[0] ?? null
  })
  const targetState = computed(() => target.value === null || !stage.value
    ? null
    : again.value === target.value ? 'again' : progress.value.stateOf(target.value, stage.value.number))

  /** The bolt looked at: one picked, else the one in hand where it is in trouble. */
  const looked = computed(() => {
    if (selected.value !== null) return selected.value
    return again.value === null && ['again', 'restart', 'replace'].includes(targetState.value ?? '') ? target.value : null
  })
  /** Bolts that have not been tightened at this stage at all: what "all clicked" enters. */
  const openBolts = computed(() => progress.value.todo.filter(position => progress.value.stateOf(position, progress.value.stage ?? 0) === 'open'))

  /** What the main button does now. */
  const step = computed<'locked' | 'wrench' | 'adapter' | 'prepare' | 'set' | 'enter' | 'restart' | 'replace' | 'sign' | 'done'>(() => {
    if (!group.value?.can.sign) return 'locked'
    if (progress.value.complete && again.value === null) return progress.value.entered.length > 0 ? 'sign' : 'done'
    if (!wrench.value) return 'wrench'
    if (factorOf(reach.value) === null) return 'adapter'
    if (!prepared.value) return 'prepare'
    if (targetState.value === 'restart' || targetState.value === 'replace') return targetState.value
    return setAlready.value ? 'enter' : 'set'
  })

  /** What is looked at or typed, which is not yet entered. */
  function look(changes: { typed?: string, typing?: boolean, typedUnit?: TorqueUnit | null, selected?: number | null, again?: number | null, stage?: number | null }) {
    if (changes.typed !== undefined) typed.value = changes.typed
    if (changes.typing !== undefined) typing.value = changes.typing
    if (changes.typedUnit !== undefined) typedUnit.value = changes.typedUnit
    if (changes.selected !== undefined) selected.value = changes.selected
    if (changes.again !== undefined) again.value = changes.again
    if (changes.stage !== undefined) pickedStage.value = changes.stage
  }

  function done(words: string) {
    look({ typed: '', typing: false, selected: null, again: null })
    said.value = words
  }

  function enterAt(positions: number[]) {
    if (!stage.value || (way.value !== 'snug' && !value.value)) return
    const number = stage.value.number
    const verdict = judged.value?.verdict
    change(enter(draft.value, {
      positions, stage: number, value: value.value?.value ?? null, unit: value.value?.unit ?? null, ...(way.value === 'click' && isOut.value && { kept: true }),
    }))
    done(`Entered ${boltsWords(positions)}${verdict && way.value !== 'click' ? `: ${verdictWords[verdict].toLowerCase()}` : ''}.`)
    if (target.value !== null) said.value += ` Next is bolt ${target.value}.`
  }

  /** The main button's act; what needs more than a press (wrench, preparation, sign) is the screen's. */
  function press() {
    const at = target.value
    if (step.value === 'set' && stage.value && value.value && value.value.unit !== 'deg' && (!isOut.value || draft.value.deviationReason.trim())) {
      patch({ settings: { ...draft.value.settings, [stage.value.number]: { value: value.value.value, unit: value.value.unit } } })
      done('The setting is noted.')
    } else if (step.value === 'enter' && at !== null) enterAt([at])
    else if (step.value === 'restart' && at !== null) {
      change(restart(draft.value, at))
      done(`Bolt ${at} begins again.`)
    }
  }

  return reactive({
    draft, loaded, kept, change, patch, clear, typed, typing, typedUnit, selected, again, pickedStage, said,
    wrench, reach, judge, progress, stage, way, paint, computedSetting, setting, unit, value, judged, isOut,
    prepMissing, contradicting, prepared, lastOf, target, targetState, looked, openBolts, step, look, enterAt, press, done,
  })
}
