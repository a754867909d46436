import type { CrewShare, DatedRate, DoneLine, PayAdjustment, PayTip, PayWeekInput } from '../pay-week.types.ts';

export type EntryInput = PayWeekInput['entries'][number];

/** A week from Monday 4 May 2026, 00:00, in a zone with clock changes; Ada alone, nothing recorded. */
export function aWeek(parts: Partial<PayWeekInput> = {}): PayWeekInput {
  return {
    startsAt: '2026-05-04T04:00:00.000Z',
    endsAt: '2026-05-11T04:00:00.000Z',
    zone: 'America/New_York',
    clock: '24',
    rules: {
      ...{ overtimeRuleSet: 'us_federal', minimumWage: '7.25', crewSplit: 'equal', mealBreakMinutes: 30 },
      ...{ punchRoundingMinutes: null, premiumRounding: 'half_up' },
    },
    people: [{ id: 'ada', name: 'Ada Brook' }],
    entries: [],
    rates: [],
    doneLines: [],
    tips: [],
    adjustments: [],
    plans: [],
    places: [],
    carried: [],
    asOf: '2026-05-12T00:00:00.000Z',
    ...parts,
  };
}

/** A clock entry of Ada's on a job, unless the parts say otherwise. */
export function anEntry(startedAt: string, endedAt: string | null, parts: Partial<EntryInput> = {}): EntryInput {
  return {
    id: `entry-${startedAt}`,
    personId: 'ada',
    kind: 'job',
    visitId: null,
    startedAt,
    endedAt,
    interrupted: false,
    ...parts,
  };
}

/** Entries of so many minutes a day from 08:00 New York time, Monday first. */
export function aWorkedWeek(minutesByDay: number[], parts: Partial<EntryInput> = {}): EntryInput[] {
  return minutesByDay.flatMap((minutes, day) => {
    if (minutes === 0) return [];
    const start = Date.parse('2026-05-04T12:00:00.000Z') + day * 86_400_000;
    return [anEntry(new Date(start).toISOString(), new Date(start + minutes * 60_000).toISOString(), parts)];
  });
}

export function aRate(kind: DatedRate['kind'], value: string, parts: Partial<DatedRate> = {}): DatedRate {
  return {
    id: `${kind}-${value}`,
    kind,
    personId: null,
    serviceId: null,
    clockKind: null,
    value,
    startsOn: '2026-01-01',
    ...parts,
  };
}

export function aCrew(...personIds: string[]): CrewShare[] {
  return personIds.map((personId, position) => ({ personId, position, weight: 1, isTrainee: false, minutes: 60 }));
}

export function aDoneLine(jobNumber: number, commissionableCents: number, parts: Partial<DoneLine> = {}): DoneLine {
  return {
    lineId: `line-${jobNumber}`,
    jobId: `job-${jobNumber}`,
    jobNumber,
    visitId: `visit-${jobNumber}`,
    serviceId: 'wash',
    serviceName: 'Full wash',
    sizeClass: 'sedan',
    isAddOn: false,
    commissionableCents,
    doneAt: '2026-05-05T18:00:00.000Z',
    crew: aCrew('ada'),
    ...parts,
  };
}

export function aTip(id: string, amountCents: number, parts: Partial<PayTip> = {}): PayTip {
  return {
    id,
    jobId: 'job-1',
    jobNumber: 1,
    amountCents,
    method: 'card',
    receivedAt: '2026-05-05T18:00:00.000Z',
    alreadyReceived: false,
    crew: aCrew('ada'),
    ...parts,
  };
}

export function anAdjustment(
  kind: PayAdjustment['kind'],
  amountCents: number,
  parts: Partial<PayAdjustment> = {},
): PayAdjustment {
  return {
    id: `${kind}-${amountCents}`,
    personId: 'ada',
    kind,
    amountCents,
    reason: 'As agreed',
    correctsLineId: null,
    ...parts,
  };
}
