import { useQuery } from '@tanstack/react-query';
import { Loaded } from '../../../components/states.tsx';
import { money } from '../../../lib/format.ts';
import { commissionTestQuery } from '../api/plans.queries.ts';

/** What the commission exemption's tests come to for a person; it informs and changes no pay. */
export function CommissionTest({ person }: { person: { id: string; name: string } }) {
  const query = useQuery(commissionTestQuery(person.id));
  return (
    <Loaded query={query} what="the commission test">
      {(test) =>
        test.commissionCents === 0 ? null : (
          <div className="mt-6" role="group" aria-labelledby="commission-test">
            <h2 className="sec" id="commission-test">
              Commission test, for information
            </h2>
            <dl>
              <dt>Locked weeks looked at</dt>
              <dd>{test.weeks}</dd>
              <dt>More than half from commission</dt>
              <dd>
                {test.isMostlyCommission ? 'yes' : 'no'}: {money(test.commissionCents)} against {money(test.otherCents)}
              </dd>
              <dt>Overtime weeks above 1.5 times the minimum wage</dt>
              <dd>
                {test.overtimeWeeksPassed} of {test.overtimeWeeks}
              </dd>
            </dl>
            <p className="t-2">
              29 USC 207(i) can free commissioned people of a retail or service establishment from federal overtime.
              Driprail never applies it: overtime is paid all the same. Whether it fits is for a lawyer.
            </p>
          </div>
        )
      }
    </Loaded>
  );
}
