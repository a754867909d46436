import { foldWork } from '@driprail/shared/domain/job-work/fold-work';
import type { WorkKind } from '@driprail/shared/domain/job-work/fold-work';
import { judgeChange } from '@driprail/shared/domain/job-work/judge-change';
import { usualSurcharges } from '@driprail/shared/domain/menu/condition-surcharge';
import type { ChangeLine, Offer } from '@driprail/shared/domain/job-work/judge-change';
import { planWork, upToHere } from '@driprail/shared/domain/job-work/work-plan';
import type { WorkLine } from '@driprail/shared/domain/job-work/work-plan';
import { checklistSteps } from './checklist-steps.ts';
import { ZONE, instant, minuteOf } from './calendar.ts';
import type { Book, VisitRow } from './job-rows.ts';
import type { DemoPeople, DemoPerson } from './people.ts';
import { named } from './people.ts';
import { at } from './random.ts';

/** Checklists, must-knows and what today's crews have pressed at the car. */
export function writeWork(book: Book, people: DemoPeople): void {
  writeChecklists(book);
  writeMustKnows(book);
  writeToday(book, people);
}

function writeChecklists({ rows, ids, calendar }: Book): void {
  for (const service of rows.services) {
    const list = checklistSteps[service.name];
    if (!list) throw new Error(`${service.name} has no checklist`);
    rows.serviceChecklists.push({
      ...{ serviceId: service.id, version: 1, asksNote: list.asksNote ?? false },
      steps: list.steps.map((step) => ({ id: ids(), ...step })),
      createdAt: instant(calendar.rulesFrom, minuteOf('09:00')),
    });
  }
}

/** The notes of the demo say it in words; the crew gets it as something to confirm. */
function writeMustKnows({ rows }: Book): void {
  const ringing = new Set<string>();
  for (const address of rows.addresses) {
    const notes = address.accessNotes ?? '';
    const hasDog = notes.startsWith('Dog');
    const takesKey = notes.startsWith('Key in');
    if (notes.startsWith('Ring')) ringing.add(address.customerId);
    Object.assign(address, { hasDog, shutsGate: hasDog, takesKey });
    address.keyGoesBack = takesKey ? 'Lock box by the side door' : '';
  }
  for (const customer of rows.customers) {
    customer.isScentFree = customer.notes?.startsWith('No scent') ?? false;
    customer.ringsFirst = ringing.has(customer.id);
  }
  for (const vehicle of rows.vehicles) {
    vehicle.isCoated = vehicle.notes?.startsWith('Coated') ?? false;
    vehicle.mustKnow = vehicle.notes?.startsWith('Child seat') ? vehicle.notes : '';
  }
}

/** Knot is through its dry work with the customer's key; Curlew asks for one more service at the car. */
function writeToday(book: Book, people: DemoPeople): void {
  const knot = workingVisit(book, 'Knot');
  if (knot) {
    const tomas = named(people.technicians, 'Tomas Reyes');
    pressWork(book, knot, tomas, '08:08', 'key_taken', { words: 'To the customer' });
    tickStages(book, knot, [
      [tomas, '08:40', 'inside_dry'],
      [named(people.technicians, 'Wyn Abara'), '09:25', 'inside_wet'],
    ]);
  }
  const curlew = workingVisit(book, 'Curlew');
  if (curlew) askForChange(book, curlew, named(people.technicians, 'Mara Quist'));
}

function workingVisit({ rows, calendar }: Book, van: string): VisitRow | undefined {
  const vanId = rows.vans.find((one) => one.name === van)?.id;
  const isToday = (visit: VisitRow) => (visit.progressSince ?? calendar.asOf) >= instant(calendar.today, 0);
  return rows.visits.find((visit) => visit.vanId === vanId && visit.progress === 'working' && isToday(visit));
}

function pressWork(
  { rows, ids, calendar }: Book,
  visit: VisitRow,
  by: DemoPerson,
  clock: string,
  kind: WorkKind,
  more: { words?: string; steps?: { lineId: string; stepId: string }[] },
): void {
  const when = instant(calendar.today, minuteOf(clock));
  rows.workEvents.push({
    ...{ id: ids(), visitId: visit.id, kind, steps: [], keys: [], words: '', ...more },
    ...{ userId: by.userId, personId: by.id, deviceAt: when, receivedAt: when, occurredAt: when },
  });
}

function tickStages(
  book: Book,
  visit: VisitRow,
  presses: [DemoPerson, string, Parameters<typeof upToHere>[1]][],
): void {
  const lines = workLines(book, visit);
  const empty = foldWork([], { startedAt: null, stepsOf: new Map() });
  const done = new Set<string>();
  for (const [by, clock, stage] of presses) {
    const steps = planWork(lines, empty.ticks)
      .flatMap((vehicle) => upToHere(vehicle, stage))
      .filter((ref) => !done.has(ref.stepId))
      .slice(0, 3);
    for (const ref of steps) done.add(ref.stepId);
    pressWork(book, visit, by, clock, 'tick', { steps });
  }
}

function linesOf({ rows }: Book, visit: VisitRow): ChangeLine[] {
  const ids = rows.visitLines.filter((link) => link.visitId === visit.id).map((link) => link.jobLineId);
  return rows.jobLines
    .filter((line) => ids.includes(line.id))
    .map((line) => {
      const vehicle = rows.vehicles.find((one) => one.id === line.vehicleId);
      return {
        ...{ id: line.id, serviceId: line.serviceId, vehicleId: line.vehicleId ?? null, sizeClass: line.sizeClass },
        serviceName: rows.services.find((one) => one.id === line.serviceId)?.name ?? '',
        vehicle: vehicle ? `${vehicle.color ?? ''} ${vehicle.label}`.trim() : '',
        ...{ priceCents: line.priceCents, minutes: line.minutes, isFinished: false },
      };
    });
}

function workLines(book: Book, visit: VisitRow): WorkLine[] {
  return linesOf(book, visit).map(({ id: lineId, serviceId, serviceName, vehicleId, vehicle }) => ({
    ...{ lineId, serviceName, vehicleId, vehicle, asksNote: false },
    steps: book.rows.serviceChecklists.find((list) => list.serviceId === serviceId)?.steps ?? [],
  }));
}

/** The customer likes the shine and wants the lamps done too; the van's next promise would not hold. */
function askForChange(book: Book, visit: VisitRow, by: DemoPerson): void {
  const { rows, ids, calendar } = book;
  const lines = linesOf(book, visit);
  const when = instant(calendar.today, minuteOf('10:52'));
  const offers = offersOf(book);
  const lamps = offers.find((offer) => offer.name === 'Headlight restoration');
  const line = at(lines, 0);
  if (!lamps) return;
  const judgement = judgeChange(
    {
      ...{ zone: ZONE, clock: '12', startedAt: instant(calendar.today, minuteOf('09:16')).toISOString() },
      ...{ plannedFrom: null, crewSize: 1, crewSkills: [...by.skills], lines, offers, next: null },
      surcharges: usualSurcharges,
    },
    { kind: 'add', serviceId: lamps.serviceId, vehicleId: line.vehicleId, sizeClass: line.sizeClass },
    when.toISOString(),
  );
  if (!judgement.ok) throw new Error(judgement.message);
  const { before, after, words, priceDifferenceCents, minutesDifference, finishAfter } = judgement.change;
  const message = 'The next visit’s arrival window would not hold.';
  rows.jobChanges.push({
    ...{ id: ids(), visitId: visit.id, jobId: visit.jobId, kind: 'add', state: 'asked', words, before, after },
    ...{ reason: 'Customer asked', priceDifferenceCents, minutesDifference, finishAt: new Date(finishAfter) },
    hindrances: [{ code: 'next_promise', message }],
    ...{ saidYesAt: when, userId: by.userId, personId: by.id },
    ...{ deviceAt: when, receivedAt: when, occurredAt: when },
  });
}

function offersOf({ menu, rows }: Book): Offer[] {
  return [...menu.values()].map(({ id, name, skills, prices }) => ({
    ...{ serviceId: id, name, skills: [...skills], weather: '' },
    kind: rows.services.find((one) => one.id === id)?.kind ?? 'single',
    prices: Object.entries(prices).map(([sizeClass, price]) => ({
      sizeClass: sizeClass as Offer['prices'][number]['sizeClass'],
      ...price,
    })),
  }));
}
