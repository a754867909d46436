import { formatClock, formatDay, formatSpan } from '../time/format.ts';
import { addMinutes, dayOf, isBefore, minutesBetween, overlaps } from '../time/zone.ts';
import { instantOf } from '../time/zone-instants.ts';
import type { BoardFacts, Move, PlannedVan, PlannedVisit, RidingPerson } from './plan.ts';
import type { Finding, Findings, RefusalCode, WarningCode } from './findings.ts';
import { isEnded, isMovable, progressNames } from './progress.ts';
import { estimateTravel } from './travel.ts';

type Placed = PlannedVisit & { vanId: string; from: string; to: string };

/** Findings, and every visit as it would stand after the moves. */
export interface Judgement extends Findings {
  after: Map<string, PlannedVisit>;
}

/**
 * What stands in the way of a move, judged on the board as it would be afterwards.
 * The screen asks it while a ticket is held, the API asks it again before saving; the database has the last word on overlap.
 */
export function judgeMoves(facts: BoardFacts, visits: Map<string, PlannedVisit>, moves: Move[]): Judgement {
  const after = new Map([...facts.visits.map((v) => [v.id, v] as const), ...visits]);
  for (const move of moves) {
    const visit = after.get(move.visitId);
    if (visit) after.set(visit.id, moved(visit, move, after));
  }
  const findings: Judgement = { refusals: [], warnings: [], after };
  for (const move of moves) {
    const before = visits.get(move.visitId);
    const visit = after.get(move.visitId);
    if (!before || !visit) continue;
    const refusal = refuse(facts, before, visit, after);
    if (refusal) findings.refusals.push(refusal);
    else if (isPlaced(visit)) findings.warnings.push(...warn(facts, visit, [...after.values()].filter(isPlaced)));
  }
  return findings;
}

/** A visit dropped onto one at the same address shares its parking place. */
function moved(visit: PlannedVisit, move: Move, all: Map<string, PlannedVisit>): PlannedVisit {
  const isOff = !move.vanId || !move.from || !move.to;
  const target = {
    ...visit,
    vanId: isOff ? null : move.vanId,
    from: isOff ? null : move.from,
    to: isOff ? null : move.to,
    stopId: move.stopId ?? visit.stopId,
    progress: isOff ? ('unplaced' as const) : visit.progress === 'unplaced' ? ('placed' as const) : visit.progress,
  };
  if (move.stopId || !isPlaced(target)) return target;
  const beside = [...all.values()].find(
    (other) =>
      other.id !== visit.id &&
      other.addressId === visit.addressId &&
      other.vanId === target.vanId &&
      isPlaced(other) &&
      overlaps(other, target),
  );
  return beside ? { ...target, stopId: beside.stopId } : target;
}

function refuse(
  facts: BoardFacts,
  before: PlannedVisit,
  visit: PlannedVisit,
  after: Map<string, PlannedVisit>,
): Finding<RefusalCode> | null {
  const no = (code: RefusalCode, message: string) => ({ visitId: visit.id, code, key: code, message });
  if (!isMovable(before.progress)) {
    return no(
      'not_movable',
      `${before.customerName} is ${progressNames[before.progress].toLowerCase()} and stays where it is.`,
    );
  }
  if (facts.isLocked) return no('locked_day', 'This day’s pay week is locked. Choose another day.');
  if (!isPlaced(visit)) return null;
  if (minutesBetween(visit.from, visit.to) < 5) return no('bad_span', 'A visit takes at least 5 minutes.');
  if (!facts.vans.some((van) => van.id === visit.vanId))
    return no('no_van', 'That van is not on the road. Choose another.');
  const clash = [...after.values()].find(
    (other) =>
      other.id !== visit.id &&
      isPlaced(other) &&
      other.vanId === visit.vanId &&
      other.stopId !== visit.stopId &&
      other.progress !== 'called_off' &&
      overlaps(other, visit),
  );
  if (!clash) return null;
  const van = facts.vans.find((v) => v.id === visit.vanId)?.name ?? 'That van';
  return no(
    'van_overlap',
    `${van} is at ${clash.customerName} until ${formatClock(clash.to ?? '', facts.zone, facts.clock)}. One van can’t be at two stops.`,
  );
}

function warn(facts: BoardFacts, visit: Placed, all: Placed[]): Finding<WarningCode>[] {
  const van = facts.vans.find((v) => v.id === visit.vanId);
  if (!van) return [];
  const riding = van.crew.filter((person) => overlaps(person, visit));
  return [
    ...noCrew(visit, van, riding),
    ...missing(visit, van, riding),
    ...outside(facts, visit),
    ...gaps(visit, all),
    ...overtime(facts, visit, van, riding),
  ];
}

const warning = (visit: Placed, code: WarningCode, key: string, message: string): Finding<WarningCode> => ({
  visitId: visit.id,
  code,
  key: `${code}:${key}`,
  message,
});

function noCrew(visit: Placed, van: PlannedVan, riding: RidingPerson[]) {
  if (riding.length > 0) return [];
  return [warning(visit, 'no_crew', van.id, `Nobody rides in ${van.name} then.`)];
}

/** A trainee brings no skill. */
function missing(visit: Placed, van: PlannedVan, riding: RidingPerson[]) {
  const known = new Set(riding.filter((p) => !p.isTrainee).flatMap((p) => p.skills));
  const skills = riding.length === 0 ? [] : visit.skills.filter((skill) => !known.has(skill));
  const tools = visit.equipment.filter((tool) => !van.equipment.includes(tool));
  return [
    ...skills.map((s) =>
      warning(visit, 'missing_skill', `${van.id}:${s}`, `Nobody in ${van.name} has the skill ${s}.`),
    ),
    ...tools.map((t) =>
      warning(visit, 'missing_equipment', `${van.id}:${t}`, `${van.name} carries no ${t.replace('_', ' ')}.`),
    ),
    ...(visit.bringsWater && !van.equipment.includes('water_tank')
      ? [warning(visit, 'missing_water', van.id, `There is no spigot, and ${van.name} carries no water tank.`)]
      : []),
    ...(visit.bringsPower && !van.equipment.includes('generator')
      ? [warning(visit, 'missing_power', van.id, `There is no outlet, and ${van.name} carries no generator.`)]
      : []),
  ];
}

function outside(facts: BoardFacts, visit: Placed) {
  const found: Finding<WarningCode>[] = [];
  const time = formatClock(visit.from, facts.zone, facts.clock);
  if (
    visit.windowFrom &&
    visit.windowTo &&
    (isBefore(visit.from, visit.windowFrom) || isBefore(visit.windowTo, visit.from))
  ) {
    const promise = formatSpan(visit.windowFrom, visit.windowTo, facts.zone, facts.clock);
    const promisedDay = dayOf(visit.windowFrom, facts.zone);
    const day = promisedDay === facts.day ? '' : ` on ${formatDay(promisedDay)}`;
    found.push(warning(visit, 'outside_window', visit.from, `${time} is outside the promise, ${promise}${day}.`));
  }
  const opens = instantOf(facts.day, facts.dayStartsAt, facts.zone);
  const shuts = instantOf(facts.day, facts.dayEndsAt, facts.zone);
  if (isBefore(visit.from, opens) || isBefore(shuts, visit.to)) {
    found.push(
      warning(visit, 'outside_hours', visit.from, `The day runs ${formatSpan(opens, shuts, facts.zone, facts.clock)}.`),
    );
  }
  return found;
}

/** Travel before and after, against the van's neighbours in time at other stops. */
function gaps(visit: Placed, all: Placed[]) {
  const sameVan = all.filter(
    (v) => v.vanId === visit.vanId && v.stopId !== visit.stopId && v.progress !== 'called_off',
  );
  const previous = sameVan
    .filter((v) => !isBefore(visit.from, v.to))
    .sort((a, b) => Date.parse(b.to) - Date.parse(a.to))[0];
  const next = sameVan
    .filter((v) => !isBefore(v.from, visit.to))
    .sort((a, b) => Date.parse(a.from) - Date.parse(b.from))[0];
  const found: Finding<WarningCode>[] = [];
  if (previous && !isEnded(previous.progress)) {
    const short = shortfall(previous, visit);
    if (short)
      found.push(
        warning(visit, 'tight_gap', `${previous.id}:${short.key}`, `${short.words} from ${previous.customerName}.`),
      );
  }
  if (next) {
    const short = shortfall(visit, next);
    if (short)
      found.push(warning(visit, 'tight_gap', `${next.id}:${short.key}`, `${short.words} to ${next.customerName}.`));
  }
  return found;
}

function shortfall(a: Placed, b: Placed): { words: string; key: string } | null {
  const needed = estimateTravel(a.place, b.place).minutes;
  const there = minutesBetween(a.to, b.from);
  if (there >= needed) return null;
  return { words: `${needed} min of travel needed, ${there} there,`, key: `${needed}:${there}` };
}

/** Says only that somebody passes the week's limit, never what an hour costs. */
function overtime(facts: BoardFacts, visit: Placed, van: PlannedVan, riding: RidingPerson[]) {
  const isHereAlready = facts.visits.some((v) => v.id === visit.id && v.vanId === van.id);
  const added = isHereAlready ? 0 : minutesBetween(visit.from, visit.to);
  return riding
    .filter((person) => person.weekMinutes + added > facts.overtimeAfterMinutes)
    .map((person) =>
      warning(
        visit,
        'overtime_risk',
        person.personId,
        `Overtime risk: ${person.name} past ${facts.overtimeAfterMinutes / 60} h this week.`,
      ),
    );
}

function isPlaced(visit: PlannedVisit): visit is Placed {
  return visit.vanId !== null && visit.from !== null && visit.to !== null;
}

/** Late is said when the planned start is over and nobody has arrived, or the forecast end runs over the plan. */
export function lateMinutes(
  visit: { progress: PlannedVisit['progress']; from: string | null; to: string | null },
  now: string,
): number {
  if (!visit.from || !visit.to) return 0;
  if (visit.progress === 'placed' || visit.progress === 'on_the_way')
    return Math.max(0, minutesBetween(visit.from, now));
  if (visit.progress === 'on_site' || visit.progress === 'working') return Math.max(0, minutesBetween(visit.to, now));
  return 0;
}

/** The end of a span that starts at `from` and lasts the visit's minutes. */
export function plannedEnd(from: string, minutes: number): string {
  return addMinutes(from, minutes);
}
