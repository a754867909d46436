import { useDeferredValue } from 'react';
import { useInfiniteQuery } from '@tanstack/react-query';
import { Link, useSearchParams } from 'react-router';
import { formatDate } from '@driprail/shared/domain/time/format';
import { dayOf } from '@driprail/shared/domain/time/zone';
import { Button } from '../../../components/button.tsx';
import { Empty, Loaded } from '../../../components/states.tsx';
import { money, useFormats } from '../../../lib/format.ts';
import { invoicesQuery } from '../api/money.queries.ts';
import type { InvoiceRow } from '../api/money.queries.ts';
import { billStateNames } from './bill-words.ts';

export const invoiceFilters = ['unpaid', 'overdue', 'owes_back', 'paid', 'all'] as const;
export type InvoiceFilter = (typeof invoiceFilters)[number];
const filterNames: Record<InvoiceFilter, string> = {
  unpaid: 'Unpaid',
  overdue: 'Overdue',
  owes_back: 'Owed back',
  paid: 'Paid',
  all: 'All',
};
const emptyWords: Record<InvoiceFilter, string> = {
  unpaid: 'Nothing is owed. Invoices are issued by themselves once a job is done and can’t be taken back any more.',
  overdue: 'Nothing is overdue.',
  owes_back: 'Nothing is owed back to a customer.',
  paid: 'No invoice is paid yet.',
  all: 'No invoices yet. The first is issued by itself once a job is done, or from the job on the board.',
};

/** Invoices by state and by one box; the chosen one is paper that runs into the sheet beside it. */
export function InvoiceList({ chosenJobId }: { chosenJobId: string | null }) {
  const [search, setSearch] = useSearchParams();
  const state = invoiceFilters.find((one) => one === search.get('state')) ?? 'unpaid';
  const find = search.get('find') ?? '';
  const list = useInfiniteQuery(invoicesQuery({ state, find: useDeferredValue(find.trim()) }));
  const total = list.data?.pages[0]?.total ?? null;
  const with_ = (change: Record<string, string | null>) => {
    const next = new URLSearchParams(search);
    for (const [name, value] of Object.entries(change))
      if (value) next.set(name, value);
      else next.delete(name);
    return next;
  };
  return (
    <section aria-label="Invoices" className="mo-list">
      <div className="mo-find">
        <input
          className="inp"
          type="search"
          placeholder="Number, job, customer"
          aria-label="Find invoices"
          maxLength={80}
          value={find}
          onChange={(event) => setSearch(with_({ find: event.target.value }), { replace: true })}
        />
        <div className="mo-by" role="group" aria-label="Which invoices">
          {invoiceFilters.map((one) => (
            <button
              key={one}
              type="button"
              aria-pressed={state === one}
              onClick={() => setSearch(with_({ state: one, job: null }), { replace: true })}
            >
              {filterNames[one]}
            </button>
          ))}
          <span role="status">{total === null ? '' : `${total} found`}</span>
        </div>
      </div>
      <Loaded query={list} what="the invoices">
        {({ pages }) => {
          const invoices = pages.flatMap((page) => page.invoices);
          if (invoices.length === 0)
            return <Empty>{find.trim() ? `No invoice found for “${find.trim()}” here.` : emptyWords[state]}</Empty>;
          return (
            <>
              <table className="grid-t mo-table">
                <thead>
                  <tr>
                    <th>Invoice</th>
                    <th>Customer</th>
                    <th>Job</th>
                    <th>Issued</th>
                    <th>Due</th>
                    <th className="r">Total</th>
                    <th className="r">Owed</th>
                    <th className="r">State</th>
                  </tr>
                </thead>
                <tbody>
                  {invoices.map((invoice) => (
                    <Row
                      key={invoice.id}
                      invoice={invoice}
                      isChosen={invoice.jobId === chosenJobId}
                      to={`?${with_({ job: invoice.jobId }).toString()}`}
                    />
                  ))}
                </tbody>
              </table>
              {list.hasNextPage ? (
                <Button className="mt-3" isBusy={list.isFetchingNextPage} onClick={() => void list.fetchNextPage()}>
                  Show more of {total}
                </Button>
              ) : null}
            </>
          );
        }}
      </Loaded>
    </section>
  );
}

function Row({ invoice, isChosen, to }: { invoice: InvoiceRow; isChosen: boolean; to: string }) {
  const { zone } = useFormats();
  return (
    <tr className={isChosen ? 'is-chosen' : ''}>
      <th scope="row">
        <Link to={to} replace aria-current={isChosen ? 'true' : undefined}>
          {invoice.number}
        </Link>
      </th>
      <td className="mo-name" dir="auto">
        <b>{invoice.customerName}</b>
      </td>
      <td className="mo-job">
        <span className="mo-l">Job </span>
        {invoice.jobNumber}
      </td>
      <td className="mo-issued">
        <span className="mo-l">Issued </span>
        {formatDate(dayOf(invoice.issuedAt, zone))}
      </td>
      <td className="mo-due">
        <span className="mo-l">Due </span>
        {formatDate(invoice.dueOn)}
      </td>
      <td className="r mo-total">
        <span className="mo-l">of </span>
        {money(invoice.totalCents)}
      </td>
      <td className="r mo-owed">{invoice.owedCents === 0 ? '0.00' : money(invoice.owedCents)}</td>
      <td className={`r mo-state bl-state is-${invoice.state}`}>{billStateNames[invoice.state]}</td>
    </tr>
  );
}
