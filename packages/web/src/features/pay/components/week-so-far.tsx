import { useQuery } from '@tanstack/react-query';
import { Loaded } from '../../../components/states.tsx';
import { hoursMinutes, money, useFormats } from '../../../lib/format.ts';
import { weekSoFarQuery } from '../api/pay.queries.ts';
import { weekSpan } from './week-model.ts';

/** What the running week comes to so far, marked as the estimate it is. */
export function WeekSoFar() {
  const query = useQuery(weekSoFarQuery);
  const format = useFormats();
  return (
    <Loaded query={query} what="this week so far">
      {(week) => (
        <section className="so-far" aria-labelledby="so-far">
          <h2 id="so-far">This week so far</h2>
          <p className="e">{money(week.grossCents)}</p>
          <p>
            An estimate at {format.clock(week.asOf)}, before taxes. {hoursMinutes(week.hoursWorked)} worked
            {week.tipCents > 0 ? `, ${money(week.tipCents)} of it tips` : ''}. Week {week.number}, {weekSpan(week)}: it
            may change until the week is locked.
          </p>
          {week.warnings.map((warning) => (
            <p key={warning} className="tape">
              {warning}
            </p>
          ))}
        </section>
      )}
    </Loaded>
  );
}
