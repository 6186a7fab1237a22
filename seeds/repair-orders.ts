import { uuidv7 } from '#shared/ids/uuid'
import type { SignOffBody } from '#shared/schemas/sign-offs'
import { wrenchSetting } from '#shared/torque/adapter'
import { fromNm, type TorqueUnit } from '#shared/torque/units'
import type { Actor } from '../server/context'
import { addGroup } from '../server/services/fastener-groups/groups'
import { loadGroup, type LoadedGroup } from '../server/services/fastener-groups/load'
import { concede, disturb, markNotDisturbed } from '../server/services/fastener-groups/marks'
import { openOrder, releaseOrder } from '../server/services/repair-orders/orders'
import { recordSecondCheck } from '../server/services/second-checks/record'
import { correctSignOff, recordSignOff } from '../server/services/sign-offs/record'
import { voidSignOff } from '../server/services/sign-offs/void'
import { type InForce, fitness, wrenchesInForce } from '../server/services/wrenches/inForce'
import { act, at, type Garage } from './garage'
import { DEMO_PIN } from './people'

/** Where the story of an order is told. */
export interface Yard {
  garage: Garage
  vehicles: Map<string, string>
  specs: Map<string, string>
  wrenches: Map<string, string>
}

const need = <Value>(map: Map<string, Value>, key: string): Value => {
  const value = map.get(key)
  if (value === undefined) throw new Error(`The demo has no ${key}.`)
  return value
}

/** An order opened so many days ago. @returns its id */
export const open = ({ garage, vehicles }: Yard, number: string, unit: string, daysAgo: number, complaint: string, bay?: string) =>
  act(garage, garage.people.advisor, at(garage, daysAgo, 8), async ctx =>
    (await openOrder(ctx, { number, vehicleId: need(vehicles, unit), complaint, bay })).id)

/** A joint put on an order by its spec. @returns the group's id */
export const list = ({ garage, specs }: Yard, orderId: string, component: string, daysAgo: number, place = 0) =>
  act(garage, garage.people.technician, at(garage, daysAgo, 8, 20 + place), ctx => addGroup(ctx, orderId, { specRevisionId: need(specs, component) }))

/** The first wrench that fits a joint at a time, without a hint against it where there is one. */
async function fitWrench(yard: Yard, actor: Actor, group: LoadedGroup, now: Date): Promise<InForce> {
  const { revision, stages } = group
  const limits = { targetNm: revision.targetNm, lowerNm: revision.lowerNm, upperNm: revision.upperNm }
  const found = (await act(yard.garage, actor, now, ctx => wrenchesInForce(ctx, now)))
    .map(inForce => ({ inForce, ...fitness(inForce, { limits, stages, leftHand: revision.leftHand }) }))
    .filter(({ fit }) => fit)
    .toSorted((a, b) => a.reasons.length - b.reasons.length)
  const first = found[0]?.inForce
  if (!first) throw new Error(`No wrench of the demo fits ${revision.id}.`)
  return first
}

export interface Signing {
  by: Actor
  when: Date
  /** Share of the target that is set or shown. */
  share?: number
  positions?: number[]
  more?: Partial<SignOffBody>
}

/** The body that signs a joint, every stage, with a wrench that fits. */
async function bodyOf(yard: Yard, groupId: string, { by, when, share = 1, positions, more }: Signing): Promise<SignOffBody> {
  const { random } = yard.garage
  const group = await act(yard.garage, by, when, ctx => loadGroup(ctx, groupId))
  if (!group) throw new Error('The demo lost a joint.')
  const { wrench } = await fitWrench(yard, by, group, when)
  const graduation = wrench.graduationValue !== null && wrench.graduationUnit !== null ? { value: wrench.graduationValue, unit: wrench.graduationUnit } : null
  const shown = (targetNm: number): { value: number, unit: TorqueUnit } => {
    const asked = wrench.kind === 'setting' ? targetNm * share : targetNm * share * random.between(0.985, 1.015)
    const { setting, rounded } = wrenchSetting({ targetNm: asked, adapter: null, multiplierRatio: null, graduation, unit: wrench.rangeUnit })
    return rounded ?? { value: Number(fromNm(asked, wrench.rangeUnit).toPrecision(4)), unit: setting.unit }
  }
  const settings = new Map(group.stages.map(stage => [stage.number, stage.targetNm === null ? null : shown(stage.targetNm)]))
  const done = positions ?? group.group.tighteningOrder
  return {
    fastenerGroupId: groupId,
    wrenchId: wrench.id,
    readings: group.stages.flatMap(stage => done.map((position) => {
      if (stage.kind === 'angle') return { position, stage: stage.number, attempt: 1, value: stage.angleDeg ?? 90, unit: 'deg' as const }
      const setting = wrench.kind === 'indicating' && stage.targetNm !== null ? shown(stage.targetNm) : settings.get(stage.number)
      return { position, stage: stage.number, attempt: 1, ...(setting ? { value: setting.value, unit: setting.unit } : {}) }
    })),
    attestedInOrder: wrench.kind === 'setting',
    prep: Object.fromEntries(group.revision.preparation.map(step => [step.code, true])),
    signedAt: when.toISOString(),
    capturedOffline: false,
    pin: DEMO_PIN,
    ...more,
  }
}

/** Signs a joint. @returns the sign-off's id */
export async function sign(yard: Yard, groupId: string, signing: Signing): Promise<string> {
  const id = uuidv7(signing.when.getTime())
  const body = await bodyOf(yard, groupId, signing)
  await act(yard.garage, signing.by, signing.when, ctx => recordSignOff(ctx, id, body))
  return id
}

/** A second person watches, and says so. */
export const witness = ({ garage }: Yard, signOffId: string, by: Actor, when: Date) =>
  act(garage, by, when, ctx => recordSecondCheck(ctx, uuidv7(when.getTime()), { signOffId, method: 'witness', at: when.toISOString(), pin: DEMO_PIN, capturedOffline: false }))

const complaints: [string, string[]][] = [
  ['Coolant loss, pump weeping', ['Water pump to block', 'Thermostat housing', 'Belt tensioner']],
  ['Overheats on hills', ['Thermostat housing', 'Outlet elbow', 'Fan hub nut']],
  ['Service, oil and filter', ['Sump drain plug', 'Oil filter housing']],
  ['Front brakes', ['Brake caliper bracket', 'Wheel, 5 studs']],
  ['Knock from the front end', ['Lower ball joint', 'Tie rod end nut', 'Wheel, 6 studs']],
  ['Vibration at speed', ['Propeller shaft flange', 'Differential cover']],
  ['Heater stays cold', ['Heater pipe flange', 'Coolant manifold', 'Radiator bracket']],
  ['Starter grinds', ['Starter motor', 'Alternator bracket']],
  ['Head gasket', ['Cylinder head', 'Water pump to block', 'Exhaust manifold']],
  ['Clutch', ['Flywheel', 'Gearbox drain plug']],
]

/** The year: thirty-three orders that were done and released, with what a year brings. */
export async function seedYear(yard: Yard): Promise<void> {
  const { garage, vehicles } = yard
  const { foreman, foreman2, technician, technician2, technician3 } = garage.people
  const units = [...vehicles.keys()]
  const hands = [technician, technician2, technician3]
  for (let index = 0; index < 33; index += 1) {
    const daysAgo = 350 - index * 10
    const [complaint, components] = complaints[index % complaints.length] ?? ['', []]
    const number = `${at(garage, daysAgo, 8).toISOString().slice(2, 4)}-${String(1011 + index * 5)}`
    const unit = units[(index * 5) % units.length] ?? 'S-14'
    const orderId = await open(yard, number, unit, daysAgo, complaint)
    const hand = hands[index % hands.length] ?? technician
    for (const [place, component] of components.entries()) {
      const groupId = await list(yard, orderId, component, daysAgo, place)
      const when = at(garage, daysAgo, 10 + place, 5 + place * 7)
      const out = index === 6 && place === 0
      const edge = index % 7 === 3 && place === 1
      const late = index === 12 && place === 0
      const signing: Signing = {
        by: hand,
        when,
        share: out ? 1.14 : edge ? 1.085 : garage.random.between(0.98, 1.02),
        more: {
          ...(out ? { deviationReason: 'Bulletin in hand: upper value for the revised gasket' } : {}),
          ...(late ? { tightenedAt: new Date(when.getTime() - 95 * 60_000).toISOString(), note: 'Tablet was charging' } : {}),
        },
      }
      let signOffId = await sign(yard, groupId, signing)
      if (index === 15 && place === 0) {
        await act(garage, foreman, at(garage, daysAgo, 13), ctx => voidSignOff(ctx, signOffId, { reason: 'Signed on the wrong vehicle', pin: DEMO_PIN }))
        signOffId = await sign(yard, groupId, { by: hand, when: at(garage, daysAgo, 14) })
      }
      if (index === 18 && place === 0) {
        const corrected = { ...await bodyOf(yard, groupId, { by: hand, when: at(garage, daysAgo, 13) }), id: uuidv7(when.getTime() + 1), reason: 'The gasket lot was left out', parts: [{ name: 'Gasket', lot: 'L-2204' }] }
        await act(garage, hand, at(garage, daysAgo, 13), ctx => correctSignOff(ctx, signOffId, corrected))
        signOffId = corrected.id
      }
      if (out || late) await act(garage, foreman, at(garage, daysAgo, 15), ctx => concede(ctx, groupId, { reason: late ? 'Known to me that morning' : 'Seen, as the bulletin says', pin: DEMO_PIN }))
      const loaded = await act(garage, hand, when, ctx => loadGroup(ctx, groupId))
      if (loaded?.revision.secondCheckRequired) await witness(yard, signOffId, place % 2 === 0 ? foreman2 : hands[(index + 1) % hands.length] ?? foreman2, at(garage, daysAgo, 15, 20))
    }
    await act(garage, foreman, at(garage, daysAgo, 16), ctx => releaseOrder(ctx, orderId, DEMO_PIN))
  }
}

/** Today: what stands in the bays, and what each vehicle waits for. */
export async function seedToday(yard: Yard): Promise<void> {
  const { garage } = yard
  const { foreman, technician, technician2, technician3 } = garage.people
  const when = (daysAgo: number, hour: number, minute = 0) => at(garage, daysAgo, hour, minute)

  const story = await open(yard, '26-1204', 'S-14', 1, 'Coolant on the floor, pump weeping', '1')
  await list(yard, story, 'Water pump to block', 1)
  await sign(yard, await list(yard, story, 'Thermostat housing', 1, 1), { by: technician, when: when(1, 15) })
  await list(yard, story, 'Belt tensioner', 1, 2)

  const back = await open(yard, '26-1205', 'S-15', 1, 'Coolant leak returned, left side', '2')
  await list(yard, back, 'Coolant manifold', 1)
  const part = await list(yard, back, 'Outlet elbow', 1)
  await sign(yard, part, { by: technician2, when: when(1, 14), positions: [1] })
  const listed = await list(yard, back, 'Radiator bracket', 1)
  await act(garage, foreman, when(1, 16), ctx => markNotDisturbed(ctx, listed, { reason: 'Reached from below, bracket not touched', pin: DEMO_PIN }))

  const exception = await open(yard, '26-1206', 'V-07', 2, 'Heater stays cold', '3')
  await sign(yard, await list(yard, exception, 'Heater pipe flange', 2), { by: technician3, when: when(2, 11), share: 1.15, more: { deviationReason: 'Flange bedded late, left as it is for the foreman to see' } })

  const pulley = await open(yard, '26-1207', 'C-05', 2, 'Belt squeals', '4')
  const shopValue = await act(garage, technician, when(2, 9), ctx => addGroup(ctx, pulley, {
    noPublishedSpec: true, component: 'Idler pulley', boltCount: 1, target: { value: 50, unit: 'N.m' }, thread: 'M10x1.5', propertyClass: '8.8', threadCondition: 'dry',
    reasoning: 'No value is printed for the idler. M10, class 8.8, dry: the general table gives 50 N·m.',
  }))
  await sign(yard, shopValue, { by: technician, when: when(2, 10) })
  await sign(yard, await list(yard, pulley, 'Bypass hose fitting', 1), { by: technician2, when: when(1, 13) })

  const checks = await open(yard, '26-1208', 'T-22', 1, 'Steering play', '5')
  await sign(yard, await list(yard, checks, 'Lower ball joint', 1), { by: technician3, when: when(1, 12) })
  await sign(yard, await list(yard, checks, 'Tie rod end nut', 1), { by: technician3, when: when(1, 12, 30) })

  const ready = await open(yard, '26-1209', 'C-01', 1, 'Service, oil and filter', '6')
  await sign(yard, await list(yard, ready, 'Sump drain plug', 1), { by: technician2, when: when(1, 10) })
  await sign(yard, await list(yard, ready, 'Oil filter housing', 1), { by: technician2, when: when(1, 10, 30) })

  const again = await open(yard, '26-1210', 'B-31', 1, 'Oil weeps at the cooler', '7')
  const opened = await list(yard, again, 'Oil cooler cover', 1)
  await sign(yard, opened, { by: technician, when: when(1, 9) })
  await act(garage, technician, when(1, 11), ctx => disturb(ctx, opened, 'Gasket was pinched, opened again'))
}
