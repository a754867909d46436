import { useAbility } from '@casl/react';
import { useQuery } from '@tanstack/react-query';
import { Link } from 'react-router';
import { tag } from '@driprail/shared/authz/ability';
import type { AppAbility } from '@driprail/shared/authz/ability';
import { formatDay } from '@driprail/shared/domain/time/format';
import { dayOf } from '@driprail/shared/domain/time/zone';
import { paths } from '../../../app/paths.ts';
import { Icon } from '../../../components/icon.tsx';
import { PageHead, RailPage } from '../../../components/page-head.tsx';
import { Empty, Loaded } from '../../../components/states.tsx';
import { money, useFormats } from '../../../lib/format.ts';
import { useSession } from '../../../lib/session.tsx';
import { statementsQuery } from '../api/pay.queries.ts';
import { TimeOffBalances } from '../components/time-off/time-off-balances.tsx';
import { PayRecord } from '../components/paydays/pay-record.tsx';
import { WeekSoFar } from '../components/week-so-far.tsx';
import { weekSpan } from '../components/week-model.ts';
import './statement.css';

/** One's own statements of locked weeks, the newest first. */
export function StatementsPage() {
  const { user } = useSession();
  const { zone } = useFormats();
  const ability = useAbility<AppAbility>();
  const statements = useQuery(statementsQuery);
  const list = statements.data?.statements ?? [];
  const year = list[0]?.startsOn.slice(0, 4) ?? '';
  const ofYear = list.filter((statement) => statement.startsOn.startsWith(year));
  return (
    <>
      <PageHead
        title="My pay"
        above={user.name}
        sums={
          list.length === 0
            ? []
            : [
                {
                  label: `Gross of ${year}, locked weeks`,
                  value: money(ofYear.reduce((sum, s) => sum + s.grossCents, 0)),
                },
                { label: 'Statements', value: list.length },
              ]
        }
        actions={
          user.personId && ability.can('read', tag('PayRecord', { personId: user.personId })) ? (
            <PayRecord personId={user.personId} name={user.name} isOwn />
          ) : null
        }
      />
      <RailPage>
        <div className="my-pay">
          {user.personId && ability.can('read', tag('Estimate', { personId: user.personId })) ? <WeekSoFar /> : null}
          {user.personId && ability.can('read', tag('TimeOffBalance', { personId: user.personId })) ? (
            <TimeOffBalances personId={user.personId} title="My paid time off" />
          ) : null}
          <Loaded query={statements} what="your statements">
            {({ statements: own }) =>
              own.length === 0 || user.personId === null ? (
                <Empty>No statements yet. Each week’s statement is here once the week is locked.</Empty>
              ) : (
                <ol>
                  {own.map((statement) => (
                    <li key={statement.weekId}>
                      <Link className="plain" to={paths.statement(statement.startsOn, user.personId ?? '')}>
                        <Icon name="lock" />
                        <span>
                          <b>Week {statement.number}</b>
                          <small>{weekSpan(statement)}</small>
                          <small>Locked {formatDay(dayOf(statement.lockedAt, zone))}</small>
                        </span>
                        <span className="e">{money(statement.grossCents)}</span>
                      </Link>
                    </li>
                  ))}
                </ol>
              )
            }
          </Loaded>
        </div>
      </RailPage>
    </>
  );
}
