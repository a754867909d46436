import { useQuery } from '@tanstack/react-query';
import { listPeople } from '@driprail/shared/contracts/people.contract';
import type { VisitDto } from '@driprail/shared/contracts/visit.dto';
import { call } from '../../../lib/call.ts';

/** Who rides, with their numbers. On the way their phone shows no changes, so a call goes to whoever is not at the wheel. */
export function CrewCall({ visit }: { visit: VisitDto }) {
  const people = useQuery({
    queryKey: ['people'],
    queryFn: ({ signal }) => call(listPeople, {}, signal),
    enabled: visit.crew.length > 0,
  }).data?.people;
  const phoneOf = (personId: string) => people?.find((person) => person.id === personId)?.phone ?? '';
  return (
    <section>
      <h3 className="sec">Crew</h3>
      {visit.crew.length === 0 ? <p>Nobody yet</p> : null}
      {visit.crew.map((member) => (
        <p key={member.personId} className="flex justify-between gap-3">
          <span>{member.name}</span>
          {phoneOf(member.personId) ? <a href={`tel:${phoneOf(member.personId)}`}>{phoneOf(member.personId)}</a> : null}
        </p>
      ))}
      {visit.progress === 'on_the_way' ? (
        <p className="t-2">
          Driving. Their phone holds changes back until Arrived
          {visit.crew.length > 1 ? '; call the one who is not at the wheel.' : '; a call can wait until then.'}
        </p>
      ) : null}
    </section>
  );
}
