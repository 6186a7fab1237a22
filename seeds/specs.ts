import type { CreateSpecBody } from '#shared/schemas/torque-specs'
import type { TorqueUnit } from '#shared/torque/units'
import { approveSpec, createSpec, reviseSpec, withdrawSpec } from '../server/services/torque-specs/specs'
import { act, at, type Garage } from './garage'

type Extra = Partial<CreateSpecBody>
/** Component, application, bolts, target, unit, section and page of the demo manual, and whatever else is printed. */
type Line = [string, string, number, number | null, TorqueUnit, string, string, Extra?]

const clean = { code: 'threads_clean_dry', text: 'Threads clean and dry', required: true }
const gasket = { code: 'new_gasket', text: 'New gasket, faces cleaned', required: true }
const blind = { code: 'blind_holes_blown_out', text: 'Blind holes blown out dry', required: true }
const locker = { code: 'thread_locker', text: 'Thread locker applied to clean threads', required: true }
const newBolts = { code: 'new_bolts', text: 'New bolts fitted', required: true }

const cooling = 'Engine, cooling system'
const sealing: Extra = { jointClass: 'sealing', threadCondition: 'dry', preparation: [clean, gasket] }
const safety: Extra = { jointClass: 'safety', secondCheckRequired: true, threadCondition: 'dry', preparation: [clean] }
const wheel: Extra = { ...safety, pattern: 'circle', secondCheckRequired: false, retorque: { afterKm: 80, note: 'Check again after the first drive' } }

const lines: Line[] = [
  ['Water pump to block', cooling, 6, 41, 'N.m', '6-12', '214', { ...sealing, pattern: 'circle', thread: 'M8x1.25', propertyClass: '8.8', places: [{ position: 3, long: true }, { position: 6, long: true }], preparation: [clean, gasket, blind], secondCheckRequired: true, caution: 'Long bolts in positions 3 and 6. Blind holes: blow them out dry before the bolts go in.' }],
  ['Thermostat housing', cooling, 3, 22, 'N.m', '6-14', '219', { ...sealing, pattern: 'circle', thread: 'M6x1' }],
  ['Belt tensioner', 'Engine, accessory drive', 2, 48, 'N.m', '6-20', '231', { pattern: 'row', threadCondition: 'dry', preparation: [clean] }],
  ['Outlet elbow', cooling, 2, 97, 'lbf.in', '6-15', '221', { ...sealing, pattern: 'row', printed: { value: 11, unit: 'N.m' } }],
  ['Radiator bracket', cooling, 4, 9, 'N.m', '6-03', '203', { pattern: 'two_rows', threadCondition: 'dry', preparation: [clean] }],
  ['Heater pipe flange', cooling, 2, 22, 'lbf.ft', '6-17', '225', { ...sealing, pattern: 'row', printed: { value: 30, unit: 'N.m' } }],
  ['Coolant manifold', cooling, 8, 25, 'N.m', '6-18', '227', { ...sealing, pattern: 'two_rows', order: [4, 5, 3, 6, 2, 7, 1, 8] }],
  ['Fan hub nut', cooling, 1, 65, 'N.m', '6-22', '236', { leftHand: true, threadCondition: 'dry', preparation: [clean], caution: 'Left-hand thread.' }],
  ['Fan shroud', cooling, 4, 6, 'N.m', '6-05', '206', { pattern: 'circle', tolerance: { kind: 'absolute', value: 1, unit: 'N.m' } }],
  ['Drain cock seat', cooling, 1, 15, 'N.m', '6-02', '201', { ...sealing, tolerance: { kind: 'limits', lower: { value: 13, unit: 'N.m' }, upper: { value: 18, unit: 'N.m' } } }],
  ['Cylinder head', 'Engine', 10, 60, 'N.m', '4-31', '148', { jointClass: 'sealing', pattern: 'two_rows', threadCondition: 'oiled', oneTimeUse: true, preparation: [newBolts, gasket, blind], order: [3, 8, 2, 7, 4, 9, 1, 6, 5, 10], stages: [{ kind: 'snug', target: { value: 20, unit: 'N.m' } }, { kind: 'percent', percent: 50 }, { kind: 'torque', target: { value: 60, unit: 'N.m' } }, { kind: 'angle', angleDeg: 90, toleranceDeg: 5 }], caution: 'Bolts are turned by angle: fit new ones.' }],
  ['Crankshaft pulley bolt', 'Engine', 1, 120, 'N.m', '4-40', '171', { jointClass: 'general', oneTimeUse: true, threadCondition: 'oiled', preparation: [newBolts], stages: [{ kind: 'torque', target: { value: 120, unit: 'N.m' } }, { kind: 'angle', angleDeg: 60, toleranceDeg: 5 }] }],
  ['Oil filter housing', 'Engine, lubrication', 5, 37, 'lbf.ft', '5-08', '188', { ...sealing, pattern: 'circle', printed: { value: 50, unit: 'N.m' } }],
  ['Sump drain plug', 'Engine, lubrication', 1, 35, 'N.m', '5-02', '181', { ...sealing }],
  ['Sump to block', 'Engine, lubrication', 16, 12, 'N.m', '5-03', '183', { ...sealing, pattern: 'circle' }],
  ['Exhaust manifold', 'Engine, exhaust', 8, 30, 'N.m', '7-04', '252', { jointClass: 'sealing', pattern: 'row', threadCondition: 'anti-seize', preparation: [{ code: 'anti_seize', text: 'Anti-seize on the studs', required: true }, gasket] }],
  ['Flywheel', 'Driveline', 8, 90, 'N.m', '8-03', '271', { jointClass: 'general', pattern: 'circle', threadCondition: 'thread locker', preparation: [locker, newBolts], oneTimeUse: true }],
  ['Propeller shaft flange', 'Driveline', 4, 75, 'N.m', '8-11', '284', { jointClass: 'safety', secondCheckRequired: true, pattern: 'circle', threadCondition: 'thread locker', preparation: [locker] }],
  ['Differential cover', 'Driveline', 10, 24, 'lbf.ft', '8-20', '297', { ...sealing, pattern: 'circle' }],
  ['Gearbox drain plug', 'Driveline', 1, 40, 'N.m', '8-06', '277', { ...sealing }],
  ['Lower ball joint', 'Front end', 3, 80, 'N.m', '10-05', '331', { ...safety, pattern: 'circle' }],
  ['Tie rod end nut', 'Front end', 1, 55, 'N.m', '10-09', '338', { ...safety, runningTorque: { value: 6, unit: 'N.m', rule: 'always_added' } }],
  ['Brake caliper bracket', 'Front end', 2, 110, 'N.m', '11-04', '352', { ...safety, pattern: 'row' }],
  ['Strut to body', 'Front end', 3, 30, 'N.m', '10-14', '345', { ...safety, pattern: 'circle' }],
  ['Hub bearing', 'Front end', 4, 95, 'N.m', '10-17', '349', { ...safety, pattern: 'circle' }],
  ['Wheel, 5 studs', 'Wheels', 5, 120, 'N.m', '12-02', '371', wheel],
  ['Wheel, 6 studs', 'Wheels', 6, 160, 'N.m', '12-02', '371', wheel],
  ['Wheel, 10 studs', 'Wheels', 10, 600, 'N.m', '12-03', '373', { ...wheel, secondCheckRequired: true }],
  ['Alternator bracket', 'Engine, accessory drive', 3, 45, 'N.m', '9-03', '311', { pattern: 'circle', threadCondition: 'dry' }],
  ['Starter motor', 'Engine, accessory drive', 2, 42, 'N.m', '9-08', '318', { pattern: 'row', threadCondition: 'dry' }],
]

function bodyOf([component, application, boltCount, value, unit, section, page, extra]: Line): CreateSpecBody {
  return {
    kind: 'joint', jointClass: 'general', component, application, boltCount,
    ...(value === null ? {} : { target: { value, unit } }),
    source: { title: 'Demo manual, fleet edition', section, page, date: '2025' },
    ...extra,
  }
}

/** Thirty specs, one of them revised, one withdrawn, and three that wait. @returns revision ids by component */
export async function seedSpecs(garage: Garage): Promise<Map<string, string>> {
  const { foreman, quality, technician2 } = garage.people
  const revisions = new Map<string, string>()
  const approved = async (body: CreateSpecBody, daysAgo: number, governs?: 'target' | 'printed') => {
    const { spec } = await act(garage, foreman, at(garage, daysAgo, 9), ctx => createSpec(ctx, body))
    const { revision } = await act(garage, quality, at(garage, daysAgo, 10), ctx => approveSpec(ctx, spec.id, { governs }))
    return { spec, revision }
  }
  for (const line of lines) {
    const { revision } = await approved(bodyOf(line), 363)
    revisions.set(line[0], revision.id)
  }
  const flagged = bodyOf(['Oil cooler cover', 'Engine, lubrication', 6, 20, 'lbf.ft', '5-11', '191', { ...sealing, pattern: 'circle', printed: { value: 25, unit: 'N.m' } }])
  revisions.set('Oil cooler cover', (await approved(flagged, 200, 'target')).revision.id)
  const old = await approved(bodyOf(['Coolant pipe clamp', cooling, 2, 7, 'N.m', '6-19', '229', { pattern: 'row' }]), 300)
  const { kind, component, application, appliesTo, ...body } = bodyOf(['Coolant pipe clamp', cooling, 2, 8, 'N.m', '6-19', '229', { pattern: 'row' }])
  await act(garage, foreman, at(garage, 60, 14), ctx => reviseSpec(ctx, old.spec.id, body))
  revisions.set(component, (await act(garage, quality, at(garage, 59, 9), ctx => approveSpec(ctx, old.spec.id))).revision.id)
  const gone = await approved(bodyOf(['Expansion tank bracket', cooling, 2, 14, 'N.m', '6-07', '209', { pattern: 'row' }]), 250)
  await act(garage, quality, at(garage, 30, 16), ctx => withdrawSpec(ctx, gone.spec.id, 'The bracket is riveted since the 2025 edition'))
  const draft = await act(garage, technician2, at(garage, 1, 9), ctx => createSpec(ctx, bodyOf(['Bypass hose fitting', cooling, 1, 28, 'N.m', '6-16', '223', sealing])))
  revisions.set('Bypass hose fitting', draft.revision.id)
  await act(garage, technician2, at(garage, 4, 11), ctx => createSpec(ctx, bodyOf(['Turbo oil return', 'Engine, lubrication', 2, 85, 'lbf.in', '5-19', '197', { ...sealing, pattern: 'row', printed: { value: 13, unit: 'N.m' } }])))
  for (const [size, value] of [['M8, class 8.8, dry', 25], ['M10, class 8.8, dry', 50], ['M12, class 8.8, dry', 85]] as const) {
    await approved({ kind: 'general_table', jointClass: 'general', component: size, application: 'General torque table', threadCondition: 'clean and dry', target: { value, unit: 'N.m' }, source: { title: 'Demo workshop tables', section: 'Table 2', page: '9' } }, 362)
  }
  return revisions
}
