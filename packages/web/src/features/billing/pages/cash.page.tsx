import { useEffect, useRef } from 'react';
import { useQuery } from '@tanstack/react-query';
import { Link, useSearchParams } from 'react-router';
import type { CashHolderDto } from '@driprail/shared/contracts/cash.contract';
import { formatDay } from '@driprail/shared/domain/time/format';
import { dayOf } from '@driprail/shared/domain/time/zone';
import { paths } from '../../../app/paths.ts';
import { PageHead, RailPage } from '../../../components/page-head.tsx';
import { Empty, Loaded } from '../../../components/states.tsx';
import { money, useFormats } from '../../../lib/format.ts';
import { useMedia } from '../../../lib/use-media.ts';
import { cashQuery } from '../api/cash.queries.ts';
import { CashCounts } from '../components/cash-counts.tsx';
import { CountForm } from '../components/count-form.tsx';
import { MoneyTabs } from '../components/money-tabs.tsx';
import '../components/bill-panel.css';
import './money.css';

const keyOf = ({ personId, name }: CashHolderDto) => personId ?? name;

/** Who holds cash that was not counted yet, and what was counted. */
export function CashPage() {
  const cash = useQuery(cashQuery);
  const [search, setSearch] = useSearchParams();
  const holders = cash.data?.holders ?? [];
  const chosen = holders.find((holder) => keyOf(holder) === search.get('who')) ?? holders[0] ?? null;
  return (
    <>
      <PageHead
        title="Cash"
        above="Taken in hand, not counted yet"
        sums={[
          { label: 'Still out', value: cash.data ? money(holders.reduce((sum, { cents }) => sum + cents, 0)) : '–' },
          { label: 'People who hold some', value: cash.data ? holders.length : '–' },
        ]}
        actions={<MoneyTabs />}
      />
      <RailPage>
        <Loaded query={cash} what="the cash">
          {({ counts }) => (
            <div className="mo-cash">
              <section aria-label="Who holds cash">
                <h2 className="sec">Who holds cash</h2>
                {holders.length === 0 ? (
                  <Empty>Nobody holds cash. What a crew takes at a car stands here until it is counted.</Empty>
                ) : (
                  <ul className="rows">
                    {holders.map((holder) => (
                      <li key={keyOf(holder)}>
                        <Link
                          to={`?who=${encodeURIComponent(keyOf(holder))}`}
                          replace
                          aria-current={holder === chosen ? 'true' : undefined}
                        >
                          <b>{holder.name}</b>
                          <b>{money(holder.cents)}</b>
                          <small>
                            {holder.payments.length === 1 ? '1 payment' : `${holder.payments.length} payments`}
                          </small>
                        </Link>
                      </li>
                    ))}
                  </ul>
                )}
              </section>
              {chosen ? (
                <Held
                  key={keyOf(chosen)}
                  holder={chosen}
                  isPicked={search.has('who')}
                  onDone={() => setSearch({}, { replace: true })}
                />
              ) : null}
              <CashCounts counts={counts} />
            </div>
          )}
        </Loaded>
      </RailPage>
    </>
  );
}

function Held({ holder, isPicked, onDone }: { holder: CashHolderDto; isPicked: boolean; onDone: () => void }) {
  const section = useRef<HTMLElement>(null);
  const isNarrow = useMedia('(max-width: 1100px)');
  useEffect(() => {
    // Below the list, where a press on a name would seem to do nothing.
    if (isPicked && isNarrow) section.current?.scrollIntoView();
  }, [isPicked, isNarrow]);
  const { zone, clock } = useFormats();
  return (
    <section ref={section} className="hung mo-held" aria-label={`Cash of ${holder.name}`}>
      <h2 className="t-hang">{holder.name}</h2>
      {holder.personId === null ? (
        <p className="t-2">
          Recorded by a login that belongs to no person, so it is counted by nobody. Give the login a person under
          People, and what it takes from then on is counted here.
        </p>
      ) : (
        <CountForm holder={holder} personId={holder.personId} onDone={onDone} />
      )}
      <table className="grid-t">
        <tbody>
          {holder.payments.map((payment) => (
            <tr key={payment.id}>
              <td>
                <b>{payment.customerName}</b>
                <span className="block t-2">
                  <Link to={`${paths.money}?state=all&job=${payment.jobId}`}>Job {payment.jobNumber}</Link>,{' '}
                  {formatDay(dayOf(payment.receivedAt, zone))}, {clock(payment.receivedAt)}
                </span>
              </td>
              <td className="r">
                {money(payment.amountCents + payment.tipCents)}
                {payment.tipCents > 0 ? <span className="block t-2">{money(payment.tipCents)} of it a tip</span> : null}
              </td>
            </tr>
          ))}
        </tbody>
        <tfoot>
          <tr>
            <th scope="row">Should be there</th>
            <td className="r">{money(holder.cents)}</td>
          </tr>
        </tfoot>
      </table>
    </section>
  );
}
