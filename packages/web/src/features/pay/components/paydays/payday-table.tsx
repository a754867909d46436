import { Link } from 'react-router';
import type { PaydayDto, PaydayPerson } from '@driprail/shared/contracts/handover.contract';
import { paths } from '../../../../app/paths.ts';
import { money } from '../../../../lib/format.ts';
import { addedUp, weekTotal } from './payday-model.ts';
import type { Sums } from './payday-model.ts';

/** Everybody's weeks side by side; each amount opens its statement. */
export function PaydayTable({ payday, people }: { payday: PaydayDto; people: readonly PaydayPerson[] }) {
  return (
    <table className="pd-table">
      <thead>
        <tr>
          <th scope="col">Person</th>
          {payday.weeks.map((week) => (
            <th key={week.startsOn} scope="col">
              Week {week.number}
            </th>
          ))}
          <th scope="col">Together</th>
        </tr>
      </thead>
      <tbody>
        {people.map((person) => (
          <tr key={person.personId}>
            <th scope="row">{person.name}</th>
            {payday.weeks.map(({ startsOn, number }) => {
              const week = person.weeks.find((one) => one.startsOn === startsOn);
              return (
                <td key={startsOn} data-head={`Week ${number}`}>
                  {week ? (
                    <Link
                      to={paths.statement(startsOn, person.personId)}
                      aria-label={`${money(week.grossCents)}, statement of ${person.name}, week ${number}`}
                    >
                      {money(week.grossCents)}
                    </Link>
                  ) : (
                    '–'
                  )}
                  {week ? <Apart sums={week} /> : null}
                </td>
              );
            })}
            <td className="g" data-head="Together">
              {money(addedUp(person.weeks).grossCents)}
              <Apart sums={addedUp(person.weeks)} />
            </td>
          </tr>
        ))}
      </tbody>
      <tfoot>
        <tr>
          <th scope="row">Everybody</th>
          {payday.weeks.map(({ startsOn, number }) => (
            <td key={startsOn} data-head={`Week ${number}`}>
              {money(weekTotal(people, startsOn).grossCents)}
              <Apart sums={weekTotal(people, startsOn)} />
            </td>
          ))}
          <td className="g" data-head="Together">
            {money(addedUp(people.flatMap((person) => person.weeks)).grossCents)}
            <Apart sums={addedUp(people.flatMap((person) => person.weeks))} />
          </td>
        </tr>
      </tfoot>
    </table>
  );
}

/** Parts of the gross that a processor treats apart. */
function Apart({ sums: { tipCents, reimbursementCents } }: { sums: Sums }) {
  return (
    <>
      {tipCents === 0 ? null : <small>tips {money(tipCents)}</small>}
      {reimbursementCents === 0 ? null : <small>paid back {money(reimbursementCents)}</small>}
    </>
  );
}
