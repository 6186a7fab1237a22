import { asksFor, type CalibrationForm, type Phase, type PointEntry } from './calibration-form'
import { FieldReader, type FormReading } from './form-issues'

/** What the form says, in the words of the API. */
export function readCalibrationForm(form: CalibrationForm): FormReading {
  const read = new FieldReader()
  const value = {
    performedOn: form.performedOn,
    laboratory: form.laboratory,
    certificateNumber: form.certificateNumber,
    reference: { uncertaintyPercent: read.number('reference.uncertaintyPercent', form.uncertaintyPercent) },
    asFound: readPhase(form, 'asFound', read),
    asFoundUnavailable: form.asFoundMeasured ? undefined : { reason: form.unavailableReason },
    asLeft: readPhase(form, 'asLeft', read),
    adjusted: form.adjusted,
    note: read.text(form.note),
  }
  return { value, issues: read.issues }
}

function readPhase(form: CalibrationForm, phase: Phase, read: FieldReader) {
  if (!asksFor(form, phase)) return undefined
  if (form[phase].length === 0) read.issues.push({ path: phase, message: 'Add at least one point.' })
  return form[phase].map((point, index) => readPoint(form, point, `${phase}.${index}`, read))
}

function readPoint(form: CalibrationForm, point: PointEntry, path: string, read: FieldReader) {
  const filled = filledReadings(form, point)
  if (filled.length === 0) read.issues.push({ path: `${path}.readings`, message: 'Write its readings, or take the point out.' })
  const readings = filled.map(({ indicated, reference }, index) => {
    const at = `${path}.readings.${index}`
    if (!reference.trim()) read.issues.push({ path: `${at}.reference`, message: 'This reading is missing.' })
    return {
      indicated: read.number(`${at}.indicated`, form.indicatesPoint ? point.target : indicated),
      reference: read.number(`${at}.reference`, reference),
    }
  })
  return {
    target: { value: read.number(`${path}.target.value`, point.target), unit: form.unit },
    direction: point.direction || undefined,
    wPercent: form.statesUncertainty ? read.number(`${path}.wPercent`, point.wPercent) : undefined,
    wPrimePercent: form.statesUncertainty ? read.number(`${path}.wPrimePercent`, point.wPrimePercent) : undefined,
    readings,
  }
}

/** The readings up to the last one with anything in it: room left over at the end is no reading. */
function filledReadings(form: CalibrationForm, { readings }: PointEntry) {
  const last = readings.findLastIndex(({ indicated, reference }) => reference.trim() || (!form.indicatesPoint && indicated.trim()))
  return readings.slice(0, last + 1)
}
