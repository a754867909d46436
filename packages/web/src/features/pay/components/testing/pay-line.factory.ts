import type { PayLine, PersonWeek } from '@driprail/shared/domain/pay/pay-week.types';

export function aPayLine(parts: Partial<PayLine>): PayLine {
  return {
    key: 'line',
    personId: 'sefa',
    kind: 'hourly',
    label: 'Hours by the clock',
    workedOn: null,
    hours: null,
    rate: null,
    amountCents: 0,
    isPayable: true,
    inRegularRate: false,
    jobId: null,
    jobNumber: null,
    visitId: null,
    correctsLineId: null,
    working: [],
    rule: '',
    ...parts,
  };
}

export function aPersonWeek(parts: Partial<PersonWeek>): PersonWeek {
  return {
    personId: 'sefa',
    name: 'Sefa Lund',
    hoursByDay: {},
    hoursWorked: '0',
    overtimeHours: '0',
    regularRate: null,
    lines: [],
    warnings: [],
    totals: {
      hourly: 0,
      flat: 0,
      commission: 0,
      overtimePremium: 0,
      makeUp: 0,
      tips: 0,
      tipsAlreadyReceived: 0,
      adjustments: 0,
      gross: 0,
    },
    ...parts,
  };
}
