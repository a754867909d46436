import { tag } from '@driprail/shared/authz/ability';
import type { VisitDto } from '@driprail/shared/contracts/visit.dto';
import { dayOf } from '@driprail/shared/domain/time/zone';
import { authorize } from '../../authz/authorize.ts';
import type { Ctx } from '../../http/context.ts';
import { notFound } from '../../http/errors.ts';

/** A visit of another crew, or of a day that is not near, is not there for a technician, rather than forbidden. */
export function authorizeVisit({ ability, actor, now }: Ctx, action: 'read' | 'mark', visit: VisitDto, zone: string) {
  const day = visit.from ? dayOf(visit.from, zone) : null;
  const daysFromToday = day
    ? Math.round((Date.parse(day) - Date.parse(dayOf(now().toISOString(), zone))) / 86_400_000)
    : 0;
  const subject = tag('Visit', { id: visit.id, crewPersonIds: visit.crew.map((p) => p.personId), day, daysFromToday });
  if (actor.role === 'technician' && ability.cannot('read', subject)) throw notFound('That visit');
  authorize(ability, action, subject);
}
