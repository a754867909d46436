import { useState } from 'react';
import { useQuery } from '@tanstack/react-query';
import { Link, useParams } from 'react-router';
import type { BillDto } from '@driprail/shared/contracts/bill.dto';
import type { RunVisitDto } from '@driprail/shared/contracts/run-sheet.contract';
import { paths } from '../../../app/paths.ts';
import { Mark } from '../../../components/icon.tsx';
import { PhonePageHead } from '../../../components/phone-page-head.tsx';
import { Loaded } from '../../../components/states.tsx';
import { money, useFormats } from '../../../lib/format.ts';
import type { KeptPress } from '../../../lib/outbox/store.ts';
import { useOutbox } from '../../../lib/outbox/outbox.ts';
import { useSession } from '../../../lib/session.tsx';
import { useIsLive } from '../../../lib/socket.ts';
import { useOnline } from '../../../lib/use-online.ts';
import { NotYours, OutboxLine, runSheetQuery } from '../../run-sheet/index.ts';
import { dayBillsQuery } from '../api/collect.queries.ts';
import { BillLines } from '../components/bill-lines.tsx';
import { CollectCard } from '../components/collect-card.tsx';
import { CollectHand } from '../components/collect-hand.tsx';

const ways = [
  ['card', 'Card'],
  ['cash', 'Cash'],
  ['check', 'Check'],
] as const;
type Way = (typeof ways)[number][0];

/** The bill at the car, shown to the customer and paid: by card on the customer's own phone, in cash, by check, or later. */
export function CollectPage() {
  const { day = '', visitId = '' } = useParams();
  const { user } = useSession();
  const sheet = useQuery(runSheetQuery(user.id, day));
  const isOnline = useOnline();
  return (
    <main className={isOnline ? 'ph' : 'ph is-adrift'} id="main">
      <Loaded query={sheet} what="the job">
        {({ visits }) => {
          const visit = visits.find((one) => one.id === visitId);
          return visit ? <Bill visit={visit} day={day} isOnline={isOnline} /> : <NotYours />;
        }}
      </Loaded>
    </main>
  );
}

function Bill({ visit, day, isOnline }: { visit: RunVisitDto; day: string; isOnline: boolean }) {
  const { user } = useSession();
  const query = useQuery(dayBillsQuery(user.id, day));
  const isLive = useIsLive();
  return (
    <>
      <PhonePageHead back={paths.runSheetDay(day)} title={visit.customerName} below={`Job ${visit.jobNumber}`} />
      <OutboxLine isOnline={isOnline} isLive={isLive} />
      <Loaded query={query} what="the bill">
        {({ bills }) => {
          const bill = bills.find((one) => one.jobId === visit.jobId);
          return bill ? <Collect bill={bill} visit={visit} day={day} isOnline={isOnline} /> : <NotYours />;
        }}
      </Loaded>
    </>
  );
}

interface CollectProps {
  bill: BillDto;
  visit: RunVisitDto;
  day: string;
  isOnline: boolean;
}

function Collect({ bill, visit, day, isOnline }: CollectProps) {
  const { zone } = useFormats();
  const { waiting } = useOutbox();
  const [way, setWay] = useState<Way | null>(null);
  const waitingCents = waitingFor(waiting, bill.jobId);
  const owedCents = bill.owedCents - waitingCents;
  return (
    <>
      <h2 className="sec">
        {bill.invoice ? `Invoice ${bill.invoice.number}` : visit.progress === 'done' ? 'Invoice' : 'So far'}
      </h2>
      <BillLines bill={bill} zone={zone} waitingCents={waitingCents} />
      {owedCents <= 0 ? (
        <Settled bill={bill} isWaiting={waitingCents > 0} day={day} />
      ) : way === null ? (
        <Ways day={day} onPick={setWay} />
      ) : (
        <>
          <p className="flex items-center justify-between pt-3">
            <b className="text-lead">{ways.find(([value]) => value === way)?.[1]}</b>
            <button type="button" className="btn" onClick={() => setWay(null)}>
              Another way
            </button>
          </p>
          {way === 'card' ? (
            <>
              <CollectCard
                jobId={bill.jobId}
                customerName={bill.customerName}
                phone={visit.phone}
                isOnline={isOnline}
              />
              <footer className="ph-act">
                <Link className="btn w-full" to={paths.runSheetDay(day)}>
                  To the run sheet
                </Link>
              </footer>
            </>
          ) : (
            <CollectHand
              key={`${way}:${owedCents}`}
              bill={bill}
              owedCents={owedCents}
              method={way}
              onTaken={() => setWay(null)}
            />
          )}
        </>
      )}
    </>
  );
}

/** In the thumb's reach: how it is paid, or later. */
function Ways({ day, onPick }: { day: string; onPick: (way: Way) => void }) {
  return (
    <footer className="ph-act">
      <h2 className="sr">How it is paid</h2>
      <div className="grid grid-cols-3 gap-2">
        {ways.map(([way, label]) => (
          <button key={way} type="button" className="ph-main seal" onClick={() => onPick(way)}>
            {label}
          </button>
        ))}
      </div>
      <div className="below">
        <Link className="btn" to={paths.runSheetDay(day)}>
          Pay later
        </Link>
      </div>
    </footer>
  );
}

function Settled({ bill, isWaiting, day }: { bill: BillDto; isWaiting: boolean; day: string }) {
  return (
    <>
      <p className="flex items-center gap-2 py-3 text-lead" role="status">
        <Mark name="m-done" />
        {bill.owedCents < 0 ? (
          <span>
            <b>{money(-bill.owedCents)} too much.</b> Dispatch sees it and gives it back.
          </span>
        ) : (
          <span>
            <b>Paid.</b> {isWaiting ? 'It is sent when there is signal.' : 'Nothing is owed.'}
          </span>
        )}
      </p>
      <footer className="ph-act">
        <Link className="ph-main" to={paths.runSheetDay(day)}>
          To the run sheet
        </Link>
      </footer>
    </>
  );
}

/** What was taken on this phone and has not reached the server; cents. */
function waitingFor(waiting: KeptPress[], jobId: string): number {
  return waiting
    .filter((press) => press.path === 'payment' && press.targetId === jobId)
    .reduce((total, press) => total + Number(press.body['amountCents']), 0);
}
