import { useQuery } from '@tanstack/react-query';
import { useSearchParams } from 'react-router';
import { Button } from '../../../components/button.tsx';
import { Icon } from '../../../components/icon.tsx';
import { PageHead, RailPage } from '../../../components/page-head.tsx';
import { money } from '../../../lib/format.ts';
import { useMedia } from '../../../lib/use-media.ts';
import { owedQuery } from '../api/money.queries.ts';
import { BillPanel } from '../components/bill-panel.tsx';
import { BillSheet } from '../components/bill-sheet.tsx';
import { HeldTape } from '../components/held-tape.tsx';
import { InvoiceList } from '../components/invoice-list.tsx';
import { MoneyTabs } from '../components/money-tabs.tsx';
import './money.css';

/** Invoices with what is owed on each; one is opened beside the list, on a phone over it. */
export function MoneyPage() {
  const [search, setSearch] = useSearchParams();
  const isWide = useMedia('(min-width: 1101px)');
  const owed = useQuery(owedQuery);
  const jobId = search.get('job');
  const close = () =>
    setSearch(
      (before) => {
        before.delete('job');
        return before;
      },
      { replace: true },
    );
  return (
    <>
      <PageHead
        title="Money"
        above="Invoices and what is owed"
        sums={[
          { label: 'Owed', value: owed.data ? money(owed.data.owedCents) : '–' },
          { label: 'Of it overdue', value: owed.data ? money(owed.data.overdueCents) : '–' },
          { label: 'Invoices not settled', value: owed.data?.total ?? '–' },
        ]}
        actions={<MoneyTabs />}
      />
      <RailPage>
        <HeldTape />
        <div className={jobId && isWide ? 'mo is-open' : 'mo'}>
          <InvoiceList chosenJobId={jobId} />
          {jobId && isWide ? (
            <aside className="hung mo-sheet" aria-label="Bill">
              <Button look="bare" className="mo-x" aria-label="Close the bill" onClick={close}>
                <Icon name="x" />
              </Button>
              <div className="mo-in">
                <BillPanel key={jobId} jobId={jobId} />
              </div>
            </aside>
          ) : null}
        </div>
      </RailPage>
      {jobId && !isWide ? <BillSheet key={jobId} jobId={jobId} onClose={close} /> : null}
    </>
  );
}
