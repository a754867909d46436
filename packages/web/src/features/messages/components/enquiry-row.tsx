import type { ReactNode } from 'react';
import type { EnquiryDto } from '@driprail/shared/contracts/messages.contract';
import { formatDay } from '@driprail/shared/domain/time/format';
import { dayOf } from '@driprail/shared/domain/time/zone';
import { Button } from '../../../components/button.tsx';
import { useFormats } from '../../../lib/format.ts';
import { useDeskAct } from '../api/messages.queries.ts';

/** What a customer wrote, until somebody has answered. */
export function EnquiryRow({ enquiry, who }: { enquiry: EnquiryDto; who?: ReactNode }) {
  const { zone, clock } = useFormats();
  const settle = useDeskAct('settle');
  const at = (instant: string) => `${formatDay(dayOf(instant, zone))}, ${clock(instant)}`;
  return (
    <li className={enquiry.settledAt ? 'ms-row' : 'ms-row is-asked'}>
      <div className="ms-what">
        {who}
        <span>
          wrote from <a href={`tel:${enquiry.sender}`}>{enquiry.sender}</a>, {at(enquiry.receivedAt)}
        </span>
      </div>
      <p className="ms-how ms-body" dir="auto">
        {enquiry.body}
      </p>
      <div className="ms-acts">
        {enquiry.settledAt ? (
          <span className="t-2">
            Answered by {enquiry.settledBy}, {at(enquiry.settledAt)}
          </span>
        ) : (
          <Button isBusy={settle.isPending} onClick={() => settle.mutate(enquiry.id)}>
            Mark as answered
          </Button>
        )}
      </div>
      {settle.error ? (
        <p className="tape ms-words" role="alert">
          <b>{settle.error.message}</b>
        </p>
      ) : null}
    </li>
  );
}
