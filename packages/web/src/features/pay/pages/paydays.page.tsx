import { useQuery } from '@tanstack/react-query';
import { Link, useSearchParams } from 'react-router';
import type { OutputOf } from '@driprail/shared/contracts/endpoint';
import type { listPaydays } from '@driprail/shared/contracts/handover.contract';
import { paths } from '../../../app/paths.ts';
import { PageHead, RailPage } from '../../../components/page-head.tsx';
import { Empty } from '../../../components/states.tsx';
import { money } from '../../../lib/format.ts';
import { paydaysQuery } from '../api/paydays.queries.ts';
import { LoadedPage } from '../components/loaded-page.tsx';
import { PaydayCaution } from '../components/paydays/payday-caution.tsx';
import { PaydayForm } from '../components/paydays/payday-form.tsx';
import { PaydayList } from '../components/paydays/payday-list.tsx';
import { PaydaySheet } from '../components/paydays/payday-sheet.tsx';
import './paydays.css';

/** Which locked weeks are handed over together, on what day, and the files that go out with them. */
export function PaydaysPage() {
  const paydays = useQuery(paydaysQuery);
  return (
    <LoadedPage title="Paydays" query={paydays} what="the paydays">
      {(found) => <Paydays {...found} />}
    </LoadedPage>
  );
}

function Paydays({ waiting, paydays }: OutputOf<typeof listPaydays>) {
  const [search, setSearch] = useSearchParams();
  const open = paydays.filter((payday) => payday.handedOverAt === null);
  const chosen = paydays.find((payday) => payday.id === search.get('payday')) ?? open.at(-1) ?? paydays[0] ?? null;
  const choose = (id: string | null) =>
    setSearch(id ? { payday: id } : {}, { replace: true, preventScrollReset: true });
  const waits = waiting.reduce((total, week) => total + week.grossCents, 0);
  return (
    <>
      <PageHead
        title="Paydays"
        above="Locked weeks, handed over together"
        sums={[
          { label: 'Weeks on no payday', value: waiting.length },
          { label: 'Their gross', value: money(waits) },
          { label: 'Not handed over', value: open.length },
        ]}
        actions={
          <Link className="btn" to={paths.payWeeks}>
            Pay week
          </Link>
        }
      />
      <RailPage>
        <div className="paydays">
          <div className="pd-main">
            <section>
              <h2 className="sec">On no payday yet</h2>
              {waiting.length === 0 ? (
                <Empty>
                  No locked week waits. A week comes here once it is locked on the{' '}
                  <Link to={paths.payWeeks}>pay week</Link>.
                </Empty>
              ) : (
                <PaydayForm
                  key={waiting.map((week) => week.startsOn).join()}
                  payday={null}
                  weeks={waiting}
                  onDone={choose}
                />
              )}
            </section>
            <PaydayCaution />
            {paydays.length > 0 ? (
              <section>
                <h2 className="sec">Paydays</h2>
                <PaydayList paydays={paydays} chosenId={chosen?.id ?? null} />
              </section>
            ) : null}
          </div>
          {chosen ? (
            <PaydaySheet key={chosen.id} payday={chosen} waiting={waiting} onRemoved={() => choose(null)} />
          ) : (
            <Empty>
              No paydays yet. A payday hands over one or more locked weeks together: tick them, give the date, and the
              files for the payroll processor are here.
            </Empty>
          )}
        </div>
      </RailPage>
    </>
  );
}
