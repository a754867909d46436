import type { OnlineMenuDto } from '@driprail/shared/contracts/online-booking.contract';
import { formatDate, formatSpan } from '@driprail/shared/domain/time/format';
import { dayOf } from '@driprail/shared/domain/time/zone';
import type { BookDraft } from './book-draft.ts';

/** It is booked: when, and where to look at it again. */
export function Booked({
  menu: { zone, clock, companyPhone },
  booked,
  onAgain,
}: {
  menu: OnlineMenuDto;
  booked: NonNullable<BookDraft['booked']>;
  onAgain: () => void;
}) {
  return (
    <div className="book-leg">
      <div className="rail" />
      <i className="bead" aria-hidden />
      <h2 className="t-hang">It is booked</h2>
      <p className="book-at">{formatSpan(booked.from, booked.to, zone, clock)}</p>
      <p className="pb-3">
        {formatDate(dayOf(booked.from, zone))}. We arrive within this window. Your job is number {booked.jobNumber}.
      </p>
      <a className="btn main w-full" href={booked.path}>
        See your page
      </a>
      <p className="py-3 t-2">
        On your page you see who comes, and can call off. Keep its address: it opens without a password.
        {companyPhone ? ` Questions? Call ${companyPhone}.` : ''}
      </p>
      <button type="button" className="link" onClick={onAgain}>
        Book another car
      </button>
    </div>
  );
}
