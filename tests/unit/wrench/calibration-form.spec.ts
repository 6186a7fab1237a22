import { describe, expect, it } from 'vitest'
import { createCalibrationBody } from '#shared/schemas/wrenches'
import { ApiError } from '../../../utils/api-error'
import { asksFor, defaultPoints, emptyCalibrationForm, isUntouched, nextPoint, testPoints, type CalibratedWrench, type CalibrationForm } from '../../../utils/calibration-form'
import { judgePoint, outcomeOf } from '../../../utils/calibration-judge'
import { isBlock, numbersIn, pasteBlock } from '../../../utils/calibration-paste'
import { readCalibrationForm } from '../../../utils/calibration-read'
import { readForm } from '../../../utils/form-issues'

const wrench: CalibratedWrench = {
  kind: 'setting', toolClass: null, range: { min: 20, max: 100, unit: 'N.m', minNm: 20, maxNm: 100 },
  graduation: { value: 0.5, unit: 'N.m', nm: 0.5 }, directions: null, permissiblePercent: 4, intervalMonths: 12,
}

function withReadings(references: string[][], change: Partial<CalibrationForm> = {}): CalibrationForm {
  const form = emptyCalibrationForm(wrench, '2026-12-01')
  const fill = (points: CalibrationForm['asFound'], rows: string[][]) => points.map((point, index) => ({
    ...point, readings: point.readings.map((reading, place) => ({ ...reading, reference: rows[index]?.[place] ?? '' })),
  }))
  return { ...form, laboratory: 'North lab', certificateNumber: 'C-1', uncertaintyPercent: '0,6', asFound: fill(form.asFound, references), ...change }
}

const good = [['20', '20.1', '19.9', '20', '20'], ['60.6', '60.9', '60.5', '60.8', '60.7'], ['100', '100', '101', '99', '100']]

describe('test points', () => {
  it.each([
    [{ min: 20, max: 100 }, [20, 60, 100]],
    [{ min: 10, max: 100 }, [10, 60, 100]],
    [{ min: 80, max: 100 }, [80, 100]],
    [{ min: 50, max: 50 }, [50]],
  ])('of %j are %j', (range, points) => {
    expect(testPoints(range)).toEqual(points)
  })

  it('have room for the readings of the class, for each direction', () => {
    expect(defaultPoints({ ...wrench, toolClass: 'II-C', directions: ['clockwise', 'anticlockwise'] }, 'N.m').map(point => [point.target, point.direction, point.readings.length]))
      .toEqual([['20', 'clockwise', 10], ['60', 'clockwise', 10], ['100', 'clockwise', 10], ['20', 'anticlockwise', 10], ['60', 'anticlockwise', 10], ['100', 'anticlockwise', 10]])
  })

  it('come in another unit of the certificate', () => {
    expect(defaultPoints(wrench, 'lbf.ft').map(point => point.target)).toEqual(['14.75', '44.26', '73.76'])
  })

  it('go on as roomy as before', () => {
    expect(nextPoint(defaultPoints(wrench, 'N.m'))).toMatchObject({ key: 4, target: '', direction: '' })
    expect(nextPoint([]).readings).toHaveLength(5)
  })
})

describe('a calibration form', () => {
  it('sends the set value as indicated', () => {
    const body = readForm(createCalibrationBody, readCalibrationForm(withReadings(good)))
    expect(body.asFound?.[1]).toEqual({
      target: { value: 60, unit: 'N.m' },
      readings: [60.6, 60.9, 60.5, 60.8, 60.7].map(reference => ({ indicated: 60, reference })),
    })
    expect(body.reference).toEqual({ uncertaintyPercent: 0.6 })
    expect(body.asLeft).toBeUndefined()
  })

  it('leaves room at the end of a point empty', () => {
    const body = readForm(createCalibrationBody, readCalibrationForm(withReadings([['20', '20'], ['60'], ['100']])))
    expect(body.asFound?.map(point => point.readings.length)).toEqual([2, 1, 1])
  })

  it.each([
    ['asFound.0.readings.1.reference', withReadings([['20', '', '20'], ['60'], ['100']])],
    ['asFound.2.readings', withReadings([['20'], ['60']])],
    ['asFound.1.readings.0.reference', withReadings([['20'], ['sixty'], ['100']])],
    ['asFoundUnavailable.reason', withReadings([], { asFoundMeasured: false, asLeft: withReadings(good).asFound })],
    ['asFound', withReadings(good, { asFound: [] })],
    ['laboratory', withReadings(good, { laboratory: ' ' })],
  ])('says what is wrong at %s', (path, form) => {
    let issues: readonly { path: string }[] = []
    try {
      readForm(createCalibrationBody, readCalibrationForm(form))
    } catch (error) {
      if (error instanceof ApiError) issues = error.issues
    }
    expect(issues.map(issue => issue.path)).toContain(path)
  })

  it('asks for as left after an adjustment or without an as found', () => {
    const form = emptyCalibrationForm(wrench, '2026-12-01')
    expect([form, { ...form, adjusted: true }, { ...form, asFoundMeasured: false }, { ...form, asLeftMeasured: true }].map(one => asksFor(one, 'asLeft')))
      .toEqual([false, true, true, true])
    expect(isUntouched(form.asFound)).toBe(true)
    expect(isUntouched(withReadings(good).asFound)).toBe(false)
  })
})

describe('judging while it is typed', () => {
  it('has the sign of the standard: 96 given at 100 set reads high and fails', () => {
    const form = withReadings([[], [], ['96']])
    const [, , last] = form.asFound
    const judged = last && judgePoint(form, last, wrench)
    expect(judged?.readings[0]?.deviationPercent).toBeCloseTo(4.1667, 4)
    expect(judged?.readings[0]?.inside).toBe(false)
    expect(judged?.missing).toBe(4)
  })

  it('computes W and W′ of the point', () => {
    const form = withReadings(good)
    const [, middle] = form.asFound
    const figures = middle && judgePoint(form, middle, wrench).figures
    expect(figures?.meanDeviationPercent).toBeCloseTo(-1.15268, 4)
    expect(figures?.wPercent).toBeCloseTo(2 * Math.hypot(0.3, 0.240562612, 0.116492056), 6)
    expect(figures?.wPrimePercent).toBeCloseTo(1.1526759595 + (figures?.wPercent ?? 0), 6)
  })

  it('takes the certificate’s own figures instead', () => {
    const form = withReadings(good, { statesUncertainty: true })
    const [point] = form.asFound.map(one => ({ ...one, wPrimePercent: '2,5' }))
    expect(point && judgePoint(form, point, wrench).figures).toMatchObject({ wPercent: null, wPrimePercent: 2.5 })
  })

  it('says the result and the due date before saving', () => {
    expect(outcomeOf(withReadings(good), wrench)).toMatchObject({ result: 'pass', usable: true, dueOn: '2027-12-01', asLeft: null })
    const failed = withReadings([['20'], ['60'], ['90']])
    expect(outcomeOf(failed, wrench)).toMatchObject({ result: 'fail', usable: false })
    expect(outcomeOf(failed, wrench).asFound?.worst.target).toBe(100)
    expect(outcomeOf({ ...failed, adjusted: true, asLeft: withReadings(good).asFound }, wrench)).toMatchObject({ result: 'fail', usable: true })
    expect(outcomeOf({ ...failed, asFoundMeasured: false, asLeft: withReadings(good).asFound }, wrench)).toMatchObject({ result: 'pass', usable: true })
    expect(outcomeOf({ ...failed, adjusted: true }, wrench)).toMatchObject({ result: 'fail', usable: null })
    expect(outcomeOf({ ...emptyCalibrationForm(wrench, ''), performedOn: 'x' }, wrench)).toMatchObject({ result: null, usable: null, dueOn: null })
  })
})

describe('pasting from a spreadsheet', () => {
  const points = () => defaultPoints(wrench, 'N.m')
  const references = (all: ReturnType<typeof points>) => all.map(point => point.readings.map(reading => reading.reference))
  const at = { point: 0, reading: 0, field: 'reference' } as const

  it('reads decimal commas and leaves headings out', () => {
    expect(numbersIn('Point\tReading 1\n20,5 N·m\t-1\r\n\n')).toEqual([['1'], ['20.5', '-1']])
    expect(isBlock('20.5')).toBe(false)
    expect(isBlock('20\t21')).toBe(true)
  })

  it('lays rows of readings one point each, without a leading point', () => {
    const block = '20\t1\t2\t3\t4\t5\n60\t6\t7\t8\t9\t10'
    const pasted = pasteBlock(points(), at, block)
    expect(references(pasted.points).slice(0, 2)).toEqual([['1', '2', '3', '4', '5'], ['6', '7', '8', '9', '10']])
    expect(pasted.left).toBe(0)
  })

  it('runs a column through the readings and on into the next point', () => {
    const pasted = pasteBlock(points(), { ...at, reading: 3 }, '1\n2\n3')
    expect(references(pasted.points).slice(0, 2)).toEqual([['', '', '', '1', '2'], ['3', '', '', '', '']])
  })

  it('takes pairs where the indicated field is pasted into', () => {
    const pasted = pasteBlock(points(), { ...at, field: 'indicated' }, '20\t20.1\n20\t20.2')
    expect(pasted.points[0]?.readings.slice(0, 2)).toEqual([{ indicated: '20', reference: '20.1' }, { indicated: '20', reference: '20.2' }])
  })

  it('makes room for more readings and counts what finds none', () => {
    const pasted = pasteBlock(points(), { ...at, point: 2 }, '1\t2\t3\t4\t5\t6\n7\t8')
    expect(pasted.points[2]?.readings).toHaveLength(6)
    expect(pasted.left).toBe(2)
  })
})
