import { useState } from 'react';
import { useQuery } from '@tanstack/react-query';
import type { OfferedDays } from '@driprail/shared/contracts/online-booking.contract';
import { formatDay, formatMinutes, formatSpan } from '@driprail/shared/domain/time/format';
import { Loaded } from '../../../components/states.tsx';
import { useHold, windowsQuery } from '../api/online-booking.queries.ts';
import { askOf } from './book-draft.ts';
import { StepFoot } from './book-step.tsx';
import type { PartProps } from './car-and-work.tsx';

/** Days with their arrival windows; the one that is pressed is held for ten minutes. */
export function TimePart(props: PartProps) {
  const ask = askOf(props.menu, props.draft);
  const query = useQuery({ ...windowsQuery(ask ?? emptyAsk), enabled: ask !== null, refetchInterval: 60_000 });
  return (
    <Loaded query={query} what="the free times">
      {({ days }) => <Times {...props} days={days} />}
    </Loaded>
  );
}

const emptyAsk = {
  ...{ sizeClass: 'sedan' as const, serviceIds: [], line: '', city: '', postcode: '' },
  ...{ hasWater: true, hasPower: true },
};

function Times({ menu, draft, cents, set, onNext, days }: PartProps & { days: OfferedDays }) {
  const shown = days.filter((one) => one.windows.some(({ isFree }) => isFree));
  const [day, setDay] = useState(() => dayWith(shown, draft.hold?.from) ?? shown[0]?.day);
  const [from, setFrom] = useState(draft.hold?.from ?? '');
  const hold = useHold();
  const windows = shown.find((one) => one.day === day)?.windows ?? [];
  const picked = windows.find((one) => one.from === from && (one.isFree || draft.hold?.from === from));
  if (shown.length === 0) {
    return (
      <p className="empty">
        No time is free for this work in the coming days.{' '}
        {menu.companyPhone ? `Call us at ${menu.companyPhone} and we look together.` : 'Try again in some days.'}
      </p>
    );
  }
  return (
    <form
      noValidate
      onSubmit={(event) => {
        event.preventDefault();
        const ask = askOf(menu, draft);
        if (!ask || !picked || hold.isPending) return;
        hold.mutate(
          { ...ask, from: picked.from, insteadOf: draft.hold?.id ?? null },
          {
            onSuccess: (answer) => {
              set({ hold: answer.hold, isCodeSent: false });
              onNext();
            },
          },
        );
      }}
    >
      <div className="book-days" role="group" aria-label="Day">
        {shown.map((one) => {
          const [weekday, month, date] = formatDay(one.day).split(' ');
          return (
            <button
              key={one.day}
              type="button"
              aria-pressed={one.day === day}
              aria-label={formatDay(one.day)}
              onClick={() => setDay(one.day)}
            >
              <span>{weekday}</span>
              <b>{date}</b>
              <span>{month}</span>
            </button>
          );
        })}
      </div>
      <div className="book-wins" role="group" aria-label="Arrival window">
        {windows.map((window) => {
          const isOwn = draft.hold?.from === window.from;
          const isFree = window.isFree || isOwn;
          return (
            <button
              key={window.from}
              type="button"
              disabled={!isFree}
              aria-pressed={from === window.from}
              onClick={() => setFrom(window.from)}
            >
              <span className="tm">{formatSpan(window.from, window.to, menu.zone, menu.clock)}</span>
              <small>
                {!isFree ? 'Full' : window.minutes ? `We arrive, stay ${formatMinutes(window.minutes)}` : 'Yours'}
              </small>
            </button>
          );
        })}
      </div>
      {hold.error ? (
        <p className="tape my-2" role="alert">
          <b>{hold.error.message}</b>
        </p>
      ) : null}
      <StepFoot cents={cents} label="Hold this time" isBusy={hold.isPending} isOff={!picked} />
    </form>
  );
}

function dayWith(days: OfferedDays, from: string | undefined): string | undefined {
  return days.find((one) => one.windows.some((window) => window.from === from))?.day;
}
