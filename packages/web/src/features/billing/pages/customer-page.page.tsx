import { useState } from 'react';
import { useQuery } from '@tanstack/react-query';
import { useParams, useSearchParams } from 'react-router';
import type { CustomerPageDto } from '@driprail/shared/contracts/customer-page.contract';
import { formatDate } from '@driprail/shared/domain/time/format';
import { dayOf } from '@driprail/shared/domain/time/zone';
import { Icon } from '../../../components/icon.tsx';
import { Loaded } from '../../../components/states.tsx';
import { money } from '../../../lib/format.ts';
import { OwnBooking } from '../../online-booking/index.ts';
import { customerPageQuery, usePayByCard } from '../api/customer-page.queries.ts';
import { useLivePage } from '../api/use-live-page.ts';
import { BillLines } from '../components/bill-lines.tsx';
import { CustomerFeedback } from '../components/customer-feedback.tsx';
import { CustomerPhotos } from '../components/customer-photos.tsx';
import { customerState } from '../components/customer-state.ts';
import { TipField } from '../components/tip-field.tsx';
import './customer-page.css';

/** A customer's own page of one job, by the link that was sent: what is planned, who is coming, the bill. */
export function CustomerPage() {
  const { token = '' } = useParams();
  const [search] = useSearchParams();
  const returned = search.get('returned') === 'true';
  const query = useQuery(customerPageQuery(token, returned));
  useLivePage(token);
  return (
    <main className="ph cust" id="main">
      <Loaded query={query} what="your page">
        {({ page }) => <Page page={page} token={token} returned={returned} />}
      </Loaded>
    </main>
  );
}

function Page({ page, token, returned }: { page: CustomerPageDto; token: string; returned: boolean }) {
  const { head, time, words } = customerState(page);
  const { bill } = page;
  const isOver = page.progress === 'done' || bill.isDone;
  // The crew at the car may show this page before the last step is ticked.
  const isAtTheCar = page.progress === 'on_site' || page.progress === 'working';
  const mayPay = (isOver || isAtTheCar || bill.invoice !== null) && bill.owedCents > 0;
  const day = bill.invoice?.issuedAt ?? page.windowFrom;
  return (
    <>
      <header className="cust-top">
        <p className="t-hang">{page.companyName}</p>
        <small>
          {bill.invoice ? `Invoice ${bill.invoice.number}` : `Job ${page.jobNumber}`}
          {day ? <br /> : null}
          {day ? formatDate(dayOf(day, page.zone)) : null}
        </small>
      </header>
      <div className="cust-leg">
        <div className="rail" />
        <i className="bead" aria-hidden />
        <h1 className="t-hang">{head}</h1>
        {time ? <p className="cust-time">{time}</p> : null}
        <p className="t-2 pb-2">{words}</p>
        {page.photos.length > 0 ? <CustomerPhotos token={token} photos={page.photos} /> : null}
        {page.progress === 'called_off' && bill.payments.length === 0 && !bill.invoice ? null : (
          <>
            <h2 className="sec">{isOver ? 'Invoice' : 'What you booked'}</h2>
            <BillLines bill={bill} zone={page.zone} />
            {bill.invoice ? (
              <a className="link block py-3" href={`/api/customer-pages/${token}/invoice.pdf`}>
                The invoice as a PDF
              </a>
            ) : null}
          </>
        )}
        {page.tipCents > 0 ? (
          <p className="py-2">
            <b>{money(page.tipCents)}</b> went to the crew as a tip. Thank you.
          </p>
        ) : null}
        {mayPay ? <Pay page={page} token={token} returned={returned} /> : null}
        {isOver ? null : <OwnBooking token={token} zone={page.zone} clock={page.clock} />}
        {isOver ? <CustomerFeedback key={page.feedback?.stars} token={token} given={page.feedback} /> : null}
      </div>
      {!mayPay && bill.depositCents > 0 ? <PayDeposit page={page} token={token} /> : null}
      {!mayPay && bill.depositCents === 0 && page.companyPhone ? (
        <footer className="ph-act">
          <a className="btn w-full" href={`tel:${page.companyPhone}`}>
            <Icon name="phone" /> Call us
          </a>
        </footer>
      ) : null}
    </>
  );
}

/** What is asked before the work; the rest is paid when it is done. */
function PayDeposit({ page, token }: { page: CustomerPageDto; token: string }) {
  const pay = usePayByCard(token);
  const { depositCents } = page.bill;
  return (
    <>
      {pay.error ? (
        <p className="tape my-2" role="alert">
          <b>{pay.error.message}</b>
        </p>
      ) : null}
      <footer className="ph-act cust-pay">
        <dl>
          <dt>Deposit</dt>
          <dd>{money(depositCents)}</dd>
        </dl>
        <button
          type="button"
          className="ph-main seal"
          disabled={pay.isPending || pay.isSuccess}
          onClick={() => pay.mutate({ part: 'deposit', tipCents: 0 })}
        >
          {pay.isPending || pay.isSuccess ? 'Opening' : 'Pay deposit'}
        </button>
      </footer>
    </>
  );
}

/** The tip is the customer's own choice: none is set beforehand, and all of it goes to the crew. */
function Pay({ page, token, returned }: { page: CustomerPageDto; token: string; returned: boolean }) {
  const [tipCents, setTip] = useState<number | null>(0);
  const pay = usePayByCard(token);
  const crew = page.crewNames.length > 0 ? page.crewNames.join(' and ') : 'the crew';
  const all = page.bill.owedCents + (tipCents ?? 0);
  return (
    <>
      <section aria-label="Tip">
        <h2 className="sec mt-5">
          A tip for {crew} <small>all of it goes to the crew</small>
        </h2>
        <TipField billCents={page.bill.netCents} value={tipCents} onChange={setTip} label="Tip" />
      </section>
      {returned && page.isPaying ? (
        <p className="tape my-2" role="status">
          <b>No payment has come in yet.</b> If you have just paid, it shows here in a moment.
        </p>
      ) : null}
      {pay.error ? (
        <p className="tape my-2" role="alert">
          <b>{pay.error.message}</b>
        </p>
      ) : null}
      <footer className="ph-act cust-pay">
        <dl>
          <dt>{tipCents ? `With ${money(tipCents)} tip` : 'To pay'}</dt>
          <dd>{money(all)}</dd>
        </dl>
        <button
          type="button"
          className="ph-main seal"
          disabled={tipCents === null || pay.isPending || pay.isSuccess}
          onClick={() => pay.mutate({ part: 'all', tipCents: tipCents ?? 0 })}
        >
          {pay.isPending || pay.isSuccess ? 'Opening' : 'Pay by card'}
        </button>
      </footer>
    </>
  );
}
