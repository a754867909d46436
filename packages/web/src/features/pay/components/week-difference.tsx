import { useState } from 'react';
import { useQuery } from '@tanstack/react-query';
import { Link } from 'react-router';
import type { OutputOf } from '@driprail/shared/contracts/endpoint';
import type { getPayDifference } from '@driprail/shared/contracts/pay-difference.contract';
import type { PayWeekHead } from '@driprail/shared/contracts/pay.contract';
import type { PersonDifference } from '@driprail/shared/domain/pay/week-difference';
import { formatDay } from '@driprail/shared/domain/time/format';
import { dayOf } from '@driprail/shared/domain/time/zone';
import { paths } from '../../../app/paths.ts';
import { Empty, Loaded } from '../../../components/states.tsx';
import { hoursMinutes, money, useFormats } from '../../../lib/format.ts';
import { differenceQuery } from '../api/pay.queries.ts';

type Against = 'week_before' | 'last_checked';

const partWords: Record<PersonDifference['parts'][number]['part'], string> = {
  hourly: 'hourly pay',
  flat: 'flat amounts',
  commission: 'commission',
  overtimePremium: 'overtime',
  makeUp: 'make-up',
  tips: 'tips',
  tipsAlreadyReceived: 'tips received',
  adjustments: 'adjustments',
};

/** What moved since the week before, or since the week was last checked. Opened when it is asked for. */
export function WeekDifference({ week }: { week: PayWeekHead }) {
  const [against, setAgainst] = useState<Against | null>(null);
  return (
    <section className="diff" aria-label="What changed">
      <div className="diff-head" role="group" aria-label="Compare">
        <h2>What changed</h2>
        {(['week_before', 'last_checked'] as const).map((one) => (
          <button
            key={one}
            type="button"
            className="btn"
            aria-pressed={against === one}
            onClick={() => setAgainst(against === one ? null : one)}
          >
            {one === 'week_before' ? 'Against the week before' : 'Against the last check'}
          </button>
        ))}
      </div>
      {against ? <Compared key={against} week={week} against={against} /> : null}
    </section>
  );
}

function Compared({ week, against }: { week: PayWeekHead; against: Against }) {
  const query = useQuery(differenceQuery(week.startsOn, against));
  return (
    <Loaded query={query} what="the difference">
      {(dto) => {
        if (dto.people === null)
          return <Empty>This week was not checked yet. Once it was, later changes show here.</Empty>;
        if (dto.people.length === 0) return <Empty>Nothing changed: all {dto.unchanged} people are the same.</Empty>;
        return (
          <table className="grid-t">
            <caption className="t-2">
              <Sides dto={dto} />
            </caption>
            <thead>
              <tr>
                <th>Name</th>
                <th className="r was">Before</th>
                <th className="r was">Now</th>
                <th className="r">Difference</th>
                <th>In</th>
              </tr>
            </thead>
            <tbody>
              {dto.people.map((person) => (
                <Row key={person.personId} startsOn={week.startsOn} person={person} />
              ))}
            </tbody>
          </table>
        );
      }}
    </Loaded>
  );
}

function Sides({ dto: { against, unchanged } }: { dto: OutputOf<typeof getPayDifference> }) {
  const format = useFormats();
  const checked = against.checkedAt;
  return (
    <>
      {checked
        ? `Against the figures as checked ${formatDay(dayOf(checked, format.zone))}, ${format.clock(checked)}`
        : `Against week ${against.number}`}
      {unchanged > 0 ? `; ${unchanged === 1 ? '1 person is' : `${unchanged} people are`} the same` : ''}.
    </>
  );
}

function Row({ startsOn, person }: { startsOn: string; person: PersonDifference }) {
  const { personId, name, before, after, parts } = person;
  const cents = (after?.grossCents ?? 0) - (before?.grossCents ?? 0);
  const hours =
    before && after && before.hours !== after.hours
      ? [`${hoursMinutes(before.hours)} to ${hoursMinutes(after.hours)} h`]
      : [];
  return (
    <tr>
      <td>
        <Link to={`${paths.payWeek(startsOn)}?person=${personId}`}>{name}</Link>
      </td>
      <td className="r was">{before ? money(before.grossCents) : '–'}</td>
      <td className="r was">{after ? money(after.grossCents) : '–'}</td>
      <td className="r">
        <b>{signed(cents)}</b>
      </td>
      <td>
        {[
          ...hours,
          ...parts.map(({ part, beforeCents, afterCents }) => `${partWords[part]} ${signed(afterCents - beforeCents)}`),
        ].join(', ')}
      </td>
    </tr>
  );
}

function signed(cents: number): string {
  return `${cents > 0 ? '+' : ''}${money(cents)}`;
}
