import type { SizeClass } from '../../contracts/fields.ts';
import type { Condition } from '../board/crew-time.ts';
import { visitMinutes } from '../board/crew-time.ts';
import type { Surcharges } from '../menu/condition-surcharge.ts';
import type { ClockStyle } from '../time/format.ts';
import { formatClock } from '../time/format.ts';
import { addMinutes, isBefore } from '../time/zone.ts';

export interface ChangeLine {
  id: string;
  serviceId: string;
  serviceName: string;
  vehicleId: string | null;
  vehicle: string;
  sizeClass: SizeClass;
  priceCents: number;
  minutes: number;
  isFinished: boolean;
}

/** A service as it can be sold at the car today. */
export interface Offer {
  serviceId: string;
  name: string;
  kind: 'package' | 'single' | 'add_on';
  skills: string[];
  /** What it asks of the weather, in words; empty for nothing. */
  weather: string;
  prices: { sizeClass: SizeClass; priceCents: number; minutes: number }[];
}

export interface ChangeFacts {
  zone: string;
  clock: ClockStyle;
  startedAt: string | null;
  plannedFrom: string | null;
  /** People who work the visit, trainees left out. */
  crewSize: number;
  crewSkills: string[];
  lines: ChangeLine[];
  offers: Offer[];
  /** What a dirtier car costs and takes on top today. */
  surcharges: Surcharges;
  /** The van's next visit of the day. */
  next: { customerName: string; windowTo: string | null; driveMinutes: number } | null;
}

export type RaisedCondition = Exclude<Condition, 'clean' | 'normal'> | 'other';
export const raisedConditions = ['dirty', 'very_dirty', 'other'] as const satisfies readonly RaisedCondition[];
export const conditionNames: Record<RaisedCondition, string> = {
  dirty: 'Dirty',
  very_dirty: 'Very dirty',
  other: 'Another amount',
};

export type Change =
  | { kind: 'add'; serviceId: string; vehicleId: string | null; sizeClass: SizeClass }
  | { kind: 'drop'; lineId: string }
  | { kind: 'swap'; lineId: string; serviceId: string }
  | { kind: 'condition'; lineId: string; condition: RaisedCondition; extraCents: number; extraMinutes: number };

export const hindranceCodes = ['missing_skill', 'next_promise', 'price_differs'] as const;
export interface Hindrance {
  code: (typeof hindranceCodes)[number];
  message: string;
}

/** A line as it will be; without an id it is new. */
export type ChangedLine = Omit<ChangeLine, 'id'> & { id: string | null };

export interface Judged {
  before: ChangeLine[];
  after: ChangedLine[];
  priceDifferenceCents: number;
  /** Of the crew, not of one person. */
  minutesDifference: number;
  finishBefore: string;
  finishAfter: string;
  /** What stands in the way: with any of these the board is asked. */
  hindrances: Hindrance[];
  /** What changes, for the history: "Engine bay added". */
  words: string;
}

export type Judgement = { ok: true; change: Judged } | { ok: false; message: string };

/** What a change at the car costs, when the crew is then through, and what stands in its way. The phone and the API ask it alike. */
export function judgeChange(facts: ChangeFacts, change: Change, now: string): Judgement {
  const changed = changeLines(facts, change);
  if (!changed.ok) return changed;
  const { after, words, skills } = changed;
  const minutesBefore = crewMinutes(facts.lines, facts.crewSize);
  const minutesAfter = crewMinutes(after, facts.crewSize);
  const finishBefore = finishOf(facts, minutesBefore, now);
  const minutesDifference = minutesAfter - minutesBefore;
  const finishAfter = later(addMinutes(finishBefore, minutesDifference), now);
  const price = (lines: readonly { priceCents: number }[]) => lines.reduce((sum, line) => sum + line.priceCents, 0);
  const hindrances = [
    ...missingSkill(facts, skills),
    ...(minutesDifference > 0 ? nextPromise(facts, finishAfter) : []),
  ];
  const priceDifferenceCents = price(after) - price(facts.lines);
  return {
    ok: true,
    change: {
      ...{ before: facts.lines, after, priceDifferenceCents, minutesDifference, finishBefore, finishAfter },
      ...{ hindrances, words },
    },
  };
}

type Changed = { ok: true; after: ChangedLine[]; words: string; skills: string[] } | { ok: false; message: string };

function changeLines(facts: ChangeFacts, change: Change): Changed {
  if (change.kind === 'add') return addLine(facts, change);
  const line = facts.lines.find((one) => one.id === change.lineId);
  if (!line) return no('That service is not on this visit any more.');
  if (line.isFinished) return no('That service is finished; a finished one stays on the job.');
  const put = (next: ChangedLine | null) =>
    facts.lines.flatMap((one): ChangedLine[] => (one.id === line.id ? (next ? [next] : []) : [one]));
  if (change.kind === 'drop') {
    if (facts.lines.length === 1) return no('A visit keeps at least one service. Call the visit off instead.');
    return { ok: true, after: put(null), words: `${line.serviceName} dropped`, skills: [] };
  }
  if (change.kind === 'swap') {
    const offer = offerFor(facts, change.serviceId, line.sizeClass);
    if (!offer) return no('That is not on the menu for this size class.');
    if (offer.service.serviceId === line.serviceId) return no('That is the service it is already.');
    const { priceCents, minutes } = offer.price;
    const next = { ...line, serviceId: offer.service.serviceId, serviceName: offer.service.name, priceCents, minutes };
    const words = `${line.serviceName} swapped for ${offer.service.name}`;
    return { ok: true, after: put(next), words, skills: offer.service.skills };
  }
  const { extraCents, extraMinutes } = surcharge(line, change, facts.surcharges);
  if (extraCents <= 0 && extraMinutes <= 0) return no('Give minutes or an amount.');
  const next = { ...line, priceCents: line.priceCents + extraCents, minutes: line.minutes + extraMinutes };
  const name = change.condition === 'other' ? 'raised' : conditionNames[change.condition].toLowerCase();
  return { ok: true, after: put(next), words: `Condition ${name}, ${line.serviceName}`, skills: [] };
}

function addLine(facts: ChangeFacts, change: Extract<Change, { kind: 'add' }>): Changed {
  const offer = offerFor(facts, change.serviceId, change.sizeClass);
  if (!offer) return no('That is not on the menu for this size class.');
  const { serviceId, name, skills } = offer.service;
  const vehicle = facts.lines.find((line) => line.vehicleId === change.vehicleId)?.vehicle ?? '';
  const line: ChangedLine = {
    ...{ id: null, serviceId, serviceName: name, vehicleId: change.vehicleId, vehicle, sizeClass: change.sizeClass },
    ...{ priceCents: offer.price.priceCents, minutes: offer.price.minutes, isFinished: false },
  };
  return { ok: true, after: [...facts.lines, line], words: `${name} added`, skills };
}

function offerFor(facts: ChangeFacts, serviceId: string, sizeClass: SizeClass) {
  const service = facts.offers.find((one) => one.serviceId === serviceId);
  const price = service?.prices.find((one) => one.sizeClass === sizeClass);
  return service && price ? { service, price } : null;
}

/** By the menu's percents of the condition; price cents round half up, minutes up to five. Else as typed. */
export function surcharge(
  line: Pick<ChangeLine, 'priceCents' | 'minutes'>,
  change: Pick<Extract<Change, { kind: 'condition' }>, 'condition' | 'extraCents' | 'extraMinutes'>,
  surcharges: Surcharges,
): { extraCents: number; extraMinutes: number } {
  if (change.condition === 'other') return { extraCents: change.extraCents, extraMinutes: change.extraMinutes };
  const { pricePercent, minutesPercent } = surcharges[change.condition];
  return {
    extraCents: Math.floor((line.priceCents * pricePercent + 50) / 100),
    extraMinutes: Math.ceil((line.minutes * minutesPercent) / 100 / 5) * 5,
  };
}

function crewMinutes(lines: readonly { minutes: number; isFinished: boolean }[], crewSize: number): number {
  return visitMinutes(
    lines.map((line) => line.minutes),
    crewSize,
  );
}

/** Never before now: a crew that is over is through now at the earliest. */
function finishOf({ startedAt, plannedFrom }: ChangeFacts, minutes: number, now: string): string {
  const from = startedAt ?? later(plannedFrom ?? now, now);
  return later(addMinutes(from, minutes), now);
}

function later(a: string, b: string): string {
  return isBefore(a, b) ? b : a;
}

function missingSkill({ crewSkills }: ChangeFacts, needed: readonly string[]): Hindrance[] {
  const missing = needed.filter((skill) => !crewSkills.includes(skill));
  if (missing.length === 0) return [];
  return [{ code: 'missing_skill', message: `Nobody in this crew has the skill ${missing.join(' and ')}.` }];
}

function nextPromise({ next, zone, clock }: ChangeFacts, finishAt: string): Hindrance[] {
  if (!next?.windowTo) return [];
  const there = addMinutes(finishAt, next.driveMinutes);
  if (!isBefore(next.windowTo, there)) return [];
  const said = (instant: string) => formatClock(instant, zone, clock);
  const message = `${next.customerName} is promised by ${said(next.windowTo)}; the van would be there about ${said(there)}.`;
  return [{ code: 'next_promise', message }];
}

function no(message: string): { ok: false; message: string } {
  return { ok: false, message };
}
