import { useQuery } from '@tanstack/react-query';
import { Link, useNavigate, useParams } from 'react-router';
import type { MoneyDayDto } from '@driprail/shared/contracts/money-day.contract';
import { formatDate, formatDay } from '@driprail/shared/domain/time/format';
import { addDays } from '@driprail/shared/domain/time/zone';
import { paths } from '../../../app/paths.ts';
import { Icon } from '../../../components/icon.tsx';
import { PageHead, RailPage } from '../../../components/page-head.tsx';
import { Loaded } from '../../../components/states.tsx';
import { money } from '../../../lib/format.ts';
import { moneyDayQuery } from '../api/cash.queries.ts';
import { CashCounts } from '../components/cash-counts.tsx';
import { DayDifference } from '../components/day-difference.tsx';
import { DayMethods } from '../components/day-methods.tsx';
import { DayOpen } from '../components/day-open.tsx';
import { MoneyTabs } from '../components/money-tabs.tsx';
import '../components/bill-panel.css';
import './money.css';

/** One day's money: invoiced, received, given back, cash and cards, with every difference named. */
export function MoneyDayPage() {
  const { day = '' } = useParams();
  const navigate = useNavigate();
  const close = useQuery(moneyDayQuery(day));
  const shown = close.data?.close;
  const go = (to: string) => void navigate(paths.moneyDay(to), { replace: true });
  return (
    <>
      <PageHead
        title="Day’s close"
        above={
          <>
            <Link to={paths.moneyDay(addDays(day, -1))} replace aria-label="The day before">
              <Icon name="left" />
            </Link>
            <input
              className="inp mo-date"
              type="date"
              aria-label="Day"
              value={day}
              onChange={(event) => event.target.value && go(event.target.value)}
            />
            <Link to={paths.moneyDay(addDays(day, 1))} replace aria-label="The day after">
              <Icon name="right" />
            </Link>
            {formatDay(day).slice(0, 3)}, {formatDate(day)}
          </>
        }
        sums={[
          { label: 'Invoiced', value: shown ? money(shown.invoiced.totalCents) : '–' },
          { label: 'Received, less given back', value: shown ? money(shown.netReceivedCents) : '–' },
          { label: 'Cash still out', value: shown ? money(outOf(shown)) : '–' },
        ]}
        actions={<MoneyTabs />}
      />
      <RailPage>
        <Loaded query={close} what="the day’s close">
          {(data) => <Close close={data.close} />}
        </Loaded>
      </RailPage>
    </>
  );
}

const outOf = ({ cash }: MoneyDayDto) => cash.stillOut.reduce((sum, { cents }) => sum + cents, 0);

function Close({ close }: { close: MoneyDayDto }) {
  const { invoiced, credited, mistaken } = close;
  return (
    <div className="hung mo-day">
      <div>
        <section aria-label="Invoiced">
          <h2 className="sec">
            Invoiced <span>{invoiced.count === 1 ? '1 invoice' : `${invoiced.count} invoices`}</span>
          </h2>
          <dl className="mo-dl">
            <Line name="Before tax" cents={invoiced.netCents} />
            <Line name="Sales tax" cents={invoiced.taxCents} />
            <Line name="Invoiced" cents={invoiced.totalCents} isSum />
            {credited.count > 0 ? (
              <Line
                name={`Credited by ${credited.count === 1 ? 'a note' : `${credited.count} notes`}`}
                cents={-credited.cents}
              />
            ) : null}
          </dl>
        </section>
        <DayMethods close={close} />
        {mistaken.count > 0 ? (
          <p className="t-2">
            {money(mistaken.cents)} was recorded by mistake and taken back; it is in none of these figures.
          </p>
        ) : null}
        <DayDifference close={close} />
        <p className="no-print">
          <a className="btn" href={`/api/money/days/${close.day}/payments.csv`} download={`payments-${close.day}.csv`}>
            Payments of the day, CSV
          </a>
        </p>
      </div>
      <div>
        <section aria-label="Cash">
          <h2 className="sec">Cash of the day</h2>
          <dl className="mo-dl">
            <Line name="Taken in hand" cents={close.cash.takenCents}>
              {close.cash.tipCents > 0 ? `${money(close.cash.tipCents)} of it tips handed over` : ''}
            </Line>
            <Line name="Counted since" cents={close.cash.countedCents} />
            {close.cash.stillOut.map(({ name, cents }) => (
              <Line key={name} name={`Still with ${name}`} cents={cents} />
            ))}
          </dl>
          <p className="pt-2">
            <Link to={paths.cash}>Count cash</Link>
          </p>
        </section>
        {close.cash.counts.length > 0 ? <CashCounts counts={close.cash.counts} /> : null}
        <DayOpen close={close} />
      </div>
    </div>
  );
}

function Line({
  name,
  cents,
  isSum = false,
  children,
}: {
  name: string;
  cents: number;
  isSum?: boolean;
  children?: string;
}) {
  return (
    <div className={isSum ? 'is-sum' : ''}>
      <dt>
        {name}
        {children ? <small>{children}</small> : null}
      </dt>
      <dd>{money(cents)}</dd>
    </div>
  );
}
