import type { CalibrationAnswer, WrenchDetail } from '#shared/schemas/wrenches'

const person = { id: '00000000-0000-4000-8000-0000000000aa', name: 'Noor Haddad' }
const wrenchId = '00000000-0000-4000-8000-000000000010'

export const calibration: CalibrationAnswer = {
  id: '00000000-0000-4000-8000-000000000011', wrenchId, performedOn: '2026-03-01', laboratory: 'Nordhafen Calibration',
  certificateNumber: 'NC-1', referenceUncertaintyPercent: 0.4, asFoundUnavailableReason: null, adjusted: false, note: null,
  result: 'fail', usable: false, decisionRule: 'Every reading within the permissible deviation', dueOn: '2027-03-01',
  points: [{
    phase: 'as_found', direction: null, target: { value: 100, unit: 'N.m' }, targetNm: 100, meanDeviationPercent: 2.1,
    deviationsPercent: [0, 4.1667], readings: [{ indicated: 100, reference: 100 }, { indicated: 100, reference: 96 }],
    limitPercent: 4, verdict: 'fail', wPercent: 0.9, wPrimePercent: 3,
  }],
  recordedBy: person, recordedAt: '2026-03-02T08:00:00Z',
}

export const wrench: WrenchDetail = {
  id: wrenchId, assetTag: 'TW-07', serial: 'S-1', kind: 'setting', toolClass: null,
  range: { min: 20, max: 100, unit: 'N.m', minNm: 20, maxNm: 100 }, graduation: { value: 0.5, unit: 'N.m', nm: 0.5 },
  gripLengthMm: 420, drive: '1/2 in', directions: null, permissiblePercent: 4, intervalMonths: 12, intervalCycles: 5000,
  location: 'Rack 1', state: 'in_use', stateReason: null,
  calibration: { id: calibration.id, status: 'overdue', performedOn: '2025-11-20', dueOn: '2026-11-20', daysLeft: -11, cyclesSince: 120 },
  figures: [{ phase: 'as_found', direction: null, targetNm: 100, meanDeviationPercent: 1.2, wPercent: 0.9, wPrimePercent: 2.1 }],
  can: { update: true, quarantine: true, calibrate: true }, calibrations: [calibration],
}
