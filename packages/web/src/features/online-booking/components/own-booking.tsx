import { useState } from 'react';
import { useQuery } from '@tanstack/react-query';
import { formatClock, formatDay } from '@driprail/shared/domain/time/format';
import { dayOf } from '@driprail/shared/domain/time/zone';
import { Button } from '../../../components/button.tsx';
import { money } from '../../../lib/format.ts';
import { ownBookingQuery, useCallOffOwn } from '../api/own-booking.queries.ts';

/** What a customer who booked online may still do with it; what it costs is said before it is pressed. */
export function OwnBooking({ token, zone, clock }: { token: string; zone: string; clock: '12' | '24' }) {
  const { data } = useQuery(ownBookingQuery(token));
  const [isAsking, setAsking] = useState(false);
  const off = useCallOffOwn(token);
  const own = data?.booking;
  if (!own?.mayChange || !own.freeUntil) return null;
  const until = `${formatDay(dayOf(own.freeUntil, zone))}, ${formatClock(own.freeUntil, zone, clock)}`;
  const words =
    own.feeCents > 0
      ? `Calling off was free until ${until}. Now it costs ${money(own.feeCents)} by the terms you accepted; we send a bill for it or let it go.`
      : `Calling off is free until ${until}.`;
  return (
    <section aria-label="Your booking">
      <h2 className="sec mt-5">If you can’t be there</h2>
      <p className="py-2">{words}</p>
      {off.error ? (
        <p className="tape my-2" role="alert">
          <b>{off.error.message}</b>
        </p>
      ) : null}
      {isAsking ? (
        <div className="grid grid-cols-2 gap-2">
          <Button onClick={() => setAsking(false)}>Keep it</Button>
          <Button look="main" isBusy={off.isPending} onClick={() => off.mutate(own.feeCents)}>
            {own.feeCents > 0 ? `Call off for ${money(own.feeCents)}` : 'Call off for nothing'}
          </Button>
        </div>
      ) : (
        <Button onClick={() => setAsking(true)}>Call off</Button>
      )}
    </section>
  );
}
