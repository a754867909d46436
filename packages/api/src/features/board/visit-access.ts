import { LATE_DAYS, tag } from '@driprail/shared/authz/ability';
import type { VisitDto } from '@driprail/shared/contracts/visit.dto';
import { dayOf } from '@driprail/shared/domain/time/zone';
import { authorize } from '../../authz/authorize.ts';
import type { Ctx } from '../../http/context.ts';
import { notFound } from '../../http/errors.ts';

const DAY_MS = 86_400_000;

/**
 * A visit of another crew, or of a day that is not near, is not there for a technician, rather than forbidden.
 * @param madeAt when a press was made, corrected; it is judged by that moment too when it arrives late
 * @throws 404, 403
 */
export function authorizeVisit(
  { ability, actor, now }: Ctx,
  action: 'read' | 'mark',
  visit: VisitDto,
  zone: string,
  madeAt?: string,
): void {
  const asOfNow = subjectOf(visit, zone, now().toISOString());
  if (madeAt !== undefined && isTakenLate(madeAt, now()) && ability.can(action, subjectOf(visit, zone, madeAt))) return;
  if (actor.role === 'technician' && ability.cannot('read', asOfNow)) throw notFound('That visit');
  authorize(ability, action, asOfNow);
}

/** A press made this long ago is still taken: a phone may lie dead for a while. */
export function isTakenLate(madeAt: string, now: Date): boolean {
  return now.getTime() - Date.parse(madeAt) <= LATE_DAYS * DAY_MS;
}

function subjectOf(visit: VisitDto, zone: string, asOf: string) {
  return tag('Visit', { id: visit.id, ...nearness(visit, zone, asOf) });
}

/** What the rules look at: who is of the crew, and how far the day is from `asOf`. */
export function nearness(visit: VisitDto, zone: string, asOf: string) {
  const day = visit.from ? dayOf(visit.from, zone) : null;
  const daysFromToday = day ? Math.round((Date.parse(day) - Date.parse(dayOf(asOf, zone))) / DAY_MS) : 0;
  return { crewPersonIds: visit.crew.map((p) => p.personId), day, daysFromToday };
}
