import type { CreateCalibrationBody, CreateWrenchBody } from '#shared/schemas/wrenches'
import { recordCalibration } from '../server/services/wrenches/calibrations'
import { addWrench, changeWrench } from '../server/services/wrenches/wrenches'
import { act, at, type Garage } from './garage'

interface Tool {
  tag: string
  body: Omit<CreateWrenchBody, 'assetTag' | 'serial' | 'intervalMonths'>
  /** Days ago of each calibration, oldest first, and what it read off by on average, percent. */
  calibrated: [number, number][]
}

const range = (min: number, max: number, unit: 'N.m' | 'lbf.ft' | 'lbf.in' = 'N.m') => ({ min, max, unit })
const graduation = (value: number, unit: 'N.m' | 'lbf.ft' | 'lbf.in' = 'N.m') => ({ value, unit })

const tools: Tool[] = [
  { tag: 'W-01', body: { kind: 'setting', drive: '1/4 in', range: range(2, 10), graduation: graduation(0.1) }, calibrated: [[420, 0.6], [80, 0.8]] },
  { tag: 'W-02', body: { kind: 'setting', drive: '1/4 in', range: range(40, 200, 'lbf.in'), graduation: graduation(1, 'lbf.in') }, calibrated: [[700, 0.4], [372, 0.9]] },
  { tag: 'W-03', body: { kind: 'indicating', drive: '3/8 in', range: range(5, 60), graduation: graduation(0.1), directions: ['clockwise', 'anticlockwise'] }, calibrated: [[400, -0.3], [60, -0.2]] },
  { tag: 'W-04', body: { kind: 'setting', drive: '3/8 in', range: range(5, 25), graduation: graduation(0.25) }, calibrated: [[380, 0.5], [40, 0.6]] },
  { tag: 'W-05', body: { kind: 'setting', drive: '3/8 in', range: range(10, 60, 'lbf.ft'), graduation: graduation(0.5, 'lbf.ft') }, calibrated: [[390, 0.9], [30, 0.4]] },
  { tag: 'W-07', body: { kind: 'setting', drive: '3/8 in', range: range(10, 60), graduation: graduation(0.5), gripLengthMm: 320 }, calibrated: [[410, 0.3], [50, 0.5]] },
  { tag: 'W-08', body: { kind: 'setting', drive: '1/2 in', range: range(40, 200), graduation: graduation(1), gripLengthMm: 470 }, calibrated: [[400, 1.2], [90, 0.9]] },
  { tag: 'W-09', body: { kind: 'setting', drive: '1/2 in', range: range(30, 150, 'lbf.ft'), graduation: graduation(1, 'lbf.ft') }, calibrated: [[720, 0.7], [348, 1.1]] },
  { tag: 'W-10', body: { kind: 'setting', drive: '3/4 in', range: range(150, 750), graduation: graduation(5) }, calibrated: [[380, 0.8], [190, 0.6]] },
  { tag: 'W-11', body: { kind: 'indicating', drive: '1/2 in', range: range(20, 340), graduation: graduation(0.5), directions: ['clockwise', 'anticlockwise'] }, calibrated: [[395, -0.4], [70, -0.1]] },
  { tag: 'W-12', body: { kind: 'setting', drive: '1/2 in', range: range(20, 120), graduation: graduation(1) }, calibrated: [[405, 1.8], [12, 5.4]] },
  { tag: 'W-14', body: { kind: 'setting', drive: '1 in', range: range(200, 1000), graduation: graduation(10) }, calibrated: [[420, 0.9], [100, 0.7]] },
]

/** A calibration at 20, 60 and 100 % whose readings scatter a little about their deviation. */
function calibrationOf(garage: Garage, tool: Tool, daysAgo: number, deviationPercent: number): CreateCalibrationBody {
  const { max, min, unit } = tool.body.range
  const readings = (target: number) => Array.from({ length: 5 }, () => {
    const deviation = deviationPercent + garage.random.between(-0.25, 0.25)
    return { indicated: target, reference: Number((target / (1 + deviation / 100)).toPrecision(5)) }
  })
  const points = [...new Set([Math.max(min, max * 0.2), max * 0.6, max])]
  return {
    performedOn: at(garage, daysAgo, 10).toISOString().slice(0, 10),
    laboratory: 'Tarn Metrology, invented for this demo',
    certificateNumber: `TM-${tool.tag.slice(2)}-${daysAgo}`,
    reference: { uncertaintyPercent: 0.6 },
    asFound: points.map(target => ({ target: { value: target, unit }, readings: readings(target) })),
    adjusted: false,
  }
}

/** The crib, with its calibrations over the years. @returns the wrench ids by tag */
export async function seedWrenches(garage: Garage): Promise<Map<string, string>> {
  const { quality } = garage.people
  const ids = new Map<string, string>()
  for (const [index, tool] of tools.entries()) {
    const body = { ...tool.body, assetTag: tool.tag, serial: `${7000 + index * 137}`, intervalMonths: 12, location: 'Crib, north wall' }
    const { id } = await act(garage, quality, at(garage, 364, 8, index), ctx => addWrench(ctx, body))
    ids.set(tool.tag, id)
    for (const [daysAgo, deviation] of tool.calibrated.filter(([days]) => days > 20)) {
      await act(garage, quality, at(garage, Math.min(daysAgo, 363), 11, index), ctx => recordCalibration(ctx, id, calibrationOf(garage, tool, daysAgo, deviation)))
    }
  }
  return ids
}

/** What has become of the crib by today: one was found out of tolerance, one is at the laboratory. */
export async function seedCribToday(garage: Garage, wrenches: Map<string, string>): Promise<void> {
  const { quality } = garage.people
  const found = tools.find(tool => tool.tag === 'W-12')
  const foundId = wrenches.get('W-12')
  const awayId = wrenches.get('W-14')
  if (!found || !foundId || !awayId) throw new Error('The crib is not complete.')
  await act(garage, quality, at(garage, 2, 10), ctx => recordCalibration(ctx, foundId, calibrationOf(garage, found, 3, 5.4)))
  await act(garage, quality, at(garage, 6, 15), ctx => changeWrench(ctx, awayId, { state: 'at_laboratory', stateReason: 'Yearly calibration, sent by courier' }))
}
